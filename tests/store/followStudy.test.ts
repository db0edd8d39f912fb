import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import {
  countVerdicts,
  createWorkbench,
  followStudy,
  freshEnvelope,
  freshVerdicts,
  freshWorst,
  isScanStale,
  isScreened,
  isStale,
  type WorkbenchStore,
} from '../../src/store/index.ts';
import { MemoryFiles } from './MemoryFiles.ts';
import { ScriptedComputation, settled } from './ScriptedComputation.ts';
import { retitle, site } from './site.ts';

let store: WorkbenchStore;
let computation: ScriptedComputation;
let frames: (() => void)[];
let unfollow: () => void;
const state = () => store.getState();

beforeEach(() => {
  store = createWorkbench(new MemoryFiles());
  computation = new ScriptedComputation();
  frames = [];
  unfollow = followStudy(store, computation, { frame: (work) => frames.push(work), judgeAllAfterMs: 1 });
});
afterEach(() => unfollow());

async function paint(): Promise<void> {
  for (const work of frames.splice(0)) work();
  await settled();
}

describe('following the study', () => {
  it('asks nothing while there is no study', () => {
    state().setNotice({ severity: 'info', title: 'Hello', findings: [] });
    expect(computation.asked).toHaveLength(0);
  });

  it('solves the case on screen when a study is opened, then judges, scans and screens it', async () => {
    state().openStudy(site);
    expect(computation.open('solve').caseId).toBe('day');
    expect(state().status.solving).toBe(true);
    await computation.answer('solve');
    expect(state().status.solving).toBe(false);
    expect(state().answer).toMatchObject({ caseId: 'day', scan: null, verdicts: [], verdictsRevision: null });
    expect([isStale(state()), freshVerdicts(state())]).toEqual([false, null]);
    await computation.answer('verdicts');
    expect(freshVerdicts(state())).toHaveLength(1);
    await computation.answer('scan');
    expect(isScanStale(state())).toBe(false);
    expect(isScreened(state())).toBe(false);
    await computation.answer('judge');
    expect(freshVerdicts(state())).toHaveLength(2);
    expect(isScreened(state())).toBe(true);
  });

  it('keeps verdicts and curves before an edit, as older ones, until the new ones arrive', async () => {
    state().openStudy(site);
    for (const kind of ['solve', 'verdicts', 'scan', 'judge'] as const) await computation.answer(kind);
    const { revision } = state();
    expect(countVerdicts('watch', 'case')(state())).toBe(1);
    state().edit(retitle('A'));
    await computation.answer('solve');
    expect(state().answer).toMatchObject({ scan: { revision }, verdictsRevision: revision });
    expect(state().answer?.verdicts).toHaveLength(2);
    expect(freshVerdicts(state())).toBeNull();
    await computation.answer('verdicts');
    expect(freshVerdicts(state())).toHaveLength(2);
    expect(countVerdicts('watch', 'case')(state())).toBe(0);
    expect([isScanStale(state()), isScreened(state())]).toEqual([true, false]);
    await computation.answer('scan');
    await computation.answer('judge');
    expect([isScanStale(state()), isScreened(state())]).toEqual([false, true]);
    expect(countVerdicts('watch', 'case')(state())).toBe(1);
  });

  it('keeps nothing of the case looked at before', async () => {
    state().openStudy(site);
    for (const kind of ['solve', 'verdicts', 'scan'] as const) await computation.answer(kind);
    state().setCase('night');
    await computation.answer('solve');
    expect(state().answer).toMatchObject({
      caseId: 'night',
      scan: null,
      verdicts: [],
      verdictsRevision: null,
    });
  });

  it('marks the answer stale from the edit until the new answer', async () => {
    state().openStudy(site);
    await computation.answer('solve');
    state().edit(retitle('A'));
    expect(isStale(state())).toBe(true);
    expect(freshVerdicts(state())).toBeNull();
    await computation.answer('solve');
    expect(isStale(state())).toBe(false);
    expect(state().answer?.revision).toBe(state().revision);
  });

  it('solves again after undo and redo', () => {
    state().openStudy(site);
    state().edit(retitle('A'));
    state().undo();
    state().redo();
    expect(computation.count('solve')).toBe(4);
    expect(computation.open('solve').at.study.title).toBe('A');
  });

  it('shows an answer a few edits old as stale while newer ones are on their way, never an older one after it', async () => {
    state().openStudy(site);
    const first = computation.open('solve');
    state().edit(retitle('A'));
    const second = computation.open('solve');
    state().edit(retitle('B'));
    await computation.answer('solve', second);
    expect(state().answer?.revision).toBe(second.at.revision);
    expect(isStale(state())).toBe(true);
    expect(state().status.solving).toBe(true);
    await computation.answer('solve', first);
    expect(state().answer?.revision).toBe(second.at.revision);
  });

  it('drops an answer that speaks of the study opened before', async () => {
    state().openStudy(site);
    const first = computation.open('solve');
    state().openStudy({ ...site, title: 'Another' });
    await computation.answer('solve', first);
    expect(state().answer).toBeNull();
  });

  it('drops an answer of a case no longer on screen', async () => {
    state().openStudy(site);
    const day = computation.open('solve');
    state().setCase('night');
    await computation.answer('solve', day);
    expect(state().answer).toBeNull();
    await computation.answer('solve');
    expect(state().answer?.caseId).toBe('night');
  });

  it('scans alone when only the busbar changes, and keeps the solution object', async () => {
    state().openStudy(site);
    await computation.answer('solve');
    const solution = state().answer?.solution;
    state().setFocusBus('in');
    expect(computation.count('solve')).toBe(1);
    await computation.answer('scan');
    expect(state().answer?.scan?.bus).toBe('in');
    expect(state().answer?.solution).toBe(solution);
  });

  it('scans the busbar chosen while the case was being solved', async () => {
    state().openStudy(site);
    const solving = computation.open('solve');
    state().setFocusBus('in');
    await computation.answer('solve', solving);
    await computation.answer('scan');
    expect(state().answer?.scan?.bus).toBe('in');
  });

  it('says a failure in the status and ends solving', async () => {
    state().openStudy(site);
    await computation.end('solve', { outcome: 'failed', message: 'singular' });
    expect(state().status).toEqual({ solving: false, workerMessage: 'singular' });
    expect(isStale(state())).toBe(true);
  });

  it('goes on showing that it solves when a request was superseded by a newer one', async () => {
    state().openStudy(site);
    const first = computation.open('solve');
    state().edit(retitle('A'));
    first.settle({ outcome: 'superseded' });
    await settled();
    expect(state().status.solving).toBe(true);
  });
});

