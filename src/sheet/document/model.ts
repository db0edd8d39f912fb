import type { VerdictWord } from '../../checks/index.ts';
import type { Pin } from '../../study/index.ts';

/** The results sheet as data: what stands on it and in which order, without any measure on paper. */

export type PaperName = 'A4' | 'Letter';

/** One cell of a table. `quiet` follows the text in lighter ink; `mark` puts a verdict's sign before it. */
export interface Cell {
  text: string;
  quiet?: string;
  mark?: VerdictWord;
  strong?: boolean;
}

/** `decimal` lines numbers up at their decimal point. Only `left` columns wrap. */
export type Alignment = 'left' | 'right' | 'decimal';

export interface Column {
  head: string;
  /** Printed under the head, in lighter ink. */
  unit?: string;
  align: Alignment;
  /** Share of the width that is left over when every column has what it needs. */
  grow?: number;
}

/** A row of cells, one per column; a group row carries one text over the whole width. */
export type Row = { kind: 'cells'; cells: Cell[] } | { kind: 'group'; text: string; aside?: string };

export interface TableBlock {
  kind: 'table';
  columns: Column[];
  rows: Row[];
  /** Printed under the table in small type. */
  notes: string[];
}

/** The piece of the single-line diagram that a figure shows, in the drawing's own units; absent: all of it. */
export type DrawingWindow = { x: number; y: number; width: number; height: number } | null;

/** What a figure shows; the composer of figures turns it into a drawing of the wanted size. */
export type FigureRequest =
  | { kind: 'drawing'; caseId: string; window: DrawingWindow }
  | { kind: 'impedance'; caseId: string; bus: string; sequence: 'positive' | 'zero' }
  | { kind: 'waveform'; caseId: string; pin: Pin }
  | { kind: 'phasors'; caseId: string; pin: Pin }
  | { kind: 'spectrum'; caseId: string; pin: Pin };

export interface Figure {
  /** Unique in the document. */
  id: string;
  request: FigureRequest;
  /** Accessible name, and the words that stand for the figure where it cannot be drawn. */
  label: string;
}

export interface FigureBlock extends Figure {
  kind: 'figure';
  /** Height over width. */
  aspect: number;
  /** Printed under the figure in small type. */
  caption?: string;
  /** Drawn no wider than this, in points; may reach a little into the margins. Absent: over the whole width. */
  widest?: number;
  /** May be drawn smaller by this factor where more then fits on the first page. */
  tightest?: number;
}

/** Figures side by side; their shares of the width sum to 1. */
export interface FigureRowBlock {
  kind: 'figureRow';
  figures: (Figure & { share: number })[];
  /** Height over the whole width. */
  aspect: number;
}

/** A label in front and the words that belong to it, e.g. an equation and its source. */
export interface TermsBlock {
  kind: 'terms';
  /** Belongs to the block after it and stays on its page. */
  leadsOn?: boolean;
  terms: { label: string; text: string }[];
}

/** A paragraph that leads on stays on the page of the block after it. */
export type Block =
  | { kind: 'heading'; text: string; aside?: string }
  | { kind: 'paragraph'; text: string; small?: boolean; leadsOn?: boolean }
  | { kind: 'list'; items: string[] }
  | TermsBlock
  | TableBlock
  | FigureBlock
  | FigureRowBlock
  | { kind: 'caution'; lines: string[] }
  | { kind: 'signOff'; fields: SignOffField[] };

export interface SignOffField {
  role: string;
  name: string;
}

export interface Section {
  /** Stable name, e.g. "result", "busbars". */
  id: string;
  title: string;
  /** Beside the title in lighter ink. */
  aside?: string;
  /** May stand after this many of the sections that follow, where the first page then holds more. */
  floatsPast?: number;
  /** Set on pages of its own, turned on their side. */
  landscape?: boolean;
  blocks: Block[];
}

/** The block at the foot of the first page. */
export interface TitleBlock {
  site: string;
  preparedBy: string;
  checkedBy: string;
  approvedBy: string;
  revision: string;
}

export interface SheetDocument {
  paper: PaperName;
  title: string;
  subtitle: string;
  /** e.g. "Varwright 0.1.0". */
  programme: string;
  /** Whole fingerprint of the study. */
  fingerprint: string;
  /** e.g. "study 7f3a-19c2". */
  shortFingerprint: string;
  /** ISO 8601 day of the revision; absent where the study gives none. */
  revisionDate?: string;
  titleBlock: TitleBlock;
  /** Stands at the foot of the first page. */
  frontCaution: string[];
  sections: Section[];
}
