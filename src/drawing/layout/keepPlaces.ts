import type { Layout } from './types.ts';

/**
 * The next layout with every place that did not change kept as the very same object, so that a view which
 * remembers its parts redraws only those that moved.
 */
export function keepPlaces(before: Layout | undefined, next: Layout): Layout {
  if (!before) return next;
  return { ...next, buses: kept(before.buses, next.buses), parts: kept(before.parts, next.parts) };
}

function kept<T extends { id: string }>(before: T[], next: T[]): T[] {
  const known = new Map(before.map((place) => [place.id, place]));
  return next.map((place) => {
    const old = known.get(place.id);
    return old && JSON.stringify(old) === JSON.stringify(place) ? old : place;
  });
}
