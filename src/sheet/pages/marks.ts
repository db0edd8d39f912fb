/** What is put on a page, in points from its upper left corner. */

export type Weight = 'regular' | 'semibold';

/** Inks by their use: body, second, hairlines, and the verdicts' own. */
export type Ink = 'ink' | 'quiet' | 'hairline' | 'pass' | 'watch' | 'fail';

export const INKS: Record<Ink, string> = {
  ink: '#1e2430',
  quiet: '#4a5263',
  hairline: '#d9d3c6',
  pass: '#1f7a4d',
  watch: '#8a5a00',
  fail: '#b42318',
};

/** One run of text on one line; y is its baseline. */
export interface TextMark {
  kind: 'text';
  x: number;
  y: number;
  text: string;
  size: number;
  weight: Weight;
  ink: Ink;
}

export interface LineMark {
  kind: 'line';
  x1: number;
  y1: number;
  x2: number;
  y2: number;
  width: number;
  ink: Ink;
}

/** An outline without a filling. */
export interface BoxMark {
  kind: 'box';
  x: number;
  y: number;
  width: number;
  height: number;
  stroke: number;
  ink: Ink;
}

/** The place of a figure. */
export interface FigureMark {
  kind: 'figure';
  id: string;
  x: number;
  y: number;
  width: number;
  height: number;
}

export type PageMark = TextMark | LineMark | BoxMark | FigureMark;

export interface SheetPage {
  number: number;
  width: number;
  height: number;
  /** Section titles that begin here, for the outline. */
  sections: { id: string; title: string; y: number }[];
  marks: PageMark[];
}

/** The same mark moved down and to the right. */
export function shifted(mark: PageMark, dx: number, dy: number): PageMark {
  if (mark.kind === 'line') {
    return { ...mark, x1: mark.x1 + dx, x2: mark.x2 + dx, y1: mark.y1 + dy, y2: mark.y2 + dy };
  }
  return { ...mark, x: mark.x + dx, y: mark.y + dy };
}
