import type { DrawingMark, MarkKind, MarkPoint, Study } from '../../study/index.ts';
import type { Layout, Point } from '../layout/index.ts';

/** Beyond this a point is free on the paper, in px at 100 %. */
const REACH = 240;

/** Where a point of a mark stands on this layout: beside what it follows, else where it was left. */
export function pointOn({ by, x, y }: MarkPoint, layout: Layout): Point {
  const home = by && homeOf(by.kind, by.id, layout);
  return home ? { x: home.x + by.dx, y: home.y + by.dy } : { x, y };
}

/** A point of the drawing as a mark keeps it: following the nearest part or busbar within reach. */
export function markPoint(at: Point, layout: Layout): MarkPoint {
  return nearestOf(at, subjects(layout), layout);
}

/** Both points of a mark. The corners of an area follow what stands inside it, as far as anything does. */
export function markPoints(
  kind: MarkKind,
  from: Point,
  to: Point,
  layout: Layout,
): { from: MarkPoint; to?: MarkPoint } {
  const all = subjects(layout);
  if (kind === 'note') return { from: nearestOf(from, all, layout) };
  const inside = kind === 'arrow' ? [] : all.filter(({ near }) => isBetween(near, from, to));
  const among = inside.length > 0 ? inside : all;
  return { from: nearestOf(from, among, layout), to: nearestOf(to, among, layout) };
}

function isBetween({ left, right, y }: Span, a: Point, b: Point): boolean {
  const [least, most] = [Math.min(a.x, b.x), Math.max(a.x, b.x)];
  return left >= least && right <= most && y >= Math.min(a.y, b.y) && y <= Math.max(a.y, b.y);
}

function nearestOf(at: Point, among: readonly Candidate[], layout: Layout): MarkPoint {
  const x = Math.round(Math.max(0, at.x));
  const y = Math.round(Math.max(0, at.y));
  let nearest: { by: NonNullable<MarkPoint['by']>; distance: number } | null = null;
  for (const { kind, id, near } of among) {
    const distance = distanceTo(near, { x, y });
    if (distance > REACH || (nearest && nearest.distance <= distance)) continue;
    const home = homeOf(kind, id, layout);
    if (home) nearest = { by: { kind, id, dx: x - home.x, dy: y - home.y }, distance };
  }
  return { x, y, ...(nearest ? { by: nearest.by } : {}) };
}

interface Span {
  left: number;
  right: number;
  y: number;
}

interface Candidate {
  kind: 'element' | 'bus';
  id: string;
  near: Span;
}

function subjects(layout: Layout): Candidate[] {
  return [
    ...layout.parts.map(({ id, x, y }) => ({ kind: 'element' as const, id, near: { left: x, right: x, y } })),
    ...layout.buses.map(({ id, x1, x2, y }) => ({
      kind: 'bus' as const,
      id,
      near: { left: x1, right: x2, y },
    })),
  ];
}

function distanceTo({ left, right, y }: Span, at: Point): number {
  return Math.hypot(Math.max(left - at.x, 0, at.x - right), at.y - y);
}

function homeOf(kind: 'element' | 'bus', id: string, layout: Layout): Point | undefined {
  if (kind === 'element') return layout.parts.find((part) => part.id === id);
  const bus = layout.buses.find((one) => one.id === id);
  return bus && { x: bus.x1, y: bus.y };
}

/** The part or busbar a mark speaks of: what its head, else its words, follow. */
export function markSubject({ from, to }: DrawingMark, study: Study): MarkPoint['by'] {
  const stands = (by: MarkPoint['by']) =>
    by && (by.kind === 'bus' ? study.buses : study.elements).some(({ id }) => id === by.id) ? by : undefined;
  return stands(to?.by) ?? stands(from.by);
}
