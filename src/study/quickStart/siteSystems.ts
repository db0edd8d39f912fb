/** A voltage and frequency system the quick start knows: what feeds the transformer and what it gives. */
export interface SiteSystem {
  id: string;
  label: string;
  frequencyHz: 50 | 60;
  /** Line-to-line volts at the intake; common practice where the system below is found. */
  intakeV: number;
  /** Line-to-line volts of the main board. */
  mainV: number;
  vectorGroup: string;
}

export const siteSystems = [
  system('400-50', 50, 20_000, 400),
  system('415-50', 50, 11_000, 415),
  system('690-50', 50, 20_000, 690),
  system('208-60', 60, 12_470, 208),
  system('480-60', 60, 12_470, 480),
  system('600-60', 60, 12_470, 600),
] as const;

function system<Id extends string>(id: Id, frequencyHz: 50 | 60, intakeV: number, mainV: number) {
  const label = `${mainV} V, ${frequencyHz} Hz, from ${intakeV / 1000} kV`;
  const vectorGroup = frequencyHz === 60 ? 'Dyn1' : 'Dyn11';
  return { id, label, frequencyHz, intakeV, mainV, vectorGroup } satisfies SiteSystem;
}

export type SystemId = (typeof siteSystems)[number]['id'];

/** The system of that id; the first where nobody has chosen. */
export function siteSystem(id: SystemId | undefined): SiteSystem {
  return siteSystems.find((one) => one.id === id) ?? siteSystems[0];
}
