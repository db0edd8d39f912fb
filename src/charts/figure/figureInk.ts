import { phaseInk } from './phaseInk.ts';

/**
 * The colours a figure draws with. On screen they are the page's custom properties, so one figure serves
 * both themes; in print they are fixed greys, because a results sheet must read in black and white.
 */
export interface FigureInk {
  ground: string;
  sheet: string;
  ink: string;
  ink2: string;
  hairline: string;
  accent: string;
  voltage: string;
  current: string;
  reactive: string;
  pass: string;
  watch: string;
  fail: string;
  /** Phase colours of L1, L2, L3. */
  phases: readonly [string, string, string];
}

export const SCREEN_INK: FigureInk = {
  ground: 'var(--ground)',
  sheet: 'var(--sheet)',
  ink: 'var(--ink)',
  ink2: 'var(--ink-2)',
  hairline: 'var(--hairline)',
  accent: 'var(--accent)',
  voltage: 'var(--voltage)',
  current: 'var(--current)',
  reactive: 'var(--reactive)',
  pass: 'var(--pass)',
  watch: 'var(--watch)',
  fail: 'var(--fail)',
  phases: ['var(--l1)', 'var(--l2)', 'var(--l3)'],
};

/** Paper in colour, for pictures that leave the page: the light theme's own values. */
export const PAPER_INK: FigureInk = {
  ground: '#ffffff',
  sheet: '#ffffff',
  ink: '#1e2430',
  ink2: '#4a5263',
  hairline: '#d9d3c6',
  accent: '#2f5da8',
  voltage: '#1e2430',
  current: '#a8451f',
  reactive: '#0e6b63',
  pass: '#1f7a4d',
  watch: '#8a5a00',
  fail: '#b42318',
  phases: phaseInk('brown-black-grey', 'light'),
};

export const PRINT_INK: FigureInk = {
  ground: '#ffffff',
  sheet: '#ffffff',
  ink: '#1e2430',
  ink2: '#4a5263',
  hairline: '#cfcfcf',
  accent: '#1e2430',
  voltage: '#1e2430',
  current: '#5d6470',
  reactive: '#1e2430',
  pass: '#1e2430',
  watch: '#1e2430',
  fail: '#1e2430',
  phases: phaseInk('brown-black-grey', 'light'),
};

/** Colours, letter family and letter sizes of one figure; every size in the figure's own units. */
export interface FigureStyle {
  ink: FigureInk;
  fontFamily?: string;
  /** Headline and flag text. */
  textSize: number;
  /** Axis text. */
  smallSize: number;
  print: boolean;
}

export const SCREEN_STYLE: FigureStyle = { ink: SCREEN_INK, textSize: 12, smallSize: 11, print: false };

/** Style for a static figure: on the results sheet, or in another ink for a copy. */
export function printStyle(fontFamily: string, textSize = 9.5, ink: FigureInk = PRINT_INK): FigureStyle {
  return { ink, fontFamily, textSize, smallSize: textSize - 1, print: true };
}
