import { sortByMargin } from '../checks/index.ts';
import type { WorstProgress, WorstResult } from '../sizing/index.ts';
import { casesOf } from '../study/index.ts';
import type { CaseNumbers, Computation, Settled, StudyAt } from '../worker/index.ts';
import type { WorkbenchStore } from './createWorkbench.ts';
import { isScreened } from './selectors.ts';
import type { Answer, Workbench } from './types.ts';

export interface FollowOptions {
  /** Calls back before the next paint; one probe a frame at most. */
  frame: (work: () => void) => void;
  /** Quiet time after a change before the other cases are judged. */
  judgeAllAfterMs?: number;
}

/**
 * Keeps the answers in step with the study: a layer around the store, which itself knows no computation.
 *
 *   study or case changed ──► solve ──► answer ─┬─► verdicts ──► judge (with screening) ──► judge all cases
 *                                               └─► scan ──► answer.scan
 *   all cases judged, or another question ─► worst over states and tolerances
 *   busbar changed ─────────► scan ───► answer.scan
 *   any of these, or order ─► probe, once a frame
 *
 * Newest wins throughout. An answer of an older revision is still shown while edits follow each other,
 * marked stale by its revision, unless it speaks of another study or case. Returns what ends the following.
 */
export function followStudy(
  store: WorkbenchStore,
  computation: Computation,
  options: FollowOptions,
): () => void {
  const { frame, judgeAllAfterMs = 200 } = options;
  let solveRun = 0;
  let probeDue = false;
  let judgeAllTimer: ReturnType<typeof setTimeout> | undefined;

  function fits(at: StudyAt, caseId: string): boolean {
    const { openedRevision, answer, view } = store.getState();
    const newest = answer?.caseId === caseId ? answer.revision : openedRevision;
    return at.revision >= openedRevision && at.revision >= newest && view.caseId === caseId;
  }

  function setStatus(part: Partial<Workbench['status']>): void {
    store.setState((state) => ({ status: { ...state.status, ...part } }));
  }

  /** The value of a request that was answered; a failed one is said in the status. */
  function answered<T>(end: Settled<T>): T | null {
    if (end.outcome === 'failed') setStatus({ workerMessage: end.message });
    return end.outcome === 'done' ? end.value : null;
  }

  async function solve(at: StudyAt, caseId: string): Promise<void> {
    solveRun += 1;
    const run = solveRun;
    clearTimeout(judgeAllTimer);
    if (!store.getState().status.solving) setStatus({ solving: true });
    const numbers = answered(await computation.solve(at, caseId));
    if (run === solveRun) setStatus({ solving: false });
    if (!numbers || !fits(at, caseId)) return;
    store.setState((state) => ({ answer: answerOf(state, at, caseId, numbers) }));
    if (run !== solveRun) return;
    const judged = isScreened(store.getState()) ? null : judge(at, caseId);
    void rescan(at, store.getState().view);
    await judged;
    if (run === solveRun) judgeAllTimer = setTimeout(() => void judgeOthers(at), judgeAllAfterMs);
  }

  /** First the verdicts that need no scan, with the screening rows last known; then all of them. */
  async function judge(at: StudyAt, caseId: string): Promise<void> {
    const { revision } = at;
    const quick = answered(await computation.verdicts(at, caseId));
    if (!quick) return;
    store.setState(({ answer }) => {
      const known = new Set(quick.map(({ key }) => key));
      const older = answer?.verdicts.filter(({ screening, key }) => screening && !known.has(key)) ?? [];
      const verdicts = sortByMargin([...quick, ...older]);
      return { answer: amended(answer, revision, caseId, { verdicts, verdictsRevision: revision }) };
    });
    const verdicts = answered(await computation.judge(at, caseId));
    if (!verdicts) return;
    const part = { verdicts, verdictsRevision: revision, screeningRevision: revision };
    store.setState(({ answer }) => ({ answer: amended(answer, revision, caseId, part) }));
  }

  async function judgeOthers(at: StudyAt): Promise<void> {
    const { study, revision, answer, allVerdicts, beforePreview } = store.getState();
    if (!study || revision !== at.revision || beforePreview) return;
    const known = allVerdicts?.revision === revision ? allVerdicts.byCase : {};
    const shown =
      answer?.revision === revision && answer.verdicts ? { [answer.caseId]: answer.verdicts } : {};
    const byCase = { ...known, ...shown };
    const open = casesOf(study).filter(({ id }) => !byCase[id]);
    store.setState({ allVerdicts: { revision, byCase, complete: open.length === 0 } });
    const ids = open.map(({ id }) => id);
    answered(
      await computation.judgeAll(at, ids, (caseId, verdicts) =>
        store.setState(({ allVerdicts: now }) => {
          if (now?.revision !== revision) return {};
          const more = { ...now.byCase, [caseId]: verdicts };
          const complete = casesOf(study).every(({ id }) => more[id]);
          return { allVerdicts: { revision, byCase: more, complete } };
        }),
      ),
    );
    await bandOf(at);
    await judgeWorst(at);
  }

  /** The band of the focused busbar's impedance, in states and tolerances as the worst is looked for. */
  async function bandOf(at: StudyAt): Promise<void> {
    const { worstQuestion: question, envelope: known, revision, beforePreview, view } = store.getState();
    const bus = view.focusBus;
    if (revision !== at.revision || beforePreview || bus === '') return;
    if (known?.revision === revision && known.question === question && known.envelope.bus === bus) return;
    const envelope = answered(await computation.envelope(at, bus, question));
    store.setState((now) =>
      envelope && now.revision === revision && now.worstQuestion === question && now.view.focusBus === bus
        ? { envelope: { revision, question, envelope } }
        : {},
    );
  }

  /** Over states and tolerances: the longest of all, begun last and ended by the next edit. */
  async function judgeWorst(at: StudyAt): Promise<void> {
    const { worstQuestion: question, worst, revision, beforePreview } = store.getState();
    if (revision !== at.revision || beforePreview) return;
    if (worst?.revision === revision && worst.question === question && worst.result) return;
    const put = (progress: WorstProgress, result: WorstResult | null, tooMany: number | null): void =>
      store.setState((now) =>
        now.revision === revision && now.worstQuestion === question
          ? { worst: { revision, question, progress, result, tooMany } }
          : {},
      );
    const end = answered(await computation.worst(at, question, (progress) => put(progress, null, null)));
    if (end?.state === 'too-many') put({ done: 0, total: end.count, points: 0 }, null, end.count);
    if (end?.state === 'done') {
      const { states: total, points } = end.result;
      put({ done: total, total, points }, end.result, null);
    }
  }

  async function rescan(at: StudyAt, { caseId, focusBus }: Workbench['view']): Promise<void> {
    if (focusBus === '') return;
    const pair = answered(await computation.scan(at, caseId, focusBus));
    if (!pair || pair.bus !== store.getState().view.focusBus) return;
    const scan = { ...pair, revision: at.revision };
    store.setState((state) => ({ answer: amended(state.answer, at.revision, caseId, { scan }) }));
  }

  function probeSoon(): void {
    if (probeDue) return;
    probeDue = true;
    frame(() => {
      probeDue = false;
      void probe();
    });
  }

  async function probe(): Promise<void> {
    const { study, revision, view } = store.getState();
    if (!study || study.buses.length === 0) return;
    const value = answered(await computation.probe({ revision, study }, view.caseId, view.order));
    const now = store.getState();
    if (!value || revision < now.openedRevision || now.view.caseId !== value.caseId) return;
    store.setState({ probe: { ...value, revision } });
  }

  function follow(now: Workbench, before: Workbench): void {
    const { study, revision, view } = now;
    const moved = revision !== before.revision;
    const caseChanged = view.caseId !== before.view.caseId;
    const busChanged = view.focusBus !== before.view.focusBus;
    if (!study) return;
    const at = { revision, study };
    if (moved || caseChanged) void solve(at, view.caseId);
    else if (busChanged) void rescan(at, view);
    if (moved || caseChanged || view.order !== before.view.order) probeSoon();
    const asked = now.worstQuestion !== before.worstQuestion;
    if (!moved && (asked || busChanged) && now.allVerdicts?.complete) void bandOf(at);
    if (!moved && asked) void judgeWorst(at);
  }

  const { study, revision, view } = store.getState();
  if (study) void solve({ revision, study }, view.caseId);
  if (study) probeSoon();
  const unsubscribe = store.subscribe(follow);
  return () => {
    unsubscribe();
    clearTimeout(judgeAllTimer);
  };
}

/** The new answer; verdicts and curves of the same case stay, as older ones, until newer ones arrive. */
function answerOf(state: Workbench, { revision }: StudyAt, caseId: string, numbers: CaseNumbers): Answer {
  const { answer, allVerdicts } = state;
  const before = answer?.caseId === caseId ? answer : null;
  const known = allVerdicts?.revision === revision ? allVerdicts.byCase[caseId] : undefined;
  const { solution, without } = numbers;
  return {
    revision,
    caseId,
    solution,
    without,
    verdicts: known ?? before?.verdicts ?? [],
    verdictsRevision: known ? revision : (before?.verdictsRevision ?? null),
    screeningRevision: known ? revision : (before?.screeningRevision ?? null),
    scan: before?.scan ?? null,
  };
}

function amended(
  answer: Answer | null,
  revision: number,
  caseId: string,
  part: Partial<Answer>,
): Answer | null {
  return answer?.revision === revision && answer.caseId === caseId ? { ...answer, ...part } : answer;
}
