import { type Box, boxesMeet, boxInside, sharedArea } from '../figure/box.ts';
import { type CurveHeight, curveCrossings } from '../figure/curveCrossings.ts';

/** A peak's place on the figure and the size of the words it wants to carry. */
export interface FlagRequest {
  x: number;
  y: number;
  width: number;
  height: number;
  /** The larger, the earlier it is placed. */
  weight: number;
}

/** What flags have to fit into and keep clear of. */
export interface FlagRoom {
  bounds: Box;
  curves: readonly CurveHeight[];
  /** Bars of the injected orders: better left free. */
  bars: readonly Box[];
}

const SIDE_GAP = 16;
const RISES = [-6, -20, 8, -34, 22, -48, 36, 50, 64];
const CURVE_PENALTY = 25;
const BAR_PENALTY = 0.5;

/**
 * Boxes for the words of peaks: inside the bounds, apart from one another and, where it can be had, off the
 * curves and bars. The weightiest is placed first; one that finds no room gets null and is drawn as a mark
 * alone.
 */
export function placeFlags(requests: readonly FlagRequest[], room: FlagRoom): (Box | null)[] {
  const placed: Box[] = [];
  const result: (Box | null)[] = requests.map(() => null);
  const inTurn = requests.map((request, index) => ({ request, index }));
  inTurn.sort((a, b) => b.request.weight - a.request.weight || a.index - b.index);
  for (const { request, index } of inTurn) {
    const box = bestBox(request, room, placed);
    if (!box) continue;
    placed.push(box);
    result[index] = box;
  }
  return result;
}

function bestBox(request: FlagRequest, room: FlagRoom, placed: readonly Box[]): Box | null {
  let best: { box: Box; cost: number } | null = null;
  for (const box of candidates(request)) {
    if (!boxInside(box, room.bounds) || placed.some((other) => boxesMeet(box, other, 6))) continue;
    const cost = coveredCost(box, room) + distance(box, request);
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

function coveredCost(box: Box, room: FlagRoom): number {
  const bars = room.bars.reduce((sum, bar) => sum + sharedArea(box, bar), 0);
  return curveCrossings(box, room.curves) * CURVE_PENALTY + bars * BAR_PENALTY;
}

function distance(box: Box, request: FlagRequest): number {
  const dx = Math.max(box.x - request.x, 0, request.x - box.x - box.width);
  return dx + 1.2 * Math.abs(box.y + box.height / 2 - request.y);
}
