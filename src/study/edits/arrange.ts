import { counted } from '../counted.ts';
import { elementById } from '../lookup.ts';
import { busName, fullNameOf } from '../names.ts';
import type { Edit, Pin, Study } from '../types.ts';
import { makeEdit, patched, sameData } from './edit.ts';

/** Sets the order of parts along a busbar, from left to right; `moved` are those whose place it is about. */
export function reorderAlong(
  study: Study,
  busId: string,
  elementIds: readonly string[],
  moved: readonly string[] = [],
): Edit {
  const [first] = moved.flatMap((id) => elementById(study, id) ?? []);
  const what = moved.length === 1 && first ? fullNameOf(first) : counted(moved.length, 'part');
  const words = `${moved.length === 0 ? 'reorder the parts' : `move ${what}`} along ${busName(study, busId)}`;
  return makeEdit('drawing.reorder', words, (current) => {
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
