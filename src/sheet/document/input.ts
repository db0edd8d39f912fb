import type { Verdict } from '../../checks/index.ts';
import type { CaseSolution, ImpedanceScan } from '../../engine/index.ts';
import type { Pin, Study } from '../../study/index.ts';
import type { PaperName } from './model.ts';

/** A busbar's impedance over frequency as the study stands and with every bank and filter out of service. */
export interface SheetScan {
  withCorrection: ImpedanceScan;
  without?: ImpedanceScan;
}

/** Everything computed for one case. */
export interface SheetCase {
  caseId: string;
  solution: CaseSolution;
  /** Every bank and filter out of service. */
  without?: CaseSolution;
  verdicts: readonly Verdict[];
  /** At the busbars chosen for the sheet. */
  scans: readonly SheetScan[];
}

/** What the sheet is made from. Cases may come in any order; the document orders them as the study does. */
export interface SheetInput {
  study: Study;
  /** As the study's fingerprint function gives it. */
  fingerprint: string;
  programmeVersion: string;
  paper: PaperName;
  cases: readonly SheetCase[];
  /** The watched quantities; empty: the sheet chooses and says so. */
  pins: readonly Pin[];
  /** Size of the single-line diagram in its own units, 12 of which are its letter height. */
  drawingSize?: { width: number; height: number };
  /** The case of drawing, waveforms and phasors; absent: the busiest. */
  shownCaseId?: string;
}
