import type { Box } from '../layout/index.ts';

export interface Size {
  width: number;
  height: number;
}

const GAP = 14;
const EDGE = 8;

/**
 * Where a part's data slip stands in its pane: right of the part, else left, below, above; never over it.
 * Where no side has room the view must move: `panX` says by how much, and the slip then stands at the right.
 */
export function placeSlip(part: Box, slip: Size, pane: Size): { x: number; y: number; panX: number } {
  const within = (at: number, length: number, room: number) =>
    Math.max(EDGE, Math.min(at, room - length - EDGE));
  const beside = within(part.y + part.height / 2 - slip.height / 3, slip.height, pane.height);
  const right = part.x + part.width + GAP;
  if (right + slip.width + EDGE <= pane.width) return { x: right, y: beside, panX: 0 };
  const left = part.x - GAP - slip.width;
  if (left >= EDGE) return { x: left, y: beside, panX: 0 };
  const over = within(part.x + part.width / 2 - slip.width / 2, slip.width, pane.width);
  const below = part.y + part.height + GAP;
  if (below + slip.height + EDGE <= pane.height) return { x: over, y: below, panX: 0 };
  const above = part.y - GAP - slip.height;
  if (above >= EDGE) return { x: over, y: above, panX: 0 };
  const panX = pane.width - EDGE - slip.width - right;
  return { x: pane.width - EDGE - slip.width, y: beside, panX };
}
