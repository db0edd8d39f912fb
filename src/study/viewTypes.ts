/** How a study is looked at: pins, marks, what is drawn and how. Travels with the file; never part of the fingerprint. */

/** A watched quantity: a voltage at a busbar, or the current into a part at one of its busbars. */
export type Pin =
  | { quantity: 'voltage'; bus: string }
  | { quantity: 'current'; element: string; bus: string };

/** The standard whose shapes the drawing's symbols follow. */
export type SymbolSet = 'iec60617' | 'ieee315';

/** A kind of figure the drawing can show beside its symbols. */
export type DrawnItem =
  | 'current'
  | 'power'
  | 'powerFactor'
  | 'voltages'
  | 'nameplates'
  | 'dials'
  | 'direction'
  | 'widths';

/** What the three phases are called: L1 L2 L3, or A B C. */
export type PhaseLabels = 'L123' | 'ABC';

/** Which customary colours tell the phases apart, after label and dash. */
export type PhaseColours =
  | 'brown-black-grey'
  | 'red-yellow-blue'
  | 'yellow-green-red'
  | 'red-white-blue'
  | 'black-red-blue'
  | 'brown-orange-yellow';

/**
 * A place on the drawing in px at 100 % from its top left corner. Where it follows a part or busbar, `by` says
 * how far it stands from the part's symbol or the left end of the bar; x and y then only keep the place for
 * the day the part is gone.
 */
export interface MarkPoint {
  x: number;
  y: number;
  by?: { kind: 'element' | 'bus'; id: string; dx: number; dy: number };
}

export type MarkKind = 'note' | 'cloud' | 'box' | 'arrow';

/** What a reviewer writes or draws on the drawing: words, an outline round an area, an arrow. */
export interface DrawingMark {
  id: string;
  kind: MarkKind;
  /** Words at it, lines parted by line feeds; plain text, never markup. */
  text: string;
  /** Where the words stand, or one corner of the area, or the foot of the arrow. */
  from: MarkPoint;
  /** The other corner, or the arrow's head; a note has none. */
  to?: MarkPoint;
}

/** How the study was last looked at. Travels with the file; never part of the fingerprint. */
export interface StudyView {
  pins?: Pin[];
  /** Element ids from left to right, by busbar id. */
  orderAlong?: Record<string, string[]>;
  /** Absent: IEC 60617. */
  symbols?: SymbolSet;
  /** What the drawing leaves out; absent: it shows everything. */
  hidden?: DrawnItem[];
  /** Absent: L1 L2 L3 in the colours of IEC 60445. */
  phases?: { labels?: PhaseLabels; colours?: PhaseColours };
  /** A reviewer's words and outlines on the drawing. */
  marks?: DrawingMark[];
  focusBus?: string;
  caseId?: string;
}
