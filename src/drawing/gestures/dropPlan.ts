import { busById, elementById, replaceObstacle, type Study } from '../../study/index.ts';
import type { Layout, Point } from '../layout/index.ts';
import { busAt, partAt } from './busAt.ts';
import type { DropOutcome } from './DropOutcome.ts';
import type { Held } from './Held.ts';
import { insertionAt } from './insertion.ts';
import { planEnd, planMove } from './planMove.ts';
import { planBetween, planFirstPart, planNewBusbar, planNewPart, planReplace } from './planNew.ts';
import { trayNames } from './TrayKind.ts';

/** Plans a drop at a point; `bus` given instead of found by the point is the keyboard's way. */
export function dropPlan(study: Study, layout: Layout, held: Held, at: Point | { bus: string }): DropOutcome {
  const named = 'bus' in at ? at.bus : busAt(layout, at)?.id;
  const bus = named !== undefined && busById(study, named) ? named : undefined;
  const x = 'bus' in at ? undefined : at.x;
  if (held.what === 'new') {
    const { kind, upper } = held;
    if (kind === 'bus') return planNewBusbar(study);
    if (upper !== undefined && bus !== undefined) return planBetween(study, kind, upper, bus);
    const under = 'bus' in at ? undefined : partAt(layout, at)?.id;
    if (under !== undefined && replaceObstacle(study, under, kind) === null)
      return planReplace(study, under, kind);
    if (bus !== undefined) return planNewPart(study, kind, bus, (id) => insertionAt(layout, bus, [id], x));
    return study.buses.length === 0 ? planFirstPart(study, kind) : offBusbar(study, held);
  }
  if (bus === undefined) return offBusbar(study, held);
  if (held.what === 'end') return planEnd(study, held.id, held.end, bus);
  return planMove(study, layout, held.ids, bus, insertionAt(layout, bus, held.ids, x));
}

function offBusbar(study: Study, held: Held): DropOutcome {
  if (held.what === 'new')
    return { words: held.kind === 'bus' ? '' : `hold the ${trayNames[held.kind]} over a busbar` };
  if (held.what === 'end') return { words: 'hold the end over a busbar' };
  const gone = !elementById(study, held.grip);
  return { words: gone ? 'the part is gone' : 'hold it over a busbar; let go here and it stays' };
}
