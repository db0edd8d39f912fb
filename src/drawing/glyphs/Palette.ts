/** The inks of the drawing: theme variables on screen, plain colours on the results sheet. */
export interface Palette {
  sheet: string;
  ink: string;
  ink2: string;
  hairline: string;
  accent: string;
  current: string;
  reactive: string;
  pass: string;
  watch: string;
  fail: string;
  /** The reviewer's marks. */
  pen: string;
  /** Of L1, L2, L3; label and dash come first. */
  phases: readonly [string, string, string];
}

export const screenPalette: Palette = {
  sheet: 'var(--sheet)',
  ink: 'var(--ink)',
  ink2: 'var(--ink-2)',
  hairline: 'var(--hairline)',
  accent: 'var(--accent)',
  current: 'var(--current)',
  reactive: 'var(--reactive)',
  pass: 'var(--pass)',
  watch: 'var(--watch)',
  fail: 'var(--fail)',
  pen: 'var(--pen)',
  phases: ['var(--l1)', 'var(--l2)', 'var(--l3)'],
};

/** For the sheet: everything told by shape, dash and weight, so that it survives a black and white printer. */
export const printPalette: Palette = {
  sheet: '#ffffff',
  ink: '#1e2430',
  ink2: '#4a5263',
  hairline: '#b9b3a6',
  accent: '#1e2430',
  current: '#1e2430',
  reactive: '#1e2430',
  pass: '#1e2430',
  watch: '#1e2430',
  fail: '#1e2430',
  pen: '#5b2a52',
  phases: ['#1e2430', '#1e2430', '#1e2430'],
};
