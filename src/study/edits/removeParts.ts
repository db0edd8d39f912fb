import { type Items, withBelow } from '../below.ts';
import { countedTogether } from '../counted.ts';
import { busById, elementById, elementsAt } from '../lookup.ts';
import { fullNameOf, nameOf } from '../names.ts';
import type { CaseChange, Edit, Study, StudyView } from '../types.ts';
import { makeEdit } from './edit.ts';
import { marksLeftBy } from './marks.ts';

/** Chosen parts and busbars, by id. */
export interface Chosen {
  parts: readonly string[];
  buses: readonly string[];
}

/** Everything a removal takes, and how much of it was not chosen itself. */
export interface Removal extends Items {
  below: { parts: number; buses: number };
}

/**
 * Removes parts. What hangs below a removed series part goes with it when no source and no other connection
 * to the busbar above feeds it. References in cases, scans, view and origins go too.
 */
export function removeParts(study: Study, ids: readonly string[]): Edit {
  return removeItems(study, { parts: ids, buses: [] });
}

/** Removes a busbar, the parts with an end at it, and what hangs below them alone. */
export function removeBus(study: Study, id: string): Edit {
  return removeItems(study, { parts: [], buses: [id] });
}

/** Removes chosen parts and busbars as one edit, with what hangs from them alone. */
export function removeItems(study: Study, chosen: Chosen): Edit {
  const label = chosen.parts.length === 0 ? 'bus.remove' : 'parts.remove';
  return makeEdit(label, `remove ${removalWords(study, chosen)}`, (current) =>
    without(current, removalOf(current, chosen)),
  );
}

/** What a removal is of, in words: "cable W2 with 3 parts and 1 busbar below". */
export function removalWords(study: Study, chosen: Chosen): string {
  const { below } = removalOf(study, chosen);
  const further = countedTogether([
    [below.parts, 'part'],
    [below.buses, 'busbar'],
  ]);
  return `${chosenWords(study, chosen)}${further ? ` with ${further} below` : ''}`;
}

function chosenWords(study: Study, { parts, buses }: Chosen): string {
  const [part, bus] = [elementById(study, parts[0] ?? ''), busById(study, buses[0] ?? '')];
  if (parts.length === 1 && buses.length === 0 && part) return fullNameOf(part);
  if (parts.length === 0 && buses.length === 1 && bus) return `busbar ${nameOf(bus)}`;
  return countedTogether([
    [parts.length, 'part'],
    [buses.length, 'busbar'],
  ]);
}

/** What removeItems would take: the chosen, the parts at chosen busbars, and all that is left without a feed. */
export function removalOf(study: Study, { parts, buses }: Chosen): Removal {
  const doomed = new Set(parts.filter((id) => elementById(study, id)));
  const gone = new Set(buses.filter((id) => busById(study, id)));
  const touching = [...gone].flatMap((bus) => elementsAt(study, bus).map((element) => element.id));
  const taken = withBelow(study, [...doomed, ...touching], gone);
  for (const bus of gone) taken.buses.add(bus);
  return {
    ...taken,
    below: { parts: taken.elements.size - doomed.size, buses: taken.buses.size - gone.size },
  };
}

function without(study: Study, { elements, buses }: Items): Study {
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
  if (view.marks) next.marks = marksLeftBy(view.marks, elements, buses);
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
