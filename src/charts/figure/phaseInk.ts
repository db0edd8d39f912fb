import type { PhaseColours } from '../../study/index.ts';

type Three = readonly [string, string, string];

const INKS = {
  brown: ['#7a4a21', '#cf9463'],
  black: ['#1e2430', '#ece7dc'],
  grey: ['#667080', '#98a1af'],
  red: ['#a8324a', '#f08a9c'],
  yellow: ['#7a6200', '#dcbc4c'],
  green: ['#2a7440', '#6cc382'],
  blue: ['#245f9c', '#78b2ea'],
  orange: ['#95560a', '#e3a658'],
  // White on paper would be nothing: it is drawn in grey there, in plain ink on slate.
  white: ['#667080', '#ece7dc'],
} as const satisfies Record<string, readonly [light: string, dark: string]>;

type Ink = keyof typeof INKS;

const SETS: Record<PhaseColours, readonly [Ink, Ink, Ink]> = {
  'brown-black-grey': ['brown', 'black', 'grey'],
  'red-yellow-blue': ['red', 'yellow', 'blue'],
  'yellow-green-red': ['yellow', 'green', 'red'],
  'red-white-blue': ['red', 'white', 'blue'],
  'black-red-blue': ['black', 'red', 'blue'],
  'brown-orange-yellow': ['brown', 'orange', 'yellow'],
};

/** The customary colours of the phases, darkened for paper or brightened for slate until they are legible. */
export function phaseInk(colours: PhaseColours, theme: 'light' | 'dark'): Three {
  const [a, b, c] = SETS[colours];
  const shade = theme === 'light' ? 0 : 1;
  return [INKS[a][shade], INKS[b][shade], INKS[c][shade]];
}
