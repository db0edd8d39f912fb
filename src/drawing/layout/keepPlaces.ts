import type { Layout, PartPlace } from './types.ts';

/**
 * The next layout with every place that did not change kept as the very same object, so that a view which
 * remembers its parts redraws only those that moved.
 */
export function keepPlaces(before: Layout | undefined, next: Layout): Layout {
  if (!before) return next;
  const buses = new Map(before.buses.map((bus) => [bus.id, bus]));
  const parts = new Map(before.parts.map((part) => [part.id, part]));
  return {
    ...next,
    buses: next.buses.map((bus) => {
      const old = buses.get(bus.id);
      const same =
        old &&
        old.x1 === bus.x1 &&
        old.x2 === bus.x2 &&
        old.y === bus.y &&
        old.dial.x === bus.dial.x &&
        old.dial.y === bus.dial.y &&
        old.label.width === bus.label.width &&
        old.storey === bus.storey &&
        old.island === bus.island;
      return same ? old : bus;
    }),
    parts: next.parts.map((part) => {
      const old = parts.get(part.id);
      return old && samePart(old, part) ? old : part;
    }),
  };
}

function samePart(a: PartPlace, b: PartPlace): boolean {
  return (
    a.kind === b.kind &&
    a.x === b.x &&
    a.y === b.y &&
    a.hang === b.hang &&
    a.bus === b.bus &&
    a.oneLine === b.oneLine &&
    a.label.x === b.label.x &&
    a.label.y === b.label.y &&
    a.label.width === b.label.width &&
    a.ends.length === b.ends.length &&
    a.ends.every((end, at) => sameEnd(end, b.ends[at]))
  );
}

function sameEnd(a: PartPlace['ends'][number], b: PartPlace['ends'][number] | undefined): boolean {
  return (
    b !== undefined &&
    a.bus === b.bus &&
    a.path.length === b.path.length &&
    a.path.every((point, at) => point.x === b.path[at]?.x && point.y === b.path[at]?.y)
  );
}
