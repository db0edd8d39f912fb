import type { ElementKind } from '../../study/index.ts';

/** All places are px at 100 %, x to the right, y downwards, origin at the drawing's top left corner. */
export interface Point {
  x: number;
  y: number;
}

export interface Box {
  x: number;
  y: number;
  width: number;
  height: number;
}

export interface BusPlace {
  id: string;
  /** Left and right end of the bar. */
  x1: number;
  x2: number;
  y: number;
  /** Depth below the bar down to which its parts hang. */
  depth: number;
  /** The name as printed, shortened where it is very long. */
  name: string;
  /** Two lines: the name, and below it nominal voltage and live volts. */
  label: Box;
  /** Centre of the three-phasor dial, left of the two lines; absent where dials are not shown. */
  dial?: Point;
  /** Room for the verdict's mark and word, right of the name; the letters of its notes follow. */
  mark: Box;
  /** 0 is the topmost. */
  storey: number;
  /** 0, 1, … from left to right; busbars of one island are joined by series parts. */
  island: number;
}

/** One end of a part: the busbar it touches and the conductor from busbar to symbol. */
export interface PartEnd {
  bus: string;
  /** From the touching point on the bar to the symbol's terminal. */
  path: Point[];
}

export type Hang = 'below' | 'above' | 'leads-on' | 'across';

export interface PartPlace {
  id: string;
  kind: ElementKind;
  /** Symbol centre. */
  x: number;
  y: number;
  /**
   * below: hangs from its busbar. above: feeds its busbar from above. leads-on: joins an upper to a lower
   * busbar. across: ties two busbars of one storey end to end (the symbol lies on its side).
   */
  hang: Hang;
  /** The busbar it hangs from: the upper one, or the left one of a tie. */
  bus: string;
  /** Where the part touches that busbar. */
  top: Point;
  /** Where it touches its second busbar. */
  foot?: Point & { bus: string };
  ends: PartEnd[];
  text: PartText;
  /** The text's box: name, nameplate and readings below each other. */
  label: Box;
  /** Room for the verdict's mark, its word below it. */
  mark: Box;
  /** The letters of its notes end here, left of the part. */
  letters: Point;
}

/** The lines of a part's text, wrapped to the width of its box. */
export interface PartText {
  align: 'middle' | 'start';
  /** The name, shortened where two lines do not hold it. */
  name: string[];
  /** Lines kept for the nameplate. */
  plateLines: number;
  /** Cells kept for live readings, filled row by row in so many columns. */
  readings: number;
  columns: 1 | 2;
}

export interface Layout {
  width: number;
  height: number;
  buses: BusPlace[];
  parts: PartPlace[];
}
