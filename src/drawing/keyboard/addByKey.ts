import { insertionAfter } from '../gestures/insertion.ts';
import { planFirstPart, planNewBusbar, planNewPart } from '../gestures/planNew.ts';
import { isSeriesKind, type TrayKind } from '../gestures/TrayKind.ts';
import { readSubject } from '../subject.ts';
import { busBelowFocus, carryBetween } from './carryKeys.ts';
import type { KeyContext } from './KeyContext.ts';

/**
 * A kind's letter adds it to the busbar in focus, beside the part in focus, and opens its data. With Shift a
 * series part is put between that busbar and another one, chosen next.
 */
export function addByKey(c: KeyContext, kind: TrayKind, between: boolean): boolean {
  const bus = busBelowFocus(c);
  if (between) {
    if (!isSeriesKind(kind) || bus === undefined) return false;
    carryBetween(c, kind, bus);
    return true;
  }
  const after = c.current ? readSubject(c.current)?.id : undefined;
  const plan =
    kind === 'bus'
      ? planNewBusbar(c.study, bus)
      : bus === undefined
        ? planFirstPart(c.study, kind)
        : planNewPart(c.study, kind, bus, (id) => insertionAfter(c.layout, bus, [id], after));
  if (!plan.edit) return true;
  c.onDrop(plan.edit, plan.select);
  c.onOpenSlip(plan.select?.[0] ?? null);
  return true;
}
