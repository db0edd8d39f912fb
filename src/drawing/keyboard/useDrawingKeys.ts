import { type KeyboardEvent, useCallback, useRef } from 'react';
import {
  duplicateParts,
  type Edit,
  makeEdit,
  removeBus,
  removeParts,
  type Study,
} from '../../study/index.ts';
import { partsAlong } from '../gestures/busAt.ts';
import { dropPlan, type Held } from '../gestures/dropPlan.ts';
import type { TrayKind } from '../gestures/TrayKind.ts';
import type { Layout } from '../layout/index.ts';
import { busSubject, partSubject, readSubject, type Subject, selectedIds } from '../subject.ts';
import type { PaneControls } from '../view/usePaneView.ts';
import { type Direction, neighbour, neighbourBus } from './neighbour.ts';

export interface KeyContext {
  study: Study;
  layout: Layout;
  controls: PaneControls;
  selection: readonly Subject[];
  current: Subject | undefined;
  openSlip: Subject | null;
  /** What looks for a busbar: a new part, or a part being moved. */
  carried: Held | null;
  armedKind: TrayKind | null;
  targetBus: string | undefined;
  setCurrent(subject: Subject): void;
  setCarried(held: Held | null): void;
  setTarget(bus: string | undefined): void;
  /** Ends a pointer gesture; false when none is under way. */
  cancelGesture(): boolean;
  /** Keeps the keyboard in the drawing when the focused part goes. */
  focusPane(): void;
  onArm(kind: TrayKind | null): void;
  onSelect(items: readonly Subject[]): void;
  onFocusBus(bus: string): void;
  onOpenSlip(subject: Subject | null): void;
  onDrop(edit: Edit, select: Subject | undefined): void;
}

const DIRECTIONS: Record<string, Direction> = {
  ArrowLeft: 'left',
  ArrowRight: 'right',
  ArrowUp: 'up',
  ArrowDown: 'down',
};

/** One edit that removes everything selected. */
export function removeSelection(study: Study, selection: readonly Subject[]): Edit | undefined {
  const { parts, buses } = selectedIds(selection);
  const edits: Edit[] = [];
  if (parts.length > 0) edits.push(removeParts(study, parts));
  for (const bus of buses) edits.push(removeBus(study, bus));
  const [first] = edits;
  if (!first || edits.length === 1) return first;
  return makeEdit('selection.remove', `remove ${parts.length + buses.length} items`, (s) =>
    edits.reduce((standing, edit) => edit.apply(standing), s),
  );
}

/** Keyboard of the drawing; every key acts on the part or busbar that holds the focus. */
export function useDrawingKeys(context: KeyContext) {
  const latest = useRef(context);
  latest.current = context;
  return useCallback((event: KeyboardEvent) => {
    const c = latest.current;
    const direction = DIRECTIONS[event.key];
    const done = direction
      ? arrow(c, direction, event)
      : event.ctrlKey || event.metaKey
        ? chord(c, event)
        : plainKey(c, event);
    if (!done) return;
    event.preventDefault();
    event.stopPropagation();
  }, []);
}

function arrow(c: KeyContext, direction: Direction, event: KeyboardEvent): true {
  if (c.carried) {
    c.setTarget(neighbourBus(c.layout, c.targetBus, direction) ?? c.targetBus);
    return true;
  }
  if (event.altKey && (direction === 'left' || direction === 'right')) {
    const edit = shifted(c, direction);
    if (edit) c.onDrop(edit, c.current);
    return true;
  }
  const next = neighbour(c.layout, c.current, direction);
  if (!next) return true;
  c.setCurrent(next);
  const extended = c.selection.includes(next) ? c.selection : [...c.selection, next];
  c.onSelect(event.shiftKey ? extended : [next]);
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
  return dropPlan(c.study, c.layout, { what: 'part', id: place.id }, at).edit;
}

function chord(c: KeyContext, event: KeyboardEvent): boolean {
  if (event.key.toLowerCase() !== 'd') return false;
  const { parts } = selectedIds(c.selection);
  if (parts.length === 0) return true;
  const edit = duplicateParts(c.study, parts);
  c.onDrop(edit, undefined);
  c.onSelect(edit.elementIds.map(partSubject));
  return true;
}

function plainKey(c: KeyContext, event: KeyboardEvent): boolean {
  switch (event.key) {
    case 'Enter':
      return enter(c);
    case ' ':
      return mark(c, event.shiftKey);
    case 'Escape':
      return stepBack(c);
    case 'Delete':
    case 'Backspace': {
      const edit = removeSelection(c.study, c.selection);
      if (!edit) return true;
      const next = neighbour(c.layout, c.current, 'up');
      c.focusPane();
      c.onDrop(edit, undefined);
      c.onSelect([]);
      if (next) c.setCurrent(next);
      return true;
    }
    case 'm':
    case 'M':
      return carry(c);
    case 'f':
    case 'F':
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
      return false;
  }
}

function enter(c: KeyContext): boolean {
  if (c.carried) {
    const at = c.targetBus === undefined ? { x: Number.NaN, y: Number.NaN } : { bus: c.targetBus };
    const plan = dropPlan(c.study, c.layout, c.carried, at);
    if (plan.edit) c.onDrop(plan.edit, plan.select);
    c.setCarried(null);
    if (c.armedKind) c.onArm(null);
    return true;
  }
  if (!c.current) return false;
  c.onSelect([c.current]);
  c.onOpenSlip(c.current);
  return true;
}

/** Space is the click: it selects, and on a busbar moves the rail there. */
function mark(c: KeyContext, adding: boolean): boolean {
  if (!c.current) return false;
  const kept = adding ? c.selection.filter((item) => item !== c.current) : [];
  c.onSelect([...kept, c.current]);
  const subject = readSubject(c.current);
  if (subject?.kind === 'bus') c.onFocusBus(subject.id);
  return true;
}

function stepBack(c: KeyContext): boolean {
  if (c.cancelGesture() && !c.armedKind) return true;
  if (c.carried || c.armedKind) {
    // The part that stays where it was has the keyboard again.
    if (c.carried?.what === 'part') c.setCurrent(partSubject(c.carried.id));
    c.setCarried(null);
    c.onArm(null);
  } else if (c.openSlip) c.onOpenSlip(null);
  else if (c.selection.length > 0) c.onSelect([]);
  else return false;
  return true;
}

function carry(c: KeyContext): boolean {
  const subject = c.current ? readSubject(c.current) : undefined;
  const place = subject?.kind === 'element' && c.layout.parts.find((part) => part.id === subject.id);
  if (!place) return false;
  c.setCarried({ what: 'part', id: place.id });
  c.setTarget(place.bus);
  c.setCurrent(busSubject(place.bus));
  return true;
}
