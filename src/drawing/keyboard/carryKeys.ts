import { elementById, isSeries } from '../../study/index.ts';
import { dropPlan } from '../gestures/dropPlan.ts';
import type { Held } from '../gestures/Held.ts';
import { isSeriesKind, type TrayKind } from '../gestures/TrayKind.ts';
import { busSubject, partSubject, readSubject, selectedIds } from '../subject.ts';
import type { Key, KeyContext } from './KeyContext.ts';
import { type Direction, neighbourBus } from './neighbour.ts';

/** Where a carried part is while the study has no busbar to choose. */
export const OFF_PAPER = { x: Number.NaN, y: Number.NaN };

/** Keys while something looks for a busbar: arrows choose it, Enter lets go, Escape puts it back. */
export function carryKeys(c: KeyContext, held: Held, key: Key, direction: Direction | undefined): boolean {
  if (direction) {
    c.setTarget(neighbourBus(c.layout, c.targetBus, direction) ?? c.targetBus);
    return true;
  }
  if (key.key === 'Enter') return letGo(c, held, key.shiftKey);
  if (key.key !== 'Escape') return false;
  if (held.what === 'parts') c.setCurrent(partSubject(held.grip));
  if (held.what === 'end') c.setCurrent(partSubject(held.id));
  c.setCarried(null);
  c.onArm(null);
  return true;
}

/** Shift keeps a series part in the hand: the busbar is its upper one, and its lower end looks for another. */
function letGo(c: KeyContext, held: Held, further: boolean): true {
  const { targetBus } = c;
  if (further && held.what === 'new' && isSeriesKind(held.kind) && held.upper === undefined && targetBus) {
    c.onArm(null);
    c.setCarried({ ...held, upper: targetBus });
    return true;
  }
  const plan = dropPlan(c.study, c.layout, held, targetBus === undefined ? OFF_PAPER : { bus: targetBus });
  if (plan.refused) {
    c.onSay(plan.words);
    return true;
  }
  if (plan.edit) c.onDrop(plan.edit, plan.select);
  else if (held.what !== 'new') c.setCurrent(partSubject(held.what === 'end' ? held.id : held.grip));
  c.setCarried(null);
  if (c.armedKind) c.onArm(null);
  if (held.what === 'new' && held.upper !== undefined && plan.select?.[0]) c.onOpenSlip(plan.select[0]);
  return true;
}

/** Takes the focused part into the hand, or all that are selected where it is one of several. */
export function carryParts(c: KeyContext): boolean {
  const read = c.current ? readSubject(c.current) : undefined;
  const place = read?.kind === 'element' ? c.layout.parts.find((part) => part.id === read.id) : undefined;
  if (!place || !c.current) return false;
  const ids = c.selection.includes(c.current) ? selectedIds(c.selection).parts : [place.id];
  look(c, { what: 'parts', ids, grip: place.id }, place.bus);
  return true;
}

/** Takes one end of the focused series part into the hand. */
export function carryEnd(c: KeyContext, end: 'from' | 'to'): boolean {
  const read = c.current ? readSubject(c.current) : undefined;
  const part = read?.kind === 'element' ? elementById(c.study, read.id) : undefined;
  if (!part) return false;
  if (!isSeries(part)) {
    c.onSay(`A ${part.kind === 'converter' ? 'drive' : part.kind} has one end: H hangs it elsewhere`);
    return true;
  }
  look(c, { what: 'end', id: part.id, end }, end === 'to' ? part.to : part.from);
  return true;
}

/** Takes a new series part into the hand whose upper busbar is the one in focus. */
export function carryBetween(c: KeyContext, kind: TrayKind, upper: string): void {
  look(c, { what: 'new', kind, upper }, upper);
}

function look(c: KeyContext, held: Held, from: string): void {
  c.onOpenSlip(null);
  c.setCarried(held);
  c.setTarget(from);
  c.setCurrent(busSubject(from));
}

type Focus = Pick<KeyContext, 'layout' | 'current'>;

/** The busbar in focus, or the one the focused part hangs from. */
export function busInFocus({ layout, current }: Focus): string | undefined {
  const read = current ? readSubject(current) : undefined;
  if (read?.kind === 'bus') return read.id;
  return layout.parts.find((part) => part.id === read?.id)?.bus ?? layout.buses[0]?.id;
}

/** The busbar a new part hangs from: below a series part in focus its lower one. */
export function busBelowFocus(focus: Focus): string | undefined {
  const read = focus.current ? readSubject(focus.current) : undefined;
  const place = read?.kind === 'element' && focus.layout.parts.find((part) => part.id === read.id);
  return place && place.hang === 'leads-on' && place.foot ? place.foot.bus : busInFocus(focus);
}
