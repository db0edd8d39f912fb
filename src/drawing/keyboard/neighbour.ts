import { partsAlong } from '../gestures/busAt.ts';
import type { Layout } from '../layout/index.ts';
import { busSubject, partSubject, readSubject, type Subject } from '../subject.ts';

export type Direction = 'left' | 'right' | 'up' | 'down';

/**
 * Where an arrow leads from a part or busbar: along the busbar sideways, to the busbar a part hangs from
 * upwards, from a busbar to its parts and through a series part to its lower busbar downwards.
 */
export function neighbour(
  layout: Layout,
  from: Subject | undefined,
  direction: Direction,
): Subject | undefined {
  const subject = from ? readSubject(from) : undefined;
  if (!subject) return first(layout);
  return subject.kind === 'bus'
    ? fromBus(layout, subject.id, direction)
    : fromPart(layout, subject.id, direction);
}

/** Among busbars alone, while a part in the hand looks for one. */
export function neighbourBus(
  layout: Layout,
  from: string | undefined,
  direction: Direction,
): string | undefined {
  const here = layout.buses.find((bus) => bus.id === from);
  if (!here) return layout.buses[0]?.id;
  const vertical = direction === 'up' || direction === 'down';
  const sign = direction === 'right' || direction === 'down' ? 1 : -1;
  const centre = (bus: { x1: number; x2: number }) => (bus.x1 + bus.x2) / 2;
  let best: { id: string; cost: number } | undefined;
  for (const bus of layout.buses) {
    const [dx, dy] = [centre(bus) - centre(here), bus.y - here.y];
    const along = sign * (vertical ? dy : dx);
    if (bus === here || along <= 0) continue;
    const cost = along + 3 * Math.abs(vertical ? dx / 4 : dy);
    if (!best || cost < best.cost) best = { id: bus.id, cost };
  }
  return best?.id;
}

function first(layout: Layout): Subject | undefined {
  const part = layout.parts.find((p) => p.hang === 'above') ?? layout.parts[0];
  const bus = layout.buses[0];
  return part ? partSubject(part.id) : bus && busSubject(bus.id);
}

function row(layout: Layout, bus: string, hang: string): string[] {
  if (hang === 'above') {
    const feeds = layout.parts.filter((p) => p.bus === bus && p.hang === 'above');
    return feeds.sort((a, b) => a.x - b.x).map((p) => p.id);
  }
  const along = partsAlong(layout, bus).map((p) => p.id);
  const tie = layout.parts.find((p) => p.bus === bus && p.hang === 'across');
  return tie ? [...along, tie.id] : along;
}

function fromPart(layout: Layout, id: string, direction: Direction): Subject | undefined {
  const part = layout.parts.find((p) => p.id === id);
  if (!part) return first(layout);
  if (direction === 'up') return part.hang === 'above' ? undefined : busSubject(part.bus);
  if (direction === 'down') {
    if (part.hang === 'above') return busSubject(part.bus);
    return part.foot && busSubject(part.foot.bus);
  }
  const along = row(layout, part.bus, part.hang);
  const next = along[along.indexOf(id) + (direction === 'right' ? 1 : -1)];
  if (next) return partSubject(next);
  return direction === 'right' && part.hang === 'across' && part.foot ? busSubject(part.foot.bus) : undefined;
}

function fromBus(layout: Layout, id: string, direction: Direction): Subject | undefined {
  const bus = layout.buses.find((b) => b.id === id);
  if (!bus) return first(layout);
  if (direction === 'down') {
    const next = row(layout, id, 'below')[0];
    return next && partSubject(next);
  }
  if (direction === 'up') {
    const feed = layout.parts.find(
      (p) => (p.hang === 'above' && p.bus === id) || (p.hang === 'leads-on' && p.foot?.bus === id),
    );
    return feed && partSubject(feed.id);
  }
  const same = layout.buses.filter((b) => b.storey === bus.storey).sort((a, b) => a.x1 - b.x1);
  const next = same[same.indexOf(bus) + (direction === 'right' ? 1 : -1)];
  return next && busSubject(next.id);
}
