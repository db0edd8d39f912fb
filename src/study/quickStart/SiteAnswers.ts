import { typicalTransformer } from '../typical/typicalTransformer.ts';
import type { DriveKind } from './driveKinds.ts';
import { type SiteSystem, type SystemId, siteSystem } from './siteSystems.ts';

/** What the user has said about the site. What is absent is taken as typical, and listed as assumed. */
export interface SiteAnswers {
  system?: SystemId;
  ratedKVA?: number;
  ukPercent?: number;
  /** At the intake; absent: not known, 100 to 500 MVA. */
  faultLevelMVA?: number;
  /** Energy of one billing period. */
  activeKWh?: number;
  reactiveKvarh?: number;
  /** Highest demand of the period; comes before `hours`. */
  peakKW?: number;
  /** Hours of use: the energy over the peak demand. */
  hours?: number;
  /** Share of the active load that drives take, in %. */
  drivesPercent?: number;
  driveKind?: DriveKind;
  targetPF?: number;
}

/** The site in figures, every answer filled in. */
export interface SiteFigures {
  system: SiteSystem;
  ratedKVA: number;
  ukPercent: number;
  /** Strongest and weakest state of the supply; the same where the fault level is known. */
  strongMVA: number;
  weakMVA: number;
  activeKWh: number;
  reactiveKvarh: number;
  /** Hours of use h = E/P. */
  hours: number;
  /** P and Q drawn at the intake at peak; Q lagging. */
  kW: number;
  kvar: number;
  /** tan φ = E_r/E of the bill, and its cos φ = 1/√(1 + tan² φ). */
  tanPhi: number;
  cosPhi: number;
  drivesPercent: number;
  driveKind: DriveKind;
  targetPF: number;
  /** The answers that were given; all others are assumed. */
  given: ReadonlySet<keyof SiteAnswers>;
}

/** Common practice of a site nobody has described: two shifts, 60 % of the transformer, cos φ 0.85. */
export const assumedSite = {
  ratedKVA: 1000,
  loading: 0.6,
  cosPhi: 0.85,
  hours: 400,
  drivesPercent: 30,
  driveKind: 'choke',
  targetPF: 0.95,
  weakMVA: 100,
  strongMVA: 500,
} as const;

/**
 * Fills in what was not said. The peak is P = E/h where no demand is given, its power factor the bill's:
 * tan φ = E_r/E. Throws RangeError for a transformer rating without typical data; the field's range holds it.
 */
export function figuresOf(answers: SiteAnswers): SiteFigures {
  const system = siteSystem(answers.system);
  const ratedKVA = answers.ratedKVA ?? assumedSite.ratedKVA;
  const activeKWh = answers.activeKWh ?? assumedEnergy(answers, ratedKVA);
  const reactiveKvarh = answers.reactiveKvarh ?? threeDigits(activeKWh * tanOf(assumedSite.cosPhi));
  const kW = answers.peakKW ?? activeKWh / (answers.hours ?? assumedSite.hours);
  const tanPhi = reactiveKvarh / activeKWh;
  const known = answers.faultLevelMVA;
  return {
    system,
    ratedKVA,
    ukPercent: answers.ukPercent ?? typicalUk(ratedKVA),
    strongMVA: known ?? assumedSite.strongMVA,
    weakMVA: known ?? assumedSite.weakMVA,
    activeKWh,
    reactiveKvarh,
    hours: activeKWh / kW,
    kW,
    kvar: kW * tanPhi,
    tanPhi,
    cosPhi: 1 / Math.sqrt(1 + tanPhi ** 2),
    drivesPercent: answers.drivesPercent ?? assumedSite.drivesPercent,
    driveKind: answers.driveKind ?? assumedSite.driveKind,
    targetPF: answers.targetPF ?? assumedSite.targetPF,
    given: new Set(answerKeys.filter((key) => answers[key] !== undefined)),
  };
}

const answerKeys = [
  'system',
  'ratedKVA',
  'ukPercent',
  'faultLevelMVA',
  'activeKWh',
  'reactiveKvarh',
  'peakKW',
  'hours',
  'drivesPercent',
  'driveKind',
  'targetPF',
] as const satisfies readonly (keyof SiteAnswers)[];

function assumedEnergy({ peakKW, hours = assumedSite.hours }: SiteAnswers, ratedKVA: number): number {
  const { loading, cosPhi } = assumedSite;
  return threeDigits((peakKW ?? ratedKVA * loading * cosPhi) * hours);
}

/** tan φ of a cos φ above 0. */
export function tanOf(cosPhi: number): number {
  return Math.sqrt(1 / cosPhi ** 2 - 1);
}

function threeDigits(value: number): number {
  return Number(value.toPrecision(3));
}

function typicalUk(ratedKVA: number): number {
  const typical = typicalTransformer(ratedKVA);
  if (!typical.ok) throw new RangeError(typical.error);
  return typical.values.ukPercent;
}
