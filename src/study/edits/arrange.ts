import { busById, elementById, isSeries } from '../lookup.ts';
import { busName, fullNameOf } from '../names.ts';
import type { Edit, Pin, Study, StudyElement, StudyView } from '../types.ts';
import { makeEdit, mapById, patched, sameData, withField } from './edit.ts';

export type End = 'bus' | 'from' | 'to';

/**
 * Moves one end of a part to another busbar. An end the part does not have, an unknown busbar, or both ends
 * at one busbar change nothing: the same study comes back.
 */
export function moveEnd(study: Study, id: string, end: End, busId: string): Edit {
  const element = elementById(study, id);
  const words = `move ${element ? fullNameOf(element) : id} to ${busName(study, busId)}`;
  return makeEdit('part.move', words, (current) => {
    if (!busById(current, busId)) return current;
    const elements = mapById(current.elements, id, (item) => movedEnd(item, end, busId));
    if (elements === current.elements) return current;
    const next = { ...current, elements };
    return current.view ? withField(next, 'view', viewAfterMove(current.view, id, elements)) : next;
  });
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
  const pins = view.pins?.map((pin): Pin => {
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

/** Sets the order of parts along a busbar, from left to right. */
export function reorderAlong(study: Study, busId: string, elementIds: readonly string[]): Edit {
  return makeEdit('drawing.reorder', `reorder the parts along ${busName(study, busId)}`, (current) => {
    const before = current.view?.orderAlong ?? {};
    const after = patched(before, { [busId]: [...elementIds] });
    return after === before ? current : { ...current, view: { ...current.view, orderAlong: after } };
  });
}

function pinWords(study: Study, pin: Pin): string {
  if (pin.quantity === 'voltage') return `the voltage at ${busName(study, pin.bus)}`;
  const element = elementById(study, pin.element);
  return `the current of ${element ? fullNameOf(element) : pin.element} at ${busName(study, pin.bus)}`;
}

/** Pins a quantity to watch; one that is pinned already changes nothing. */
export function addPin(study: Study, pin: Pin): Edit {
  return makeEdit('pin.add', `pin ${pinWords(study, pin)}`, (current) => {
    const pins = current.view?.pins ?? [];
    return pins.some((other) => sameData(other, pin))
      ? current
      : { ...current, view: { ...current.view, pins: [...pins, pin] } };
  });
}

/** Takes a pin away. */
export function removePin(study: Study, pin: Pin): Edit {
  return makeEdit('pin.remove', `unpin ${pinWords(study, pin)}`, (current) => {
    const pins = current.view?.pins ?? [];
    const kept = pins.filter((other) => !sameData(other, pin));
    return kept.length === pins.length ? current : { ...current, view: { ...current.view, pins: kept } };
  });
}

/** Sets the whole list of pins, in reading order. */
export function setPins(_study: Study, pins: readonly Pin[]): Edit {
  return makeEdit('pin.order', 'reorder the pins', (current) => {
    if (sameData(current.view?.pins ?? [], pins)) return current;
    return { ...current, view: { ...current.view, pins: [...pins] } };
  });
}