describe('scrubbing', () => {
  it('probes once a frame, at the newest order, and solves nothing', async () => {
    state().openStudy(site);
    await computation.answer('solve');
    await paint();
    const [probes, solves] = [computation.count('probe'), computation.count('solve')];
    for (const order of [3, 4, 5.5]) state().setOrder(order);
    expect(frames).toHaveLength(1);
    await paint();
    expect(computation.count('probe')).toBe(probes + 1);
    expect(computation.open('probe').order).toBe(5.5);
    expect(computation.count('solve')).toBe(solves);
    await computation.answer('probe');
    expect(state().probe).toMatchObject({ order: 5.5, caseId: 'day', revision: state().revision });
  });

  it('leaves study, answer and selection as they are', async () => {
    state().openStudy(site);
    await computation.answer('solve');
    const { study, answer, view } = state();
    state().setOrder(7);
    await paint();
    await computation.answer('probe');
    expect(state().study).toBe(study);
    expect(state().answer).toBe(answer);
    expect(state().view.selection).toBe(view.selection);
  });

  it('probes again after an edit', async () => {
    state().openStudy(site);
    await paint();
    state().edit(retitle('A'));
    await paint();
    expect(computation.open('probe').at.revision).toBe(state().revision);
  });
});

describe('judging all cases', () => {
  async function solveAndJudge(): Promise<void> {
    await computation.answer('solve');
    await computation.answer('verdicts');
    await computation.answer('judge');
    await new Promise((resolve) => setTimeout(resolve, 20));
  }

  it('follows the case on screen after a quiet time and counts nothing before all are known', async () => {
    state().openStudy(site);
    await computation.answer('solve');
    expect(countVerdicts('fail', 'all')(state())).toBeNull();
    await computation.answer('verdicts');
    await computation.answer('judge');
    await new Promise((resolve) => setTimeout(resolve, 20));
    expect(computation.allRounds).toMatchObject([{ caseIds: ['night'] }]);
    expect(state().allVerdicts).toMatchObject({ complete: true, revision: state().revision });
    expect(countVerdicts('fail', 'all')(state())).toBe(1);
    expect(countVerdicts('pass', 'case')(state())).toBe(1);
  });

  it('counts nothing from an older revision', async () => {
    state().openStudy(site);
    await solveAndJudge();
    state().edit(retitle('A'));
    expect(countVerdicts('fail', 'all')(state())).toBeNull();
    expect(countVerdicts('fail', 'case')(state())).toBeNull();
  });

  it('uses the verdicts already known when another case is looked at', async () => {
    state().openStudy(site);
    await solveAndJudge();
    const judged = computation.count('judge');
    state().setCase('night');
    await computation.answer('solve');
    expect(freshVerdicts(state())).toMatchObject([{ caseId: 'night', verdict: 'fail' }]);
    expect(computation.count('judge')).toBe(judged);
  });

  it('waits until a gesture has ended', async () => {
    state().openStudy(site);
    state().preview(retitle('A'));
    await solveAndJudge();
    expect(computation.allRounds).toHaveLength(0);
    state().edit(retitle('A'));
    await solveAndJudge();
    expect(computation.allRounds).toHaveLength(1);
  });
});

