import type { Box, Layout, Point } from '../layout/index.ts';
import { busSubject, partSubject, type Subject } from '../subject.ts';

export function boxBetween(a: Point, b: Point): Box {
  return {
    x: Math.min(a.x, b.x),
    y: Math.min(a.y, b.y),
    width: Math.abs(a.x - b.x),
    height: Math.abs(a.y - b.y),
  };
}

/** What a rubber band picks: parts whose symbol's centre, and busbars whose whole bar, lie inside it. */
export function bandPicks(layout: Layout, band: Box): Subject[] {
  const inside = (x: number, y: number) =>
    x >= band.x && x <= band.x + band.width && y >= band.y && y <= band.y + band.height;
  return [
    ...layout.buses
      .filter((bus) => inside(bus.x1, bus.y) && inside(bus.x2, bus.y))
      .map((bus) => busSubject(bus.id)),
    ...layout.parts.filter((part) => inside(part.x, part.y)).map((part) => partSubject(part.id)),
  ];
}
