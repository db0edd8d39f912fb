/** State and actions of the workbench: the one source of truth of the page. */
import type { Verdict } from '../checks/index.ts';
import type { CaseSolution } from '../engine/index.ts';
import type { ImpedanceEnvelope, WorstProgress, WorstResult } from '../sizing/index.ts';
import type { Edit, Finding, Pin, Study } from '../study/index.ts';
import type { Probe, ScanPair, WorstQuestion } from '../worker/index.ts';
import type { History } from './history.ts';

export type Place = 'site' | 'correction' | 'sheet';
export type ReadingMode = 'fundamental' | 'rms' | 'order';
export type Theme = 'system' | 'light' | 'dark';
/** The fundamental alone, every order, or the orders up to a number. */
export type WaveOrders = 'fundamental' | 'all' | number;

/** What the drawing's left margin lists; null where it is put away. */
export type Margin = 'cases' | 'findings' | 'states' | null;
/** Two operating states side by side: ids of cases, or of the base study. */
export interface ComparedCases {
  a: string;
  b: string;
}

/** How the study is looked at. Changes here never re-solve, except case and busbar. */
export interface View {
  place: Place;
  caseId: string;
  /** Busbar under the rail; '' while the study has none. */
  focusBus: string;
  /** h of the rail's handle, real-valued, > 0. */
  order: number;
  readingMode: ReadingMode;
  /** "element:<id>" and "bus:<id>". */
  selection: readonly string[];
  /** The item whose data slip is open, as in `selection`. */
  openSlip: string | null;
  theme: Theme;
  /** Fraction 0…1 of the period at which the phasors stand. */
  timeCursor: number;
  waveOrders: WaveOrders;
  margin: Margin;
  /** Whether the notes list the verdicts of the case on screen or of every case. */
  verdictScope: 'case' | 'all';
  /** null where none are compared. */
  compared: ComparedCases | null;
}

/** The latest numbers of one case. Stale when its revision or case is not the one on screen. */
export interface Answer {
  revision: number;
  caseId: string;
  solution: CaseSolution;
  /** The same case, all banks and filters out of service. */
  without: CaseSolution;
  /** What was last known of this case; of an older revision for a moment after each edit. */
  verdicts: Verdict[];
  /** Revision of the verdicts; null while there are none. */
  verdictsRevision: number | null;
  /** Revision of the screening rows among them, which follow a little later still; null while none are. */
  screeningRevision: number | null;
  /** The rail's curves last known of this case, of the busbar and revision they name. */
  scan: ScanAnswer | null;
}

export interface ScanAnswer extends ScanPair {
  revision: number;
}

export interface ProbeAnswer extends Probe {
  revision: number;
}

/** Verdicts by case id, as far as judged, all of one revision. */
export interface AllVerdicts {
  revision: number;
  byCase: Readonly<Record<string, Verdict[]>>;
  complete: boolean;
}

/** The worst over states and tolerances, of the revision and question it names. */
export interface WorstAnswer {
  revision: number;
  question: WorstQuestion;
  progress: WorstProgress;
  /** Null while the run is under way, and where there are too many states. */
  result: WorstResult | null;
  /** More states than are solved at once; null where they are not too many. */
  tooMany: number | null;
}

/** The band of the focused busbar's impedance, of the revision and question it names. */
export interface EnvelopeAnswer {
  revision: number;
  question: WorstQuestion;
  envelope: ImpedanceEnvelope;
}

/** Something the user must read: a refused file, a failed autosave, a study open twice. */
export interface Notice {
  severity: 'error' | 'warning' | 'info';
  /** One sentence. */
  title: string;
  findings: Finding[];
  /** A way out offered beside the words. */
  offer?: 'save';
}

export interface Status {
  solving: boolean;
  /** What the computation has to say: it was restarted, or why it failed. */
  workerMessage: string | null;
}

export interface WorkbenchState {
  study: Study | null;
  /** Rises by one with every change of the study, undo and redo included. */
  revision: number;
  /** The revision at which this study was opened; earlier answers speak of another one. */
  openedRevision: number;
  /** Names this study among tabs and sessions; not part of the file. */
  documentId: string;
  /** What the last change did, as "undo" names it; null on a fresh study. */
  lastEdit: string | null;
  history: History;
  /** The study before the gesture under way; null when none is. */
  beforePreview: Study | null;
  fileName: string | null;
  fileHandle: FileSystemFileHandle | null;
  /** The study as last opened from or saved to a file; compare with `study` for unsaved changes. */
  savedStudy: Study | null;
  /** Warnings of the file the study came from. */
  importWarnings: Finding[];
  /** Another tab works on this study: here it is only looked at, and nothing of it is kept from here. */
  readOnly: boolean;
  /** Why the study is not being kept in this browser, in a few words; null while it is. */
  keptProblem: string | null;
  view: View;
  answer: Answer | null;
  probe: ProbeAnswer | null;
  allVerdicts: AllVerdicts | null;
  /** Which states and tolerances the worst is looked for in. */
  worstQuestion: WorstQuestion;
  worst: WorstAnswer | null;
  envelope: EnvelopeAnswer | null;
  status: Status;
  notice: Notice | null;
  /** What was said last beside the drawing: what was undone, pasted or refused. The next edit ends it. */
  said: string | null;
}

export interface WorkbenchActions {
  /**
   * Puts a valid study on the table; history starts anew. Without a name it counts as never saved. A document
   * that this browser knows keeps its id; any other gets one.
   */
  openStudy(study: Study, fileName?: string | null, documentId?: string): void;
  /** Reads a study's text. A broken one leaves the open study alone and says why in `notice`. */
  openText(text: string, name: string, handle?: FileSystemFileHandle): boolean;
  openFile(): Promise<void>;
  saveFile(): Promise<void>;
  saveFileAs(): Promise<void>;
  /** Goes on with a study of its own under another title, in no file: the way out of a study open twice. */
  makeCopy(): void;

  /** `said` stands beside the drawing once it is made. */
  edit(edit: Edit, said?: string): void;
  /** Shows an edit while a gesture lasts: always applied to the study before the gesture, no history. */
  preview(edit: Edit): void;
  /** Ends the gesture without a trace. `edit` ends it with one step of history. */
  cancelPreview(): void;
  undo(): void;
  redo(): void;
  /** Pins or unpins a quantity; an edit of the study's view. */
  togglePin(pin: Pin): void;

  setPlace(place: Place): void;
  setCase(caseId: string): void;
  setFocusBus(bus: string): void;
  setOrder(order: number): void;
  setReadingMode(mode: ReadingMode): void;
  setTheme(theme: Theme): void;
  setTimeCursor(fraction: number): void;
  setWaveOrders(orders: WaveOrders): void;
  setMargin(margin: Margin): void;
  setVerdictScope(scope: View['verdictScope']): void;
  /** Throws RangeError for a case the study does not have. */
  compareCases(cases: ComparedCases | null): void;
  select(items: readonly string[]): void;
  askWorst(question: WorstQuestion): void;
  openSlip(item: string): void;
  closeSlip(): void;
  say(words: string): void;
  setNotice(notice: Notice): void;
  dismissNotice(): void;
}

export type Workbench = WorkbenchState & WorkbenchActions;
