import { type Box, sharedArea } from '../figure/box.ts';
import { type CurveHeight, curveCrossings } from '../figure/curveCrossings.ts';

const GAP = 14;
const CURVE_COST = 2;

interface Point {
  x: number;
  y: number;
}

interface Size {
  width: number;
  height: number;
}

/**
 * Where the words of the handle stand: beside it, wholly inside `bounds`, clear of the flags where
 * there is any free place at all, and of the curves where that can be had. Right of the handle is preferred, so that the words stay put while the handle moves.
 */
export function handleLabelBox(
  handle: Point,
  size: Size,
  bounds: Box,
  flags: readonly Box[],
  curves: readonly CurveHeight[],
): Box {
  const covered = (box: Box) => flags.reduce((sum, flag) => sum + sharedArea(box, flag), 0);
  const best = (wanted: readonly Box[]): Box | null => {
    let found: { box: Box; cost: number } | null = null;
    for (const [preference, wish] of wanted.entries()) {
      const box = pushedInside(wish, bounds);
      const overHandle = sharedArea(box, { x: handle.x - 9, y: handle.y - 9, width: 18, height: 18 });
      const crossings = curveCrossings(box, curves);
      const cost = covered(box) + overHandle * 4 + crossings * CURVE_COST + preference;
      if (!found || cost < found.cost) found = { box, cost };
    }
    return found?.box ?? null;
  };
  const near = best(wishes(handle, size));
  if (near && covered(near) === 0) return near;
  const free = further(handle, size, bounds).filter((box) => covered(pushedInside(box, bounds)) === 0);
  return best(free) ?? near ?? { x: bounds.x, y: bounds.y, ...size };
}

function wishes(handle: Point, { width, height }: Size): Box[] {
  const right = handle.x + GAP;
  const left = handle.x - GAP - width;
  const rises = [-height / 2 + 8, -height - 10, 12, -2 * height - 16, height + 16];
  return rises.flatMap((rise) => [
    { x: right, y: handle.y + rise, width, height },
    { x: left, y: handle.y + rise, width, height },
  ]);
}

const FURTHER_STEP = 6;

/** Every height, ever further from the handle: taken only where the near places all cover a flag. */
function further(handle: Point, { width, height }: Size, bounds: Box): Box[] {
  const rows = Math.max(1, Math.floor((bounds.height - height) / FURTHER_STEP) + 1);
  const gaps = Array.from({ length: Math.ceil(bounds.width / 24) }, (_, n) => GAP + n * 24);
  return gaps.flatMap((gap) =>
    Array.from({ length: rows }, (_, row) => bounds.y + row * FURTHER_STEP).flatMap((y) => [
      { x: handle.x + gap, y, width, height },
      { x: handle.x - gap - width, y, width, height },
    ]),
  );
}

function pushedInside(box: Box, bounds: Box): Box {
  const x = Math.max(bounds.x, Math.min(bounds.x + bounds.width - box.width, box.x));
  const y = Math.max(bounds.y, Math.min(bounds.y + bounds.height - box.height, box.y));
  return { ...box, x, y };
}
