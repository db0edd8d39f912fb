import type { Measure } from '../../checks/index.ts';
import { crossingsAt, moved, slopesAt } from './crossings.ts';
import { type Point, ratedPoint } from './Dimension.ts';
import type { PointJudge } from './PointJudge.ts';
import { polish } from './polish.ts';

/** The worst of one measure over the tolerance space. */
export interface WorstMargin {
  measure: Measure;
  margin: number;
  point: Point;
}

export interface ToleranceSearch {
  worst: WorstMargin[];
  /** Points solved for it. */
  visited: number;
  /** What the last, smallest steps still took off a margin, at most: how near the search came to the bottom. */
  bound: number;
  unsolved: readonly { point: Point; error: string }[];
}

/** Corners of a ridge judged in full, the largest |Z| first. */
const MOST_CROSSINGS = 12;
/** Measures with more margin than this decide nothing: their worst is left where the search met it. */
const NEAR_MARGIN = 0.75;
/** Measures followed to the bottom, the worst of each check first. */
const MOST_POLISHED = 8;

/**
 * The worst margin of every deciding measure over the tolerance space of one case (CHECKS: it is generally
 * not at a vertex):
 *   1 the rated point and both ends of every axis, then for each measure the corner its own ends point to;
 *   2 every corner of the set on which a peak stands on a present order, for each busbar with correction;
 *   3 a pattern search from the worst point of the measures nearest to their limits, which also follows ridges.
 * `thorough` false leaves out the third.
 */
export function searchTolerances(judge: PointJudge, thorough = true): ToleranceSearch {
  visitEnds(judge);
  judge.ridges = visitCrossings(judge);
  visitCorners(judge);
  let bound = 0;
  if (thorough) for (const k of governing(judge)) bound = Math.max(bound, polished(judge, k));
  return {
    worst: judge.duties.measures.map((measure, k) => ({
      measure,
      margin: judge.worst[k]!,
      point: judge.worstAt[k]!,
    })),
    visited: judge.visited,
    bound,
    unsolved: judge.unsolved,
  };
}

function polished(judge: PointJudge, measure: number): number {
  const rounds = polish(judge, measure);
  for (let next = rounds.next(); ; next = rounds.next()) if (next.done) return next.value;
}

function visitEnds(judge: PointJudge): void {
  judge.dimensions.forEach(({ low, high }, k) => {
    for (const end of [low, high]) judge.judge(moved(ratedPoint(judge.dimensions), k, end));
  });
}

/** From where each measure is worst so far, every axis is set to its worse end, until that changes nothing. */
function visitCorners(judge: PointJudge): void {
  for (const k of near(judge)) {
    for (let round = 0; round < 4; round++) {
      const before = judge.worst[k]!;
      judge.dimensions.forEach(({ low, high }, axis) => {
        for (const end of [low, high]) judge.judge(moved(judge.worstAt[k]!, axis, end));
      });
      if (!(judge.worst[k]! < before)) break;
    }
  }
}

function visitCrossings(judge: PointJudge): Float64Array[] {
  return judge.present().flatMap((present) => {
    const slopes = slopesAt(judge, present);
    if (!slopes) return [];
    return crossingsAt(judge, present, slopes).flatMap((crossings, order) => {
      for (const { point } of crossings.slice(0, MOST_CROSSINGS)) judge.judge(point);
      return crossings.length > 0 ? [slopes.change[order]!] : [];
    });
  });
}

/** Measures near a limit, one for each check and subject: its worst. Worst first. */
function near(judge: PointJudge): number[] {
  const bySubject = new Map<string, number>();
  judge.duties.measures.forEach(({ check, subject }, k) => {
    const name = `${check} ${subject.id}`;
    const known = bySubject.get(name);
    if (known === undefined || judge.worst[k]! < judge.worst[known]!) bySubject.set(name, k);
  });
  return [...bySubject.values()]
    .filter((k) => judge.worst[k]! < NEAR_MARGIN)
    .sort((a, b) => judge.worst[a]! - judge.worst[b]!);
}

/** The measure nearest to its limit of each check. */
function governing(judge: PointJudge): number[] {
  const checks = new Set<string>();
  return near(judge)
    .filter((k) => {
      const { check } = judge.duties.measures[k]!;
      if (checks.has(check)) return false;
      checks.add(check);
      return true;
    })
    .slice(0, MOST_POLISHED);
}
