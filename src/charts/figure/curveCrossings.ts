import type { Box } from './box.ts';

/** A curve's y at an x in figure units, or null where it is not drawn. */
export type CurveHeight = (x: number) => number | null;

const STEP = 4;

/** How much of a box a curve runs through, in steps of 4 units; a steep flank between two steps counts. */
export function curveCrossings(box: Box, curves: readonly CurveHeight[]): number {
  const steps = Math.max(1, Math.ceil(box.width / STEP));
  let hits = 0;
  for (const curve of curves) {
    let before = curve(box.x);
    for (let i = 1; i <= steps; i++) {
      const here = curve(box.x + (box.width * i) / steps);
      if (before !== null && here !== null && meets(box, before, here)) hits++;
      before = here;
    }
  }
  return hits;
}

function meets(box: Box, y0: number, y1: number): boolean {
  return Math.max(y0, y1) > box.y - 2 && Math.min(y0, y1) < box.y + box.height + 2;
}
