import { useCallback, useRef } from 'react';
import type { Edit } from '../../study/index.ts';
import { partsAlong } from '../gestures/busAt.ts';
import { dropPlan } from '../gestures/dropPlan.ts';
import { busSubject, partSubject, readSubject, selectedIds } from '../subject.ts';
import { addByKey } from './addByKey.ts';
import { carryEnd, carryKeys, carryParts } from './carryKeys.ts';
import { duplicateInPlace } from './duplicateInPlace.ts';
import type { Key, KeyContext } from './KeyContext.ts';
import { kindOfKey } from './kindKeys.ts';
import { type Direction, neighbour } from './neighbour.ts';
import { beginSwap, swapKeys } from './swapKeys.ts';

const DIRECTIONS: Record<string, Direction> = {
  ArrowLeft: 'left',
  ArrowRight: 'right',
  ArrowUp: 'up',
  ArrowDown: 'down',
};

/** Keyboard of the drawing; every key acts on the part or busbar that holds the focus. True where it did. */
export function useDrawingKeys(context: KeyContext): (key: Key) => boolean {
  const latest = useRef(context);
  latest.current = context;
  return useCallback((key: Key) => {
    const done = act(latest.current, key);
    if (done) {
      key.preventDefault();
      key.stopPropagation();
    }
    return done;
  }, []);
}

function act(c: KeyContext, key: Key): boolean {
  const direction = DIRECTIONS[key.key];
  const chorded = key.ctrlKey || key.metaKey;
  if (c.swap && !chorded) return swapKeys(c, c.swap, key, direction);
  if (c.carried && !chorded) return carryKeys(c, c.carried, key, direction);
  if (direction) return arrow(c, direction, key);
  return chorded ? chord(c, key) : plainKey(c, key);
}

function arrow(c: KeyContext, direction: Direction, key: Key): true {
  if (key.altKey && (direction === 'left' || direction === 'right')) {
    const edit = shifted(c, direction);
    if (edit) c.onDrop(edit, c.current ? [c.current] : []);
    return true;
  }
  const next = neighbour(c.layout, c.current, direction);
  if (!next) return true;
  c.setCurrent(next);
  if (!key.shiftKey) c.onSelect([next]);
  else if (!c.selection.includes(next))
    c.onSelect([...new Set([...c.selection, ...(c.current ? [c.current] : []), next])]);
  // Going back over what was taken in lets it go again.
  else c.onSelect([...c.selection.filter((item) => item !== c.current && item !== next), next]);
  return true;
}

/** The focused part one place along its busbar, by the same plan as a drag just past its neighbour. */
function shifted(c: KeyContext, direction: 'left' | 'right'): Edit | undefined {
  const subject = c.current ? readSubject(c.current) : undefined;
  const place = subject && c.layout.parts.find((part) => part.id === subject.id);
  if (!place) return undefined;
  const along = partsAlong(c.layout, place.bus);
  const other = along[along.findIndex((p) => p.id === place.id) + (direction === 'right' ? 1 : -1)];
  const bar = c.layout.buses.find((bus) => bus.id === place.bus);
  if (!other || !bar) return undefined;
  const at = { x: other.x + (direction === 'right' ? 1 : -1), y: bar.y + 1 };
  return dropPlan(c.study, c.layout, { what: 'parts', ids: [place.id], grip: place.id }, at).edit;
}

function chord(c: KeyContext, { key }: Key): boolean {
  switch (key.toLowerCase()) {
    case 'a':
      c.onSelect([
        ...c.layout.buses.map((bus) => busSubject(bus.id)),
        ...c.layout.parts.map((part) => partSubject(part.id)),
      ]);
      return true;
    case 'd': {
      const { parts } = selectedIds(c.selection);
      if (parts.length === 0) return true;
      const edit = duplicateInPlace(c.study, c.layout, parts);
      c.onDrop(edit, edit.elementIds.map(partSubject));
      return true;
    }
    default:
      return false;
  }
}

function plainKey(c: KeyContext, key: Key): boolean {
  switch (key.key) {
    case 'Enter':
      return openData(c);
    case ' ':
      return mark(c, key.shiftKey);
    case 'Escape':
      return stepBack(c);
    case 'Delete':
    case 'Backspace':
      return remove(c);
    case '0':
      c.controls.fit();
      return true;
    case '+':
    case '=':
      c.controls.zoomBy(1.25);
      return true;
    case '-':
      c.controls.zoomBy(0.8);
      return true;
    default:
      return letter(c, key);
  }
}

function letter(c: KeyContext, key: Key): boolean {
  if (key.altKey) return false;
  const kind = kindOfKey(key);
  if (kind) return addByKey(c, kind, key.shiftKey);
  switch (key.key.toUpperCase()) {
    case 'H':
      return carryParts(c);
    case 'J':
      return carryEnd(c, key.shiftKey ? 'from' : 'to');
    case 'W':
      return beginSwap(c);
    default:
      return false;
  }
}

function openData(c: KeyContext): boolean {
  if (!c.current) return false;
  c.onSelect([c.current]);
  c.onOpenSlip(c.current);
  return true;
}

/** Space is the click: it selects, and on a busbar moves the rail there. */
function mark(c: KeyContext, adding: boolean): boolean {
  if (!c.current) return false;
  const kept = adding ? c.selection.filter((item) => item !== c.current) : [];
  const taken = adding && c.selection.includes(c.current) ? [] : [c.current];
  c.onSelect([...kept, ...taken]);
  const subject = readSubject(c.current);
  if (subject?.kind === 'bus') c.onFocusBus(subject.id);
  return true;
}

function remove(c: KeyContext): true {
  const chosen = selectedIds(c.selection);
  if (chosen.parts.length + chosen.buses.length > 0) c.onRemove(chosen);
  return true;
}

function stepBack(c: KeyContext): boolean {
  if (c.openSlip) c.onOpenSlip(null);
  else if (c.selection.length > 0) c.onSelect([]);
  else return false;
  return true;
}
