import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { defaultFamilies } from '../../src/sizing/index.ts';
import type { Study } from '../../src/study/index.ts';
import { createComputation, type StudyAt } from '../../src/worker/index.ts';
import { ScriptedWorker } from './ScriptedWorker.ts';

const study: Study = {
  format: 'varwright-study',
  version: 1,
  title: 'Any site',
  frequencyHz: 50,
  buses: [],
  elements: [],
};
const at = (revision: number): StudyAt => ({ revision, study });
const noPoints = { re: new Float64Array(0), im: new Float64Array(0), present: new Uint8Array(0) };
const probe = (order: number) => ({
  caseId: 'base',
  order,
  buses: [],
  with: noPoints,
  without: noPoints,
});

function setUp(timeLimitMs?: number) {
  const workers: ScriptedWorker[] = [];
  const reports: (string | null)[] = [];
  const computation = createComputation({
    spawn: () => {
      const worker = new ScriptedWorker();
      workers.push(worker);
      return worker;
    },
    report: (message) => reports.push(message),
    ...(timeLimitMs === undefined ? {} : { timeLimitMs }),
  });
  return {
    computation,
    workers,
    reports,
    worker: () => workers.at(-1) as ScriptedWorker,
  };
}

describe('the computation client', () => {
  it('starts no worker before it is asked something', () => {
    expect(setUp().workers).toHaveLength(0);
  });

  it('settles an answered request as done with the value', async () => {
    const { computation, worker } = setUp();
    const asked = computation.probe(at(1), 'base', 7);
    worker().reply(probe(7));
    expect(await asked).toEqual({ outcome: 'done', value: probe(7) });
  });

  it('settles a request whose job throws as failed, and the worker lives on', async () => {
    const { computation, worker, workers } = setUp();
    const asked = computation.probe(at(1), 'no such case', 7);
    worker().fail('no case "no such case"');
    expect(await asked).toEqual({ outcome: 'failed', message: 'no case "no such case"' });
    expect(workers).toHaveLength(1);
    expect(worker().terminated).toBe(false);
  });

  it('sends the study once per revision', async () => {
    const { computation, worker } = setUp();
    const send = async (revision: number): Promise<boolean> => {
      const asked = computation.probe(at(revision), 'base', 7);
      worker().reply(probe(7));
      await asked;
      return worker().last.study !== undefined;
    };
    expect(await send(1)).toBe(true);
    expect(await send(1)).toBe(false);
    expect(await send(2)).toBe(true);
    expect(await send(2)).toBe(false);
  });

  it('has one message under way and lets a newer request take the place of the waiting one', async () => {
    const { computation, worker } = setUp();
    const first = computation.probe(at(1), 'base', 2);
    const second = computation.probe(at(1), 'base', 3);
    const third = computation.probe(at(1), 'base', 4);
    expect(worker().sent).toHaveLength(1);
    expect(await second).toEqual({ outcome: 'superseded' });
    worker().reply(probe(2));
    expect(worker().last.job).toEqual({ kind: 'probe', caseId: 'base', order: 4 });
    worker().reply(probe(4));
    expect(await first).toMatchObject({ outcome: 'done', value: { order: 2 } });
    expect(await third).toMatchObject({ outcome: 'done', value: { order: 4 } });
  });

  it('drops every waiting request of an older revision when a newer one is asked for', async () => {
    const { computation, worker } = setUp();
    const running = computation.probe(at(1), 'base', 2);
    const scan = computation.scan(at(1), 'base', 'main');
    void computation.solve(at(2), 'base');
    expect(await scan).toEqual({ outcome: 'superseded' });
    worker().reply(probe(2));
    expect(await running).toMatchObject({ outcome: 'done' });
    expect(worker().last).toMatchObject({ revision: 2, job: { kind: 'solve' } });
  });

  it('serves the scrub first, then the case on screen, its verdicts, then the curves', () => {
    const { computation, worker } = setUp();
    void computation.scan(at(1), 'base', 'main');
    void computation.scan(at(1), 'base', 'intake');
    void computation.verdicts(at(1), 'base');
    void computation.solve(at(1), 'base');
    void computation.probe(at(1), 'base', 5);
    const kinds: string[] = [];
    for (let i = 0; i < 5; i += 1) {
      kinds.push(worker().last.job.kind);
      worker().reply([]);
    }
    expect(kinds).toEqual(['scan', 'probe', 'solve', 'judge', 'scan']);
  });

  it('judges in a worker of its own, the case on screen before all cases, so that solving never waits', () => {
    const { computation, workers } = setUp();
    void computation.results(at(1));
    void computation.judgeAll(at(1), ['base'], () => {});
    void computation.judge(at(1), 'base');
    void computation.solve(at(1), 'base');
    const [patient, live] = workers as [ScriptedWorker, ScriptedWorker];
    expect(live.last).toMatchObject({ study, job: { kind: 'solve' } });
    const kinds: string[] = [];
    for (let i = 0; i < 3; i += 1) {
      kinds.push(patient.last.job.kind);
      patient.reply([]);
    }
    expect(kinds).toEqual(['results', 'judge', 'judge']);
  });

  it('judges all cases one by one and reports after each', async () => {
    const { computation, worker } = setUp();
    const judged: string[] = [];
    const asked = computation.judgeAll(at(1), ['day', 'night'], (caseId) => judged.push(caseId));
    worker().reply([]);
    await vi.waitFor(() => expect(worker().last.job).toMatchObject({ kind: 'judge', caseId: 'night' }));
    expect(judged).toEqual(['day']);
    worker().reply([]);
    expect(await asked).toEqual({ outcome: 'done', value: [[], []] });
    expect(judged).toEqual(['day', 'night']);
  });

  it('ends a round over all cases when a newer round begins', async () => {
    const { computation, worker } = setUp();
    const judged: string[] = [];
    const older = computation.judgeAll(at(1), ['day', 'night'], () => judged.push('older'));
    const newer = computation.judgeAll(at(2), ['day'], () => judged.push('newer'));
    worker().reply([]);
    expect(await older).toEqual({ outcome: 'superseded' });
    worker().reply([]);
    expect(await newer).toEqual({ outcome: 'done', value: [[]] });
    expect(judged).toEqual(['newer']);
  });

  it('asks slice after slice for the worst and reports each, until it is there', async () => {
    const progress = { done: 1, total: 3, points: 20 };
    const result = { verdicts: [], states: 3, points: 60, bound: 0, unsolved: [] };
    const question = { families: defaultFamilies, tolerances: null };
    const seen: number[] = [];
    const { computation, worker } = setUp();
    const asked = computation.worst(at(1), question, ({ done }) => seen.push(done));
    worker().reply({ state: 'running', progress });
    await vi.waitFor(() => expect(seen).toEqual([1]));
    worker().reply({ state: 'done', result });
    expect(await asked).toEqual({ outcome: 'done', value: { state: 'done', result } });
  });

  it('ends a run for the worst when another question is asked', async () => {
    const question = { families: defaultFamilies, tolerances: null };
    const { computation, worker } = setUp();
    const older = computation.worst(at(1), question, () => {});
    const newer = computation.worst(at(1), { ...question }, () => {});
    worker().reply({ state: 'running', progress: { done: 1, total: 3, points: 20 } });
    expect(await older).toEqual({ outcome: 'superseded' });
    worker().reply({ state: 'too-many', count: 4096 });
    expect(await newer).toEqual({ outcome: 'done', value: { state: 'too-many', count: 4096 } });
  });

  it('cancels what waits and what runs, and ignores the late answer', async () => {
    const { computation, worker } = setUp();
    const running = computation.probe(at(1), 'base', 2);
    const waiting = computation.solve(at(1), 'base');
    computation.cancel();
    expect(await running).toEqual({ outcome: 'cancelled' });
    expect(await waiting).toEqual({ outcome: 'cancelled' });
    worker().reply(probe(2));
    const next = computation.probe(at(1), 'base', 3);
    worker().reply(probe(3));
    expect(await next).toMatchObject({ outcome: 'done', value: { order: 3 } });
  });

  it('cancels one lane alone', async () => {
    const { computation, worker } = setUp();
    const running = computation.probe(at(1), 'base', 2);
    const waiting = computation.solve(at(1), 'base');
    computation.cancel('solve');
    expect(await waiting).toEqual({ outcome: 'cancelled' });
    worker().reply(probe(2));
    expect(await running).toMatchObject({ outcome: 'done' });
  });

  it('restarts a crashed worker, says so, sends study and request again and is well afterwards', async () => {
    const { computation, worker, workers, reports } = setUp();
    const asked = computation.probe(at(3), 'base', 2);
    worker().crash('out of memory');
    expect(workers[0]?.terminated).toBe(true);
    expect(workers).toHaveLength(2);
    expect(reports).toEqual(['The computation stopped (out of memory) and was restarted.']);
    expect(worker().last).toMatchObject({ revision: 3, study, job: { kind: 'probe', order: 2 } });
    worker().reply(probe(2));
    expect(await asked).toMatchObject({ outcome: 'done' });
    expect(reports.at(-1)).toBeNull();
  });

  it('fails a request over which the worker crashed twice', async () => {
    const { computation, worker } = setUp();
    const asked = computation.solve(at(1), 'base');
    worker().crash('boom');
    worker().crash('boom');
    expect(await asked).toEqual({
      outcome: 'failed',
      message: 'The computation stopped twice over this request (boom).',
    });
  });

  it('prefers a newer request to repeating the one that crashed', async () => {
    const { computation, worker } = setUp();
    const crashed = computation.solve(at(1), 'base');
    const newer = computation.solve(at(2), 'base');
    worker().crash('');
    expect(await crashed).toEqual({ outcome: 'superseded' });
    worker().reply(probe(1));
    expect(await newer).toMatchObject({ outcome: 'done' });
  });

  it('gives up after three crashes in a row and fails whatever is asked then', async () => {
    const { computation, worker, workers, reports } = setUp();
    const first = computation.solve(at(1), 'base');
    worker().crash('');
    worker().crash('');
    const second = computation.solve(at(1), 'base');
    worker().crash('');
    expect(await first).toMatchObject({ outcome: 'failed' });
    expect(await second).toMatchObject({ outcome: 'failed' });
    expect(await computation.scan(at(1), 'base', 'main')).toMatchObject({ outcome: 'failed' });
    expect(workers).toHaveLength(3);
    expect(reports.at(-1)).toContain('reload the page');
  });

  it('settles as failed when no worker can be started at all', async () => {
    const computation = createComputation({
      spawn: () => {
        throw new Error('workers are forbidden');
      },
    });
    expect(await computation.results(at(1))).toMatchObject({
      outcome: 'failed',
      message: expect.stringContaining('workers are forbidden'),
    });
  });

  it('cancels everything, now and later, once closed', async () => {
    const { computation, worker } = setUp();
    const running = computation.solve(at(1), 'base');
    computation.close();
    expect(await running).toEqual({ outcome: 'cancelled' });
    expect(worker().terminated).toBe(true);
    expect(await computation.solve(at(1), 'base')).toEqual({ outcome: 'cancelled' });
    expect(await computation.results(at(1))).toEqual({ outcome: 'cancelled' });
  });

  it('warms both workers, slice by slice, until the code is hot', async () => {
    const { computation, worker, workers } = setUp();
    const warmed = computation.warm();
    for (const [index, hot] of [
      [0, false],
      [0, true],
      [1, false],
      [1, false],
      [1, true],
    ] as const) {
      await vi.waitFor(() => expect(workers).toHaveLength(index + 1));
      expect(worker().last.job).toEqual({ kind: 'warm' });
      const before = worker().sent.length;
      worker().reply({ hot });
      if (!hot) await vi.waitFor(() => expect(worker().sent.length).toBe(before + 1));
    }
    await warmed;
    expect(workers.map(({ sent }) => sent.length)).toEqual([2, 3]);
  });
});

describe('the time limit', () => {
  beforeEach(() => vi.useFakeTimers());
  afterEach(() => vi.useRealTimers());

  it('stops a worker that does not answer, fails the request and serves the next', async () => {
    const { computation, worker, workers, reports } = setUp(5000);
    const hung = computation.solve(at(1), 'base');
    const next = computation.probe(at(1), 'base', 3);
    vi.advanceTimersByTime(5001);
    expect(await hung).toMatchObject({ outcome: 'failed', message: expect.stringContaining('5 s') });
    expect(workers).toHaveLength(2);
    expect(reports).toHaveLength(1);
    worker().reply(probe(3));
    expect(await next).toMatchObject({ outcome: 'done' });
  });
});
