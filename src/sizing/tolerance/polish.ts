import { isSwitch, type Point } from './Dimension.ts';
import type { PointJudge } from './PointJudge.ts';

/** Pattern search ends when its step is this share of every axis. */
const SMALLEST_STEP = 1 / 1024;
const FIRST_STEP = 1 / 8;
/** Axes whose pairs are followed along the ridge. */
const RIDGE_AXES = 4;

/**
 * Follows one measure from the worst point known to a point where no step of a thousandth of any axis lowers
 * its margin any more, yielding after each round; returns by how much the last round of steps twice that size still did. Steps go along
 * each axis, and along pairs of axes in the proportion that leaves a peak where it is (the judge's ridges):
 * the worst lies on such a ridge, where a step of one axis alone only falls.
 */
export function* polish(judge: PointJudge, measure: number): Generator<void, number> {
  const steps = directions(judge);
  let at = judge.worstAt[measure]!;
  let step = FIRST_STEP;
  let gained = 0;
  while (step >= SMALLEST_STEP) {
    const before = judge.worst[measure]!;
    for (const direction of steps) judge.judge(stepped(judge, at, direction, step));
    yield;
    gained = before - judge.worst[measure]!;
    if (gained > 0) at = judge.worstAt[measure]!;
    else step /= 2;
  }
  return gained;
}

type Direction = readonly { k: number; share: number }[];

/** Shares of each axis' width, the largest being 1; every direction with its opposite. */
function directions(judge: PointJudge): Direction[] {
  const axes: Direction[] = [...judge.dimensions.keys()].flatMap((k) =>
    isSwitch(judge.dimensions[k]!) ? [] : [[{ k, share: 1 }], [{ k, share: -1 }]],
  );
  return [...axes, ...judge.ridges.flatMap((change) => alongRidge(judge, change))];
}

function alongRidge(judge: PointJudge, change: Float64Array): Direction[] {
  const strongest = [...change.keys()]
    .filter((k) => change[k] !== 0 && !isSwitch(judge.dimensions[k]!))
    .sort((a, b) => Math.abs(change[b]!) - Math.abs(change[a]!))
    .slice(0, RIDGE_AXES);
  return strongest.flatMap((i, first) =>
    strongest.slice(first + 1).flatMap((j) => {
      // The weaker axis goes its whole step, the stronger just so far that the susceptance stays.
      const back = -change[j]! / change[i]!;
      return [
        [
          { k: j, share: 1 },
          { k: i, share: back },
        ],
        [
          { k: j, share: -1 },
          { k: i, share: -back },
        ],
      ];
    }),
  );
}

/** The point moved along a direction, shortened where it would leave the box. */
function stepped(judge: PointJudge, from: Point, direction: Direction, step: number): Point {
  let length = step;
  for (const { k, share } of direction) {
    const { low, high } = judge.dimensions[k]!;
    const room = share > 0 ? (high - from[k]!) / (high - low) : (from[k]! - low) / (high - low);
    length = Math.min(length, Math.max(0, room) / Math.abs(share));
  }
  const point = from.slice();
  for (const { k, share } of direction) {
    const { low, high } = judge.dimensions[k]!;
    point[k] = Math.min(high, Math.max(low, from[k]! + share * length * (high - low)));
  }
  return point;
}
