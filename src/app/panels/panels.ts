/** How the panels round the drawing stand on this machine; what is absent follows the window. */
export interface Panels {
  tray?: 'words' | 'symbols';
  notes?: 'open' | 'letters';
  /** CSS pixels. */
  notesWidth?: number;
  rail?: 'open' | 'strip';
  /** Of the landscape with its axis, in CSS pixels. */
  railHeight?: number;
  /** What lies on the paper: the drawing, the site as a list, its data as a table. */
  paper?: 'drawing' | 'list' | 'table';
}

type Wanted = { [K in keyof Panels]-?: (value: unknown) => boolean };

const oneOf =
  (...words: string[]) =>
  (value: unknown): boolean =>
    typeof value === 'string' && words.includes(value);
const pixels = (value: unknown): boolean =>
  typeof value === 'number' && Number.isFinite(value) && value > 0 && value < 10_000;

const wanted: Wanted = {
  tray: oneOf('words', 'symbols'),
  notes: oneOf('open', 'letters'),
  notesWidth: pixels,
  rail: oneOf('open', 'strip'),
  railHeight: pixels,
  // A visit begins with a picture of the site.
  paper: oneOf('drawing', 'list'),
};

/** What was kept as text, entry by entry; an entry that cannot be read is left out. */
export function readPanels(text: string | null): Panels {
  let kept: unknown;
  try {
    kept = JSON.parse(text ?? '{}');
  } catch {
    return {};
  }
  if (typeof kept !== 'object' || kept === null) return {};
  const sound = Object.entries(kept).filter(([key, value]) => wanted[key as keyof Panels]?.(value) ?? false);
  return Object.fromEntries(sound);
}
