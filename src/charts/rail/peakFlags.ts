import { type Box, boxesMeet, boxInside } from '../figure/box.ts';

/** A peak's place on the figure and the size of the words it wants to carry. */
export interface FlagRequest {
  x: number;
  y: number;
  width: number;
  height: number;
  /** The larger, the earlier it is placed. */
  weight: number;
}

const SIDE_GAP = 16;
const RISES = [-6, -20, 8, -34, 22, -48, 36, 50, 64];
const CURVE_PENALTY = 60;
const PROBES = 7;

/**
 * Boxes for the words of peaks: inside `bounds`, apart from one another and, where it can be had, off the
 * curves. The weightiest is placed first; one that finds no room gets null and is drawn as a mark alone.
 * `curves` give a curve's y at an x, or null.
 */
export function placeFlags(
  requests: readonly FlagRequest[],
  bounds: Box,
  curves: readonly ((x: number) => number | null)[],
): (Box | null)[] {
  const placed: Box[] = [];
  const result: (Box | null)[] = requests.map(() => null);
  const inTurn = requests.map((request, index) => ({ request, index }));
  inTurn.sort((a, b) => b.request.weight - a.request.weight || a.index - b.index);
  for (const { request, index } of inTurn) {
    const box = bestBox(request, bounds, placed, curves);
    if (!box) continue;
    placed.push(box);
    result[index] = box;
  }
  return result;
}

function bestBox(
  request: FlagRequest,
  bounds: Box,
  placed: readonly Box[],
  curves: readonly ((x: number) => number | null)[],
): Box | null {
  let best: { box: Box; cost: number } | null = null;
  for (const box of candidates(request)) {
    if (!boxInside(box, bounds) || placed.some((other) => boxesMeet(box, other, 6))) continue;
    const cost = curveCost(box, curves) + distance(box, request);
    if (!best || cost < best.cost) best = { box, cost };
  }
  return best?.box ?? null;
}

function candidates({ x, y, width, height }: FlagRequest): Box[] {
  return RISES.flatMap((rise) => [
    { x: x - SIDE_GAP - width, y: y + rise - height / 2, width, height },
    { x: x + SIDE_GAP, y: y + rise - height / 2, width, height },
    { x: x - width / 2, y: y + rise - height - 4, width, height },
  ]).filter((box) => !(y > box.y - 3 && y < box.y + height + 3 && x > box.x - 3 && x < box.x + width + 3));
}

function curveCost(box: Box, curves: readonly ((x: number) => number | null)[]): number {
  let hits = 0;
  for (const curve of curves) {
    for (let i = 0; i <= PROBES; i++) {
      const y = curve(box.x + (box.width * i) / PROBES);
      if (y !== null && y > box.y - 2 && y < box.y + box.height + 2) hits++;
    }
  }
  return hits * CURVE_PENALTY;
}

function distance(box: Box, request: FlagRequest): number {
  const dx = Math.max(box.x - request.x, 0, request.x - box.x - box.width);
  return dx + 1.2 * Math.abs(box.y + box.height / 2 - request.y);
}
