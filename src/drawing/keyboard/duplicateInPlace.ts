import { duplicateParts, type Edit, makeEdit, reorderAlong, type Study } from '../../study/index.ts';
import { partsAlong } from '../gestures/busAt.ts';
import type { Layout } from '../layout/index.ts';

/** Duplicates parts, each copy standing right of its original along the busbar. */
export function duplicateInPlace(
  study: Study,
  layout: Layout,
  ids: readonly string[],
): Edit & { elementIds: readonly string[] } {
  const copies = duplicateParts(study, ids);
  const copyOf = new Map(ids.map((id, at) => [id, copies.elementIds[at]]));
  const orders = layout.buses.flatMap(({ id: bus }) => {
    const along = partsAlong(layout, bus).map((part) => part.id);
    const wished = along.flatMap((id) => [id, copyOf.get(id) ?? []].flat());
    const atEnd = [...along, ...wished.filter((id) => !along.includes(id))];
    return wished.every((id, at) => id === atEnd[at]) ? [] : [{ bus, wished }];
  });
  const edit = makeEdit(copies.label, copies.words, (current) =>
    orders.reduce(
      (standing, { bus, wished }) => reorderAlong(standing, bus, wished).apply(standing),
      copies.apply(current),
    ),
  );
  return { ...edit, elementIds: copies.elementIds };
}
