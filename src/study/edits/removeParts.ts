import { elementById, isSeries } from '../lookup.ts';
import { busName, fullNameOf } from '../names.ts';
import type { CaseChange, Edit, Study, StudyElement, StudyView } from '../types.ts';
import { makeEdit } from './edit.ts';

interface Doomed {
  elements: Set<string>;
  buses: Set<string>;
}

/**
 * Removes parts. What hangs below a removed series part goes with it when no source and no other connection
 * to the busbar above feeds it. References in cases, scans, view and origins go too.
 */
export function removeParts(study: Study, ids: readonly string[]): Edit {
  const doomed = doomedWith(study, ids);
  const first = ids.length === 1 ? elementById(study, ids[0] ?? '') : undefined;
  const below = doomed.elements.size - ids.length;
  const what = first ? fullNameOf(first) : `${ids.length} parts`;
  const words = `remove ${what}${below > 0 ? ` and ${below} ${below === 1 ? 'part' : 'parts'} below` : ''}`;
  return makeEdit('parts.remove', words, (current) => without(current, doomedWith(current, ids)));
}

/** Removes a busbar, the parts with an end at it, and what hangs below them alone. */
export function removeBus(study: Study, id: string): Edit {
  return makeEdit('bus.remove', `remove busbar ${busName(study, id)} and its parts`, (current) => {
    const touching = current.elements.filter((element) =>
      isSeries(element) ? element.from === id || element.to === id : element.bus === id,
    );
    const doomed = doomedWith(
      current,
      touching.map((element) => element.id),
      id,
    );
    doomed.buses.add(id);
    return without(current, doomed);
  });
}

/** What removeParts would take: the parts themselves, and the busbars and parts left without a feed. */
function doomedWith(study: Study, ids: readonly string[], gone?: string): Doomed {
  const elements = new Set(ids.filter((id) => elementById(study, id)));
  const buses = new Set<string>();
  const left = study.elements.filter((element) => !elements.has(element.id));
  const sourceBuses = new Set(
    left.flatMap((element) =>
      element.kind === 'supply' || element.kind === 'generator' ? [element.bus] : [],
    ),
  );
  for (const id of elements) {
    const element = elementById(study, id);
    if (!element || !isSeries(element) || element.to === gone) continue;
    const island = islandOf(element.to, left);
    if (island.has(element.from) || [...island].some((bus) => sourceBuses.has(bus))) continue;
    for (const bus of island) buses.add(bus);
  }
  for (const element of left) {
    const ends = isSeries(element) ? [element.from, element.to] : [element.bus];
    if (ends.some((bus) => buses.has(bus))) elements.add(element.id);
  }
  return { elements, buses };
}

function islandOf(start: string, elements: readonly StudyElement[]): Set<string> {
  const neighbours = new Map<string, string[]>();
  for (const element of elements) {
    if (!isSeries(element)) continue;
    neighbours.set(element.from, [...(neighbours.get(element.from) ?? []), element.to]);
    neighbours.set(element.to, [...(neighbours.get(element.to) ?? []), element.from]);
  }
  const island = new Set([start]);
  for (const bus of island) for (const next of neighbours.get(bus) ?? []) island.add(next);
  return island;
}

function without(study: Study, { elements, buses }: Doomed): Study {
  if (elements.size === 0 && buses.size === 0) return study;
  const next: Study = {
    ...study,
    buses: study.buses.filter((bus) => !buses.has(bus.id)),
    elements: study.elements.filter((element) => !elements.has(element.id)),
  };
  if (study.cases) next.cases = study.cases.map((item) => dropChanges(item, elements));
  if (study.scans) next.scans = study.scans.filter((scan) => !buses.has(scan.bus));
  if (study.view) next.view = viewWithout(study.view, elements, buses);
  if (study.origins) next.origins = originsWithout(study.origins, elements, buses);
  if (next.origins && Object.keys(next.origins).length === 0) delete next.origins;
  return next;
}

function dropChanges<T extends { changes: CaseChange[] }>(item: T, elements: ReadonlySet<string>): T {
  return item.changes.some((change) => elements.has(change.element))
    ? { ...item, changes: item.changes.filter((change) => !elements.has(change.element)) }
    : item;
}

function viewWithout(view: StudyView, elements: ReadonlySet<string>, buses: ReadonlySet<string>): StudyView {
  const next: StudyView = { ...view };
  if (view.pins) {
    next.pins = view.pins.filter(
      (pin) => !buses.has(pin.bus) && !(pin.quantity === 'current' && elements.has(pin.element)),
    );
  }
  if (view.orderAlong) {
    const kept = Object.entries(view.orderAlong).filter(([bus]) => !buses.has(bus));
    next.orderAlong = Object.fromEntries(
      kept.map(([bus, ids]) => [bus, ids.filter((id) => !elements.has(id))]),
    );
  }
  if (view.focusBus !== undefined && buses.has(view.focusBus)) delete next.focusBus;
  return next;
}

/** Field names hold no full stop, so what follows the last one is the field and the rest names the record. */
function originsWithout<T>(
  origins: Record<string, T>,
  elements: ReadonlySet<string>,
  buses: ReadonlySet<string>,
): Record<string, T> {
  const owners = new Set([
    ...[...elements].map((id) => `elements.${id}`),
    ...[...buses].map((id) => `buses.${id}`),
  ]);
  return Object.fromEntries(
    Object.entries(origins).filter(([path]) => !owners.has(path.slice(0, path.lastIndexOf('.')))),
  );
}
