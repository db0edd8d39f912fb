import { type Box, sharedArea } from '../figure/box.ts';
import { type CurveHeight, curveCrossings } from '../figure/curveCrossings.ts';

const GAP = 14;
const CURVE_COST = 2;

/**
 * Where the words of the handle stand: beside it, wholly inside `bounds`, clear of the peaks' flags and
 * the curves where that can be had. Right of the handle is preferred, so that the words stay put while the handle moves.
 */
export function handleLabelBox(
  handle: { x: number; y: number },
  size: { width: number; height: number },
  bounds: Box,
  flags: readonly Box[],
  curves: readonly CurveHeight[],
): Box {
  let best: { box: Box; cost: number } | null = null;
  for (const [preference, wanted] of wishes(handle, size).entries()) {
    const box = pushedInside(wanted, bounds);
    const covered = flags.reduce((sum, flag) => sum + sharedArea(box, flag), 0);
    const overHandle = sharedArea(box, { x: handle.x - 9, y: handle.y - 9, width: 18, height: 18 });
    const crossings = curveCrossings(box, curves);
    const cost = covered + overHandle * 4 + crossings * CURVE_COST + preference;
    if (!best || cost < best.cost) best = { box, cost };
  }
  return best?.box ?? { x: bounds.x, y: bounds.y, ...size };
}

function wishes(
  handle: { x: number; y: number },
  { width, height }: { width: number; height: number },
): Box[] {
  const right = handle.x + GAP;
  const left = handle.x - GAP - width;
  const rises = [-height / 2 + 8, -height - 10, 12, -2 * height - 16, height + 16];
  return rises.flatMap((rise) => [
    { x: right, y: handle.y + rise, width, height },
    { x: left, y: handle.y + rise, width, height },
  ]);
}

function pushedInside(box: Box, bounds: Box): Box {
  const x = Math.max(bounds.x, Math.min(bounds.x + bounds.width - box.width, box.x));
  const y = Math.max(bounds.y, Math.min(bounds.y + bounds.height - box.height, box.y));
  return { ...box, x, y };
}
