import type { Panels } from './panels.ts';

/** A panel's size and the sizes it may be given, in CSS pixels. */
export interface PanelSize {
  size: number;
  least: number;
  most: number;
}

/** Where the panels stand in a window of a given size. */
export interface PanelPlaces {
  tray: { show: 'words' | 'symbols'; columns: 1 | 2; width: number };
  notes: PanelSize & { show: 'open' | 'letters' };
  rail: PanelSize & { show: 'open' | 'strip' };
}

export const HEADER = 46;
export const RAIL_STRIP = 28;
export const LETTERS = 44;

const LEAST_PAPER = { width: 340, height: 200 };
/** Under this a column or a landscape beside the drawing would leave too little of it. */
const NARROW = 900;
const LOW = 560;
/** From here on readings and verdicts stand side by side. */
const WIDE = 2200;
const TRAY = { words: 72, symbols: 44, twoColumns: 80 };
/** Heights of the tray with its fold button: words under every symbol, one column of symbols. */
const TRAY_WORDS = 520;
const TRAY_SYMBOLS = 450;

const within = (size: number, least: number, most: number): number =>
  Math.round(Math.max(least, Math.min(most, size)));

/**
 * The panels' places. What was chosen on this machine holds as far as the drawing keeps room; what was not
 * follows the window: a narrow one folds the notes to their letters, a low one the rail to its strip.
 */
export function panelPlaces(panels: Panels, window: { width: number; height: number }): PanelPlaces {
  const rail = railPlace(panels, window.height);
  const railTotal = RAIL_STRIP + (rail.show === 'open' ? rail.size : 0);
  const tray = trayPlace(panels, window.width, window.height - HEADER - railTotal);
  return { tray, rail, notes: notesPlace(panels, window.width, tray.width) };
}

function railPlace({ rail, railHeight }: Panels, height: number): PanelPlaces['rail'] {
  const least = 84;
  const most = Math.max(least, height - HEADER - RAIL_STRIP - LEAST_PAPER.height);
  const usual = Math.min(220, Math.max(104, height * 0.165));
  return {
    show: rail ?? (height < LOW ? 'strip' : 'open'),
    size: within(railHeight ?? usual, least, most),
    least,
    most,
  };
}

function trayPlace({ tray }: Panels, width: number, height: number): PanelPlaces['tray'] {
  const show = tray ?? (width < NARROW || height < TRAY_WORDS ? 'symbols' : 'words');
  if (show === 'words') return { show, columns: 1, width: TRAY.words };
  const columns = height < TRAY_SYMBOLS ? 2 : 1;
  return { show, columns, width: columns === 2 ? TRAY.twoColumns : TRAY.symbols };
}

function notesPlace({ notes, notesWidth }: Panels, width: number, tray: number): PanelPlaces['notes'] {
  const least = 250;
  const most = Math.max(least, Math.min(900, width - tray - LEAST_PAPER.width));
  const usual = width >= WIDE ? 660 : Math.min(420, Math.max(288, width * 0.235));
  return {
    show: notes ?? (width < NARROW ? 'letters' : 'open'),
    size: within(notesWidth ?? usual, least, most),
    least,
    most,
  };
}
