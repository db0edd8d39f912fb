import type { Verdict } from '../../src/checks/index.ts';
import type { CaseSolution, ImpedanceScan } from '../../src/engine/index.ts';
import type {
  CaseNumbers,
  Computation,
  Probe,
  ScanPair,
  Settled,
  StudyAt,
  WorstQuestion,
} from '../../src/worker/index.ts';

interface Asked {
  kind: 'solve' | 'scan' | 'probe' | 'verdicts' | 'judge';
  at: StudyAt;
  caseId: string;
  focusBus?: string | undefined;
  order?: number;
  settle: (end: Settled<never>) => void;
}

const none = new Float64Array(0);
const arrays = { re: none, im: none };
const points = { ...arrays, present: new Uint8Array(0) };

function solution(caseId: string): CaseSolution {
  return {
    caseId,
    frequencyHz: 50,
    maxOrder: 5,
    summation: 'phasor',
    converged: true,
    iterations: 3,
    buses: [],
    terminals: [],
    deenergised: [],
    voltage: arrays,
    current: arrays,
    lineVoltage: none,
    neutralCurrent: none,
    judged: {
      voltage: none,
      lineVoltage: none,
      current: none,
      neutralCurrent: none,
      anglesUnknown: [],
    },
    warnings: [],
  };
}

function scanPair(bus: string): ScanPair {
  const scan: ImpedanceScan = {
    bus,
    sequence: 'positive',
    frequencyHz: none,
    re: none,
    im: none,
    resonances: [],
  };
  return { bus, with: scan, without: scan };
}

export function verdictOf(caseId: string, word: Verdict['verdict']): Verdict {
  return {
    key: `bus-voltage|main|${caseId}`,
    check: 'bus-voltage',
    title: 'steady voltage',
    subject: { kind: 'bus', id: 'main' },
    caseId,
    value: 400,
    limit: 440,
    unit: 'V',
    margin: 0.5,
    verdict: word,
    screening: false,
    working: [],
    source: { document: 'common practice', provenance: 'practice' },
    remarks: [],
  };
}

/**
 * A computation that answers when the test says so, with empty numbers that name case, busbar and order.
 * Only for what the store does with answers; what the answers hold is tested with the real one.
 */
export class ScriptedComputation implements Computation {
  readonly asked: Asked[] = [];
  readonly allRounds: { at: StudyAt; caseIds: readonly string[] }[] = [];

  private ask<T>(asked: Omit<Asked, 'settle'>): Promise<Settled<T>> {
    return new Promise((resolve) => {
      this.asked.push({ ...asked, settle: (end) => resolve(end as Settled<T>) });
    });
  }

  warm = async (): Promise<void> => {};
  solve = (at: StudyAt, caseId: string) => this.ask<CaseNumbers>({ kind: 'solve', at, caseId });
  scan = (at: StudyAt, caseId: string, focusBus: string) =>
    this.ask<ScanPair>({ kind: 'scan', at, caseId, focusBus });
  probe = (at: StudyAt, caseId: string, order: number) =>
    this.ask<Probe>({ kind: 'probe', at, caseId, order });
  verdicts = (at: StudyAt, caseId: string) => this.ask<Verdict[]>({ kind: 'verdicts', at, caseId });
  judge = (at: StudyAt, caseId: string) => this.ask<Verdict[]>({ kind: 'judge', at, caseId });
  results = () => Promise.resolve({ outcome: 'cancelled' } as const);
  dossiers = () => Promise.resolve({ outcome: 'cancelled' } as const);
  readonly worstAsked: { at: StudyAt; question: WorstQuestion }[] = [];
  worst: Computation['worst'] = async (at, question, onProgress) => {
    this.worstAsked.push({ at, question });
    onProgress({ done: 1, total: 2, points: 7 });
    const result = { verdicts: [], states: 2, points: 9, bound: 0, unsolved: [] };
    return { outcome: 'done', value: { state: 'done', result } };
  };
  readonly envelopesAsked: { at: StudyAt; bus: string }[] = [];
  envelope: Computation['envelope'] = async (at, bus) => {
    this.envelopesAsked.push({ at, bus });
    const none = new Float64Array(0);
    return {
      outcome: 'done',
      value: { bus, frequencyHz: none, lowOhm: none, highOhm: none, states: 1 },
    };
  };
  cancel = (): void => {};
  close = (): void => {};

  judgeAll: Computation['judgeAll'] = async (at, caseIds, onCase) => {
    this.allRounds.push({ at, caseIds });
    const value = caseIds.map((caseId) => [verdictOf(caseId, 'fail')]);
    caseIds.forEach((caseId, i) => {
      onCase(caseId, value[i] ?? []);
    });
    return { outcome: 'done', value };
  };

  /** The newest request of a kind that is still open. */
  open(kind: Asked['kind']): Asked {
    const found = this.asked.findLast((asked) => asked.kind === kind);
    if (!found) throw new Error(`no ${kind} was asked`);
    return found;
  }

  count(kind: Asked['kind']): number {
    return this.asked.filter((asked) => asked.kind === kind).length;
  }

  /** Answers a request, by default the newest of its kind, and lets the store take it in. */
  async answer(kind: Asked['kind'], asked: Asked = this.open(kind)): Promise<void> {
    const { caseId, focusBus, order = 1 } = asked;
    const values = {
      solve: { solution: solution(caseId), without: solution(caseId) },
      verdicts: [verdictOf(caseId, 'pass')],
      scan: scanPair(focusBus ?? ''),
      probe: { caseId, order, buses: [], with: points, without: points },
      judge: [
        verdictOf(caseId, 'pass'),
        { ...verdictOf(caseId, 'watch'), key: `amplification|main|${caseId}`, screening: true },
      ],
    };
    asked.settle({ outcome: 'done', value: values[kind] as never });
    await settled();
  }

  async end(kind: Asked['kind'], end: Settled<never>): Promise<void> {
    this.open(kind).settle(end);
    await settled();
  }
}

/** Lets every promise that is ready run. */
export function settled(): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, 0));
}
