import type { Connection, PhaseColours, PhaseLabels, Study } from './types.ts';

export type PhaseNames = readonly [string, string, string];

export const phaseLabelSets: Readonly<Record<PhaseLabels, PhaseNames>> = {
  L123: ['L1', 'L2', 'L3'],
  ABC: ['A', 'B', 'C'],
};

/** Customary colours of the phases, in the order of the phases, with where they are customary. */
export const phaseColourSets: readonly { id: PhaseColours; label: string; source: string }[] = [
  { id: 'brown-black-grey', label: 'brown, black, grey', source: 'IEC 60445:2021, 6.2.3 (from memory)' },
  {
    id: 'red-yellow-blue',
    label: 'red, yellow, blue',
    source: 'IS 3043 and older British practice (common practice, from memory)',
  },
  { id: 'yellow-green-red', label: 'yellow, green, red', source: 'GB/T 7947 (from memory)' },
  { id: 'red-white-blue', label: 'red, white, blue', source: 'AS/NZS 3000 (from memory)' },
  {
    id: 'black-red-blue',
    label: 'black, red, blue',
    source: 'North America up to 240 V (common practice)',
  },
  {
    id: 'brown-orange-yellow',
    label: 'brown, orange, yellow',
    source: 'North America at 480 V (common practice)',
  },
];

/** What the study calls its phases: L1 L2 L3 unless its view says otherwise. */
export function phaseNamesOf(study: Study | null): PhaseNames {
  return phaseLabelSets[study?.view?.phases?.labels === 'ABC' ? 'ABC' : 'L123'];
}

/** The colours of the study's phases: those of IEC 60445 unless its view says otherwise. */
export function phaseColoursOf(study: Study | null): PhaseColours {
  const chosen = study?.view?.phases?.colours;
  return phaseColourSets.find(({ id }) => id === chosen)?.id ?? 'brown-black-grey';
}

/** Words that name phases L1 L2 L3, in the study's own names: "L1 to neutral" becomes "A to neutral". */
export function inPhaseNames(study: Study | null, words: string): string {
  const names = phaseNamesOf(study);
  return words.replaceAll(/L([123])/g, (label, digit: string) => names[Number(digit) - 1] ?? label);
}

/** How a part is connected, in the study's own names: "three-phase", "L1", "L1–L2". */
export function connectionWords(study: Study | null, connection: Connection): string {
  if (connection === 'L1L2L3') return 'three-phase';
  const parted = connection.length > 2 ? `${connection.slice(0, 2)}–${connection.slice(2)}` : connection;
  return inPhaseNames(study, parted);
}
