import type { Verdict } from '../../checks/index.ts';
import type { Pin } from '../../study/index.ts';
import type { LitPhasor } from '../phasor/PhasorDrawing.tsx';
import type { PictureWay, ReadingPicture } from './noteActions.ts';
import type { NoteSubject } from './noteLetters.ts';
import type { Reading } from './Reading.ts';
import type { WorstCase } from './verdictWords.ts';

/** What the notes column shows, and what it reports. */
export interface NotesColumnProps {
  readings: readonly Reading[];
  verdicts: readonly Verdict[];
  /** Letters by `subjectKey`, from `noteLetters`. */
  letters: ReadonlyMap<string, string>;
  nameOf(subject: NoteSubject): string;
  caseNameOf?(caseId: string): string;
  /** The verdicts are of several cases: each names its own, and they may be gathered by case. */
  everyCase?: boolean;
  /** Where the check of a verdict ends worst, once all cases are judged. */
  worstOf?(verdict: Verdict): WorstCase | undefined;
  /** Subject lit elsewhere (hovered or selected on the drawing). */
  litSubject?: NoteSubject | null;
  /** The note to open and go to when the column appears. */
  firstNote?: string | null;
  order: number;
  timeTurn: number;
  /** The verdicts of this case are still to come. */
  judging?: boolean;
  /** Results belong to an earlier state of the study. */
  stale: boolean;
  onOrder?(order: number): void;
  onTimeTurn?(timeTurn: number): void;
  /** A note is hovered or focused; null when none is. For the leader and the light on the part. */
  onSubject?(subject: NoteSubject | null, noteKey: string | null): void;
  onJump?(verdict: Verdict): void;
  /** A verdict's note is opened or folded. */
  onOpen?(verdict: Verdict): void;
  /** Back from the verdicts of every case to those of the case on screen. */
  onThisCase?(): void;
  onTry?(verdict: Verdict): void;
  onUnpin?(pin: Pin): void;
  /** The pins in a new order. */
  onReorder?(pins: Pin[]): void;
  onCopy?(text: string): void;
  onPicture?(reading: Reading, picture: ReadingPicture, way: PictureWay): void;
  onLit?(lit: LitPhasor | null, reading: Reading): void;
  /** Folds the column to its letters. */
  onFold?(): void;
}
