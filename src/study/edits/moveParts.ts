import { fedBuses, withBelow } from '../below.ts';
import { counted, countedTogether } from '../counted.ts';
import { busById, elementById, elementsAt, isSeries } from '../lookup.ts';
import { busName, fullNameOf, nameOf } from '../names.ts';
import type { Edit, Study, StudyElement, StudyView } from '../types.ts';
import { isBroughtName } from './addParts.ts';
import { makeEdit, mapById, patched, withField } from './edit.ts';
import { marksLeftBy } from './marks.ts';

export type End = 'bus' | 'from' | 'to';

/** One end of a part on its way to another busbar. */
export interface Move {
  id: string;
  end: End;
}

/**
 * Moves one end of a part to another busbar. An end the part does not have, an unknown busbar, or both ends
 * at one busbar change nothing: the same study comes back.
 */
export function moveEnd(study: Study, id: string, end: End, busId: string): Edit {
  return moveParts(study, [{ id, end }], busId);
}

/**
 * Moves ends of several parts to one busbar; what hangs below a moved upper end comes along by itself. Pins
 * follow their terminals. A busbar that came with a part and is left bare goes again: its foot now stands
 * elsewhere, and nobody has named it.
 */
export function moveParts(study: Study, moves: readonly Move[], busId: string): Edit {
  return makeEdit('part.move', moveWords(study, moves, busId), (current) => {
    if (!busById(current, busId)) return current;
    return moves.reduce((standing, move) => withMovedEnd(standing, move, busId), current);
  });
}

function moveWords(study: Study, moves: readonly Move[], busId: string): string {
  const where = busName(study, busId);
  const [only] = moves;
  if (moves.length !== 1 || !only) return `move ${counted(moves.length, 'part')} to ${where}`;
  const part = elementById(study, only.id);
  if (!part) return `move ${only.id} to ${where}`;
  if (only.end === 'to') return `move the lower end of ${fullNameOf(part)} to ${where}`;
  const along = alongWith(study, [only]);
  return `move ${fullNameOf(part)}${along ? ` with ${along} below` : ''} to ${where}`;
}

/** How much comes along below moved upper ends, in words: "3 parts and 1 busbar"; '' for nothing. */
export function alongWith(study: Study, moves: readonly Move[]): string {
  const lifted = moves.filter((move) => move.end !== 'to').map((move) => move.id);
  const { elements, buses } = withBelow(study, lifted);
  for (const id of lifted) elements.delete(id);
  return countedTogether([
    [elements.size, 'part'],
    [buses.size, 'busbar'],
  ]);
}

/** Why parts cannot be moved to a busbar, as a clause; null where they can. */
export function moveObstacle(study: Study, moves: readonly Move[], busId: string): string | null {
  const where = busName(study, busId);
  for (const { id, end } of moves) {
    const part = elementById(study, id);
    if (part && isSeries(part) && (end === 'from' ? part.to : part.from) === busId)
      return `both ends of ${nameOf(part)} would be at ${where}`;
  }
  const lifted = moves.filter((move) => move.end !== 'to').map((move) => move.id);
  if (!withBelow(study, lifted).buses.has(busId)) return null;
  const [first] = lifted.flatMap((id) => elementById(study, id) ?? []);
  return `${where} hangs below ${lifted.length === 1 && first ? nameOf(first) : 'one of them'} itself`;
}

/** Busbars that had a way to a source and lose it by an edit, in study order; removed ones do not count. */
export function busesLosingFeed(study: Study, edit: Edit): string[] {
  const after = edit.apply(study);
  const [before, now] = [fedBuses(study), fedBuses(after)];
  return after.buses.map((bus) => bus.id).filter((id) => before.has(id) && !now.has(id));
}

function withMovedEnd(study: Study, { id, end }: Move, busId: string): Study {
  const before = elementById(study, id);
  const elements = mapById(study.elements, id, (item) => movedEnd(item, end, busId));
  if (!before || elements === study.elements) return study;
  const moved = { ...study, elements };
  const next = study.view ? withField(moved, 'view', viewAfterMove(study.view, id, elements)) : moved;
  const left = isSeries(before) ? (end === 'from' ? before.from : before.to) : before.bus;
  return isSeries(before) ? withoutBareBus(next, left) : next;
}

function movedEnd(element: StudyElement, end: End, busId: string): StudyElement {
  if (isSeries(element) ? end === 'bus' : end !== 'bus') return element;
  if (isSeries(element) && (end === 'from' ? element.to : element.from) === busId) return element;
  return patched(element, { [end]: busId });
}

/** A current pin looks at a terminal; where the terminal moved away the pin follows it. */
function viewAfterMove(view: StudyView, id: string, elements: readonly StudyElement[]): StudyView {
  const element = elements.find((item) => item.id === id);
  if (!element) return view;
  const ends = isSeries(element) ? [element.from, element.to] : [element.bus];
  const pins = view.pins?.map((pin) => {
    if (pin.quantity !== 'current' || pin.element !== id || ends.includes(pin.bus)) return pin;
    return { ...pin, bus: ends.at(-1) ?? pin.bus };
  });
  const order =
    view.orderAlong &&
    Object.entries(view.orderAlong).map(([bus, ids]) => [
      bus,
      ends.includes(bus) ? ids : ids.filter((item) => item !== id),
    ]);
  return { ...view, ...(pins ? { pins } : {}), ...(order ? { orderAlong: Object.fromEntries(order) } : {}) };
}

const bareKeys = new Set(['id', 'name', 'nominalV']);

/** A busbar brought by a part that nothing stands at or speaks of, without a name or data of its own. */
function isBare(study: Study, busId: string): boolean {
  const bus = busById(study, busId);
  if (!bus || !isBroughtName(bus.name) || elementsAt(study, busId).length > 0) return false;
  const spokenOf =
    study.scans?.some((scan) => scan.bus === busId) ||
    study.view?.pins?.some((pin) => pin.bus === busId) ||
    Object.keys(study.origins ?? {}).some((path) => path.startsWith(`buses.${busId}.`));
  return !spokenOf && Object.keys(bus).every((key) => bareKeys.has(key));
}

function withoutBareBus(study: Study, busId: string): Study {
  if (!isBare(study, busId)) return study;
  const { focusBus, orderAlong, ...view } = study.view ?? {};
  const order = orderAlong && Object.fromEntries(Object.entries(orderAlong).filter(([id]) => id !== busId));
  return {
    ...study,
    buses: study.buses.filter((bus) => bus.id !== busId),
    ...(study.view && {
      view: {
        ...view,
        ...(focusBus !== undefined && focusBus !== busId ? { focusBus } : {}),
        ...(order ? { orderAlong: order } : {}),
        ...(view.marks ? { marks: marksLeftBy(view.marks, new Set(), new Set([busId])) } : {}),
      },
    }),
  };
}