describe('the worst over states and tolerances', () => {
  async function judgedAll(): Promise<void> {
    for (const kind of ['solve', 'verdicts', 'scan', 'judge'] as const) await computation.answer(kind);
    await new Promise((resolve) => setTimeout(resolve, 5));
    await settled();
  }

  it('is looked for once all cases are judged, and belongs to the study on screen', async () => {
    state().openStudy(site);
    await computation.answer('solve');
    expect(computation.worstAsked).toHaveLength(0);
    await computation.answer('verdicts');
    await computation.answer('judge');
    await new Promise((resolve) => setTimeout(resolve, 5));
    await settled();
    expect(computation.worstAsked).toHaveLength(1);
    expect(freshWorst(state())?.points).toBe(9);
    expect(state().worst?.progress).toEqual({ done: 2, total: 2, points: 9 });
    state().edit(retitle('A'));
    expect(freshWorst(state())).toBeNull();
  });

  it('is asked again for other states alone, without solving anything else', async () => {
    state().openStudy(site);
    await judgedAll();
    const solves = computation.count('solve');
    const { families } = state().worstQuestion;
    state().askWorst({ families: { ...families, couplers: true }, tolerances: null });
    expect(freshWorst(state())).toBeNull();
    await settled();
    expect(computation.worstAsked.at(-1)?.question.families.couplers).toBe(true);
    expect(freshWorst(state())?.states).toBe(2);
    expect(computation.count('solve')).toBe(solves);
  });

  it('comes after the band of the busbar on the rail, which follows the busbar', async () => {
    state().openStudy(site);
    await judgedAll();
    expect(computation.envelopesAsked.map(({ bus }) => bus)).toEqual([state().view.focusBus]);
    expect(freshEnvelope(state())?.bus).toBe(state().view.focusBus);
    const other = site.buses.find(({ id }) => id !== state().view.focusBus)?.id ?? '';
    state().setFocusBus(other);
    expect(freshEnvelope(state())).toBeNull();
    await settled();
    expect(freshEnvelope(state())?.bus).toBe(other);
    expect(computation.worstAsked).toHaveLength(1);
  });

  it('is not asked twice for what is known', async () => {
    state().openStudy(site);
    await judgedAll();
    state().setCase('night');
    await judgedAll();
    expect(computation.worstAsked).toHaveLength(1);
  });
});
