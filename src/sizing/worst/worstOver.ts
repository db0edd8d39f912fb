import { sortByMargin, type Verdict } from '../../checks/index.ts';
import { solveCase } from '../../engine/index.ts';
import { casesOf, type Study } from '../../study/index.ts';
import type { StudyState } from '../states/StudyState.ts';
import type { Point } from '../tolerance/Dimension.ts';
import { polish } from '../tolerance/polish.ts';
import { searchTolerances } from '../tolerance/searchTolerances.ts';
import type { ToleranceSettings } from '../tolerance/ToleranceSettings.ts';
import { StateRun } from './StateRun.ts';
import type { Unsolved, WorstProgress, WorstResult, WorstVerdict } from './WorstVerdict.ts';

export interface WorstOptions {
  states: readonly StudyState[];
  /** Null judges every state at its rated values alone. */
  tolerances: ToleranceSettings | null;
}

/** Contours of a correction: judged with the steps a case has on, not with every other combination. */
const BY_CASE_ALONE: ReadonlySet<string> = new Set(['target-pf', 'delivered-kvar']);

const counts = (run: StateRun, key: string): boolean =>
  !(run.state.stepsMoved && BY_CASE_ALONE.has(key.split('|')[0] ?? key));

/** The smallest margin of one key so far and where it stands. */
interface Record {
  margin: number;
  run: StateRun;
  point: Point | null;
  /** The verdict at the rated point; null where a tolerance point governs. */
  verdict: Verdict | null;
}

/** Governing measures followed to the bottom at the end, the worst first. */
const MOST_FOLLOWED = 12;
/** A measure with more margin than this decides nothing and is not followed. */
const FOLLOWED_BELOW = 0.75;

/**
 * The worst of every check over operating states and their tolerance spaces, state by state: a generator, so
 * that a caller can report progress, paint and stop between states. Every state given is solved. At the end
 * the measures nearest to their limits are followed to the bottom in the state that governs them, and every
 * governing point is judged once more in words. The same study and states give the same result.
 */
export function* worstOver(
  study: Study,
  { states, tolerances }: WorstOptions,
): Generator<WorstProgress, WorstResult> {
  const cases = casesOf(study).map(({ id }) => solveCase(study, id));
  const records = new Map<string, Record>();
  const unknowns = new Map<string, WorstVerdict>();
  const unsolved: Unsolved[] = [];
  let points = 0;
  let done = 0;
  for (const state of states) {
    const run = new StateRun(study, state, tolerances, cases);
    takeRated(run, records, unknowns);
    if (run.judge) {
      points += searchTolerances(run.judge, false).visited;
      takeSearched(run, records);
    } else points++;
    unsolved.push(...run.unsolved());
    done++;
    yield { done, total: states.length, points };
  }
  const bound = yield* followed(records, { done, total: states.length, points });
  return {
    verdicts: sortByMargin(worded(records, unknowns)) as WorstVerdict[],
    states: states.length,
    points: points + bound.points,
    bound: bound.gained,
    unsolved,
  };
}

function takeRated(run: StateRun, records: Map<string, Record>, unknowns: Map<string, WorstVerdict>): void {
  for (const verdict of run.rated()) {
    if (!counts(run, verdict.key)) continue;
    if (verdict.margin === null) {
      // A pass without a margin says less than an open point.
      const known = unknowns.get(verdict.key);
      if (!known || (known.verdict === 'pass' && verdict.verdict === 'unknown'))
        unknowns.set(verdict.key, withPlace(verdict, run, null));
      continue;
    }
    const known = records.get(verdict.key);
    if (!known || verdict.margin < known.margin)
      records.set(verdict.key, { margin: verdict.margin, run, point: null, verdict });
  }
}

/** Orders without a verdict of their own are told apart later, when words are asked for. */
function takeSearched(run: StateRun, records: Map<string, Record>): void {
  const { judge } = run;
  judge?.duties.measures.forEach(({ key }, k) => {
    if (!counts(run, key)) return;
    const margin = judge.worst[k]!;
    const known = records.get(key);
    if (Number.isFinite(margin) && margin < (known?.margin ?? Number.POSITIVE_INFINITY) - 1e-12)
      records.set(key, { margin, run, point: judge.worstAt[k]!, verdict: null });
  });
}

function* followed(
  records: Map<string, Record>,
  progress: WorstProgress,
): Generator<WorstProgress, { gained: number; points: number }> {
  let gained = 0;
  let points = 0;
  const checks = new Set<string>();
  const chosen = [...records]
    .filter(([, { run, margin }]) => run.judge !== null && margin < FOLLOWED_BELOW)
    .sort(([a, { margin: x }], [b, { margin: y }]) => x - y || (a < b ? -1 : 1))
    .filter(([key]) => {
      const check = key.split('|')[0] ?? key;
      const first = !checks.has(check);
      checks.add(check);
      return first;
    })
    .slice(0, MOST_FOLLOWED);
  for (const [key, { run }] of chosen) {
    const { judge } = run;
    const k = judge?.duties.measures.findIndex((measure) => measure.key === key) ?? -1;
    if (!judge || k < 0) continue;
    const before = judge.visited;
    const rounds = polish(judge, k);
    for (let next = rounds.next(); ; next = rounds.next()) {
      if (next.done) gained = Math.max(gained, next.value);
      if (next.done) break;
      yield { ...progress, points: progress.points + points + judge.visited - before };
    }
    points += judge.visited - before;
    takeSearched(run, records);
  }
  return { gained, points };
}

function worded(records: Map<string, Record>, unknowns: Map<string, WorstVerdict>): WorstVerdict[] {
  const spoken = new Map<StateRun, Map<Point, Map<string, Verdict>>>();
  const found: WorstVerdict[] = [];
  for (const [key, { run, point, verdict }] of records) {
    unknowns.delete(key);
    const said = verdict ?? (point ? verdictAt(spoken, run, point).get(key) : undefined);
    if (said) found.push(withPlace(said, run, point));
  }
  return [...found, ...unknowns.values()];
}

/** Verdicts of a governing point by key; judged once for all the keys it governs. */
function verdictAt(
  spoken: Map<StateRun, Map<Point, Map<string, Verdict>>>,
  run: StateRun,
  point: Point,
): Map<string, Verdict> {
  const byPoint = spoken.get(run) ?? new Map<Point, Map<string, Verdict>>();
  spoken.set(run, byPoint);
  const known = byPoint.get(point);
  if (known) return known;
  const verdicts = new Map(run.worded(point).map((verdict) => [verdict.key, verdict]));
  byPoint.set(point, verdicts);
  return verdicts;
}

/** Words are written now: the solution behind them is then free to go. */
function withPlace(verdict: Verdict, run: StateRun, point: Point | null): WorstVerdict {
  return { ...verdict, governing: point ? run.governing(point) : run.governing() };
}
