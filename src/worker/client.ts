import type { Verdict } from '../checks/index.ts';
import type { ResultsFile } from '../engine/index.ts';
import type { ImpedanceEnvelope, WorstProgress } from '../sizing/index.ts';
import { type ComputationOptions, Dispatcher, type Lane, type StudyAt } from './dispatcher.ts';
import type {
  CaseDossier,
  CaseNumbers,
  Probe,
  ScanPair,
  Settled,
  WorstEnd,
  WorstQuestion,
} from './protocol.ts';

/**
 * The computation as the page sees it. Every promise settles: done, failed, cancelled or superseded; none
 * rejects. Of several requests of one kind only the newest waits. Two workers: one answers what must keep
 * pace with the hand (probe, solve, verdicts, scan), the other what may take its time (verdicts with their screening
 * rows, all cases, results, dossiers), so that the second never holds up the first.
 */
export interface Computation {
  /** Solves a small built-in study, in slices, until the code is compiled. */
  warm(): Promise<void>;
  solve(at: StudyAt, caseId: string): Promise<Settled<CaseNumbers>>;
  scan(at: StudyAt, caseId: string, focusBus: string): Promise<Settled<ScanPair>>;
  probe(at: StudyAt, caseId: string, order: number): Promise<Settled<Probe>>;
  /** The verdicts of a case that need no scan: all but the screening rows. */
  verdicts(at: StudyAt, caseId: string): Promise<Settled<Verdict[]>>;
  /** Every verdict of a case, screening rows included. */
  judge(at: StudyAt, caseId: string): Promise<Settled<Verdict[]>>;
  /** Judges case by case, `onCase` after each; any other request goes first in between. */
  judgeAll(
    at: StudyAt,
    caseIds: readonly string[],
    onCase: (caseId: string, verdicts: Verdict[]) => void,
  ): Promise<Settled<Verdict[][]>>;
  /**
   * The worst of every check over states and tolerances, slice by slice, `onProgress` after each; any other
   * request goes first in between. A newer question or revision ends it as superseded.
   */
  worst(
    at: StudyAt,
    question: WorstQuestion,
    onProgress: (progress: WorstProgress) => void,
  ): Promise<Settled<WorstEnd>>;
  /** The band of a busbar's impedance over states and tolerances, in slices like `worst`; null where there is none. */
  envelope(at: StudyAt, bus: string, question: WorstQuestion): Promise<Settled<ImpedanceEnvelope | null>>;
  results(at: StudyAt): Promise<Settled<ResultsFile>>;
  /** What a printed study needs, case by case, with the impedance curves of the busbars named. */
  dossiers(
    at: StudyAt,
    caseIds: readonly string[],
    buses: readonly string[],
    onCase: (dossier: CaseDossier, done: number) => void,
  ): Promise<Settled<CaseDossier[]>>;
  /** Withdraws what was asked in a lane, or in all of them. */
  cancel(lane?: Lane): void;
  /** Ends the worker; whatever was asked is cancelled, and so is whatever will be. */
  close(): void;
}

const maxWarmRounds = 60;

export function createComputation(options: ComputationOptions): Computation {
  const live = new Dispatcher(options);
  const patient = new Dispatcher(options);
  const newestRound = new Map<Lane, object>();

  async function warm(): Promise<void> {
    for (const dispatcher of [live, patient]) {
      for (let round = 0; round < maxWarmRounds; round += 1) {
        const slice = await dispatcher.ask('warm', { kind: 'warm' }, null);
        if (slice.outcome !== 'done' || slice.value.hot) break;
      }
    }
  }

  /** One request per case, in a lane of its own; a newer round in that lane ends this one. */
  async function round<T>(
    lane: Lane,
    caseIds: readonly string[],
    askCase: (caseId: string) => Promise<Settled<T>>,
    onCase: (caseId: string, value: T, done: number) => void,
  ): Promise<Settled<T[]>> {
    const own = {};
    newestRound.set(lane, own);
    const values: T[] = [];
    for (const caseId of caseIds) {
      const slice = await askCase(caseId);
      if (newestRound.get(lane) !== own) return { outcome: 'superseded' };
      if (slice.outcome !== 'done') return slice;
      values.push(slice.value);
      onCase(caseId, slice.value, values.length);
    }
    return { outcome: 'done', value: values };
  }

  async function worst(
    at: StudyAt,
    question: WorstQuestion,
    onProgress: (progress: WorstProgress) => void,
  ): Promise<Settled<WorstEnd>> {
    const own = {};
    newestRound.set('worst', own);
    for (;;) {
      const slice = await patient.ask('worst', { kind: 'worst', question }, at);
      if (newestRound.get('worst') !== own) return { outcome: 'superseded' };
      if (slice.outcome !== 'done') return slice;
      if (slice.value.state !== 'running') return { outcome: 'done', value: slice.value };
      onProgress(slice.value.progress);
    }
  }

  async function envelope(
    at: StudyAt,
    bus: string,
    question: WorstQuestion,
  ): Promise<Settled<ImpedanceEnvelope | null>> {
    const own = {};
    newestRound.set('envelope', own);
    for (;;) {
      const slice = await patient.ask('envelope', { kind: 'envelope', bus, question }, at);
      if (newestRound.get('envelope') !== own) return { outcome: 'superseded' };
      if (slice.outcome !== 'done') return slice;
      if (slice.value.state === 'done') return { outcome: 'done', value: slice.value.result };
    }
  }

  return {
    warm,
    solve: (at, caseId) => live.ask('solve', { kind: 'solve', caseId }, at),
    scan: (at, caseId, focusBus) => live.ask('scan', { kind: 'scan', caseId, focusBus }, at),
    probe: (at, caseId, order) => live.ask('probe', { kind: 'probe', caseId, order }, at),
    verdicts: (at, caseId) => live.ask('verdicts', { kind: 'judge', caseId, screening: false }, at),
    judge: (at, caseId) => patient.ask('judge', { kind: 'judge', caseId, screening: true }, at),
    judgeAll: (at, caseIds, onCase) =>
      round(
        'judgeAll',
        caseIds,
        (caseId) => patient.ask('judgeAll', { kind: 'judge', caseId, screening: true }, at),
        onCase,
      ),
    dossiers: (at, caseIds, buses, onCase) =>
      round(
        'dossiers',
        caseIds,
        (caseId) => patient.ask('dossiers', { kind: 'dossier', caseId, buses }, at),
        (_, dossier, done) => onCase(dossier, done),
      ),
    worst,
    envelope,
    results: (at) => patient.ask('results', { kind: 'results' }, at),
    cancel: (lane) => {
      for (const dispatcher of [live, patient]) dispatcher.cancel(lane);
    },
    close: () => {
      for (const dispatcher of [live, patient]) dispatcher.close();
    },
  };
}
