import type { PhaseColours, PhaseLabels, Study } from './types.ts';

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
