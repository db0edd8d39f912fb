import type { BusPlace, Layout, PartPlace, Point } from '../layout/index.ts';

const ABOVE = 44;
const BESIDE = 28;

/**
 * The busbar a part dropped at a point would hang from: the nearest bar above the point, as far down as its
 * parts hang, or just below it. undefined where the paper is free.
 */
export function busAt(layout: Layout, point: Point): BusPlace | undefined {
  let nearest: BusPlace | undefined;
  let least = Number.POSITIVE_INFINITY;
  for (const bar of layout.buses) {
    if (point.x < bar.x1 - BESIDE || point.x > bar.x2 + BESIDE) continue;
    const below = point.y - bar.y;
    if (below > bar.depth || below < -ABOVE) continue;
    const distance = below >= 0 ? below : -below * 1.5;
    if (distance < least) {
      least = distance;
      nearest = bar;
    }
  }
  return nearest;
}

/** Half the side of the square over a symbol in which a drop means the part itself. */
const ON_SYMBOL = 17;

/** The part whose symbol is under a point. */
export function partAt(layout: Layout, point: Point): PartPlace | undefined {
  return layout.parts.find(
    (part) => Math.abs(part.x - point.x) <= ON_SYMBOL && Math.abs(part.y - point.y) <= ON_SYMBOL,
  );
}

/** Parts hanging from a busbar or leading down from it, left to right as drawn. */
export function partsAlong(layout: Layout, bus: string): { id: string; x: number }[] {
  return layout.parts
    .filter((part) => part.bus === bus && part.hang !== 'above' && part.hang !== 'across')
    .map((part) => ({ id: part.id, x: part.top.x }))
    .sort((a, b) => a.x - b.x);
}
