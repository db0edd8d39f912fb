/**
 * What page and computation say to each other. Plain structured-clone data: ids, numbers, typed arrays.
 *
 *   page ── {id, job, revision, study?} ──► worker        one message at a time
 *   page ◄── {id, reply} | {id, failed} ─── worker        typed arrays transferred
 *
 * The study travels only with the first message of a revision; the worker keeps it until the next one.
 */
import type { Verdict } from '../checks/index.ts';
import type { CaseSolution, DrivingPoints, ImpedanceScan, ResultsFile } from '../engine/index.ts';
import type {
  ImpedanceEnvelope,
  StateFamilies,
  ToleranceSettings,
  WorstProgress,
  WorstResult,
} from '../sizing/index.ts';
import type { Study } from '../study/index.ts';

/** Positive-sequence driving-point impedance of one busbar with and without the correction, on one axis. */
export interface ScanPair {
  bus: string;
  with: ImpedanceScan;
  /** All banks and filters out of service. */
  without: ImpedanceScan;
}

/** Everything the drawing and readings show of one case. */
export interface CaseNumbers {
  solution: CaseSolution;
  /** The same case with all banks and filters out of service. */
  without: CaseSolution;
}

/** Driving-point impedance at one real-valued order, ohm per phase, positive sequence, bus by bus. */
export interface Probe {
  caseId: string;
  /** h = f/fn. */
  order: number;
  /** Bus ids, the index of both arrays. */
  buses: string[];
  with: DrivingPoints;
  without: DrivingPoints;
}

/** Everything a printed case needs. */
export interface CaseDossier {
  caseId: string;
  solution: CaseSolution;
  without: CaseSolution;
  /** In the order the busbars were asked for. */
  scans: ScanPair[];
  verdicts: Verdict[];
}

/** Which states and tolerances the worst is looked for in; null leaves the parts at their rated values. */
export interface WorstQuestion {
  families: StateFamilies;
  tolerances: ToleranceSettings | null;
}

/** One slice of a worst-case run: it goes on with the next request of the same question. */
export type WorstSlice =
  | { state: 'running'; progress: WorstProgress }
  | { state: 'done'; result: WorstResult }
  /** More states than are solved at once: the families are to be narrowed. */
  | { state: 'too-many'; count: number };

/** One slice of the band of a busbar's impedance; null where it has no source, or the states are too many. */
export type EnvelopeSlice = { state: 'running' } | { state: 'done'; result: ImpedanceEnvelope | null };

/** How a worst-case run ended. */
export type WorstEnd = Exclude<WorstSlice, { state: 'running' }>;

export type Job =
  | { kind: 'warm' }
  | { kind: 'solve'; caseId: string }
  | { kind: 'scan'; caseId: string; focusBus: string }
  | { kind: 'probe'; caseId: string; order: number }
  /** Without the screening rows, which scan the network again and again, it is a matter of milliseconds. */
  | { kind: 'judge'; caseId: string; screening: boolean }
  | { kind: 'dossier'; caseId: string; buses: readonly string[] }
  | { kind: 'worst'; question: WorstQuestion }
  | { kind: 'envelope'; bus: string; question: WorstQuestion }
  | { kind: 'results' };

export type JobKind = Job['kind'];

/** What each job answers. */
export interface Replies {
  /** Whether another round would still make the code faster. */
  warm: { hot: boolean };
  solve: CaseNumbers;
  scan: ScanPair;
  probe: Probe;
  judge: Verdict[];
  dossier: CaseDossier;
  worst: WorstSlice;
  envelope: EnvelopeSlice;
  results: ResultsFile;
}

export interface RequestMessage {
  id: number;
  revision: number;
  /** Sent when the worker does not hold this revision yet. */
  study?: Study;
  job: Job;
}

export type ReplyMessage =
  | { id: number; reply: Replies[JobKind] }
  /** The job threw; the worker lives on. */
  | { id: number; failed: string };

/** How a request ended. Every request ends in exactly one of these. */
export type Settled<T> =
  | { outcome: 'done'; value: T }
  /** The computation stopped: why, in words. */
  | { outcome: 'failed'; message: string }
  /** The asker withdrew it, or the client was closed. */
  | { outcome: 'cancelled' }
  /** A newer request of the same kind took its place before it began. */
  | { outcome: 'superseded' };
