import {
  addBus,
  addPart,
  busById,
  busName,
  type Edit,
  elementById,
  isSeries,
  makeEdit,
  moveEnd,
  nameOf,
  reorderAlong,
  type Study,
} from '../../study/index.ts';
import type { Layout, Point } from '../layout/index.ts';
import { busSubject, partSubject, type Subject } from '../subject.ts';
import { busAt, partsAlong } from './busAt.ts';
import { isSeriesKind, type TrayKind, trayNames } from './TrayKind.ts';

/** What is in the hand: a new part from the tray, a part on the drawing, or one end of a series part. */
export type Held =
  | { what: 'new'; kind: TrayKind }
  | { what: 'part'; id: string }
  | { what: 'end'; id: string; end: 'from' | 'to' };

/** What letting go here would do. Without an edit it says why nothing happens. */
export interface DropPlan {
  words: string;
  edit?: Edit;
  /** The busbar that lights. */
  bus?: string;
  /** Where along it the part would stand, drawing px. */
  markX?: number;
  /** Selected afterwards. */
  select?: Subject;
}

/** Plans a drop at a point; `bus` given instead of found by the point is the keyboard's way. */
export function dropPlan(study: Study, layout: Layout, held: Held, at: Point | { bus: string }): DropPlan {
  const named = 'bus' in at ? at.bus : busAt(layout, at)?.id;
  const bus = named !== undefined && busById(study, named) ? named : undefined;
  const x = 'bus' in at ? undefined : at.x;
  if (held.what === 'new' && held.kind === 'bus') return newBusbar(study);
  if (bus === undefined) return onPaper(study, held);
  if (held.what === 'new') return newPart(study, layout, held.kind as Exclude<TrayKind, 'bus'>, bus, x);
  if (held.what === 'end') return moveTo(study, held.id, held.end, bus);
  return movePart(study, layout, held.id, bus, x);
}

function newBusbar(study: Study): DropPlan {
  const edit = addBus(study);
  return { words: 'a busbar of its own', edit, select: busSubject(edit.busId) };
}

/** On a study without busbars the first supply or part brings its busbar with it. */
function onPaper(study: Study, held: Held): DropPlan {
  if (held.what !== 'new' || held.kind === 'bus') return { words: 'let go over a busbar' };
  if (study.buses.length > 0) return { words: `hang the ${trayNames[held.kind]} from a busbar` };
  const bus = addBus(study, { name: 'Intake', pcc: true });
  const part = addPart(bus.apply(study), { kind: held.kind, bus: bus.busId });
  const name = trayNames[held.kind];
  return {
    words: `${name} with its busbar`,
    edit: makeEdit(part.label, `add ${name} with its busbar`, (s) => part.apply(bus.apply(s))),
    select: partSubject(part.elementId),
  };
}

function newPart(
  study: Study,
  layout: Layout,
  kind: Exclude<TrayKind, 'bus'>,
  bus: string,
  x: number | undefined,
): DropPlan {
  const part = addPart(study, { kind, bus });
  const place = insertion(layout, bus, part.elementId, x);
  const name = busName(study, bus);
  const words = isSeriesKind(kind)
    ? `${trayNames[kind]} from ${name}, bringing ${kind === 'coupler' ? 'the next' : 'its lower'} busbar`
    : kind === 'supply' || kind === 'generator'
      ? `${trayNames[kind]} feeding ${name}`
      : `${trayNames[kind]} hanging from ${name}`;
  const edit =
    place.order === undefined
      ? part
      : makeEdit(part.label, part.words, (s) =>
          reorderAlong(study, bus, place.order ?? []).apply(part.apply(s)),
        );
  return { words, edit, bus, select: partSubject(part.elementId), ...place.mark };
}

/** Order along the bar with `id` put in at x; no order where it falls at the end anyway. */
function insertion(layout: Layout, bus: string, id: string, x: number | undefined) {
  if (x === undefined) return { mark: {} };
  const others = partsAlong(layout, bus).filter((part) => part.id !== id);
  const at = others.filter((part) => part.x < x).length;
  const bar = layout.buses.find((b) => b.id === bus);
  const [before, after] = [others[at - 1]?.x, others[at]?.x];
  const markX =
    before !== undefined && after !== undefined
      ? (before + after) / 2
      : before !== undefined
        ? before + 40
        : after !== undefined
          ? Math.max((bar?.x1 ?? 0) + 6, after - 40)
          : Math.min(Math.max(x, bar?.x1 ?? x), bar?.x2 ?? x);
  const order = others.map((part) => part.id);
  order.splice(at, 0, id);
  return at === others.length ? { mark: { markX } } : { mark: { markX }, order };
}

function moveTo(study: Study, id: string, end: 'bus' | 'from' | 'to', bus: string): DropPlan {
  const part = elementById(study, id);
  if (!part) return { words: 'the part is gone' };
  const name = nameOf(part);
  if (isSeries(part)) {
    const other = end === 'from' ? part.to : part.from;
    const own = end === 'from' ? part.from : part.to;
    if (bus === own) return { words: `${name} stays at ${busName(study, bus)}`, bus };
    if (bus === other) return { words: `both ends of ${name} cannot be at ${busName(study, bus)}`, bus };
    const words = `${name} joins ${busName(study, other)} and ${busName(study, bus)}`;
    return { words, edit: moveEnd(study, id, end, bus), bus, select: partSubject(id) };
  }
  const words = `${name} hangs from ${busName(study, bus)}`;
  return { words, edit: moveEnd(study, id, 'bus', bus), bus, select: partSubject(id) };
}

/** Dragging a part moves its upper end, or only its place along the bar. */
function movePart(study: Study, layout: Layout, id: string, bus: string, x: number | undefined): DropPlan {
  const place = layout.parts.find((part) => part.id === id);
  const part = elementById(study, id);
  if (!place || !part) return { words: 'the part is gone' };
  const { order, mark } = insertion(layout, bus, id, x);
  if (bus === place.bus) {
    const along = partsAlong(layout, bus).map((p) => p.id);
    const wished = order ?? [...along.filter((p) => p !== id), id];
    const name = busName(study, bus);
    if (x === undefined || !along.includes(id) || wished.every((p, i) => p === along[i])) {
      return { words: `${nameOf(part)} stays at ${name}`, bus };
    }
    const edit = reorderAlong(study, bus, wished);
    return { words: `${nameOf(part)} moves along ${name}`, edit, bus, select: partSubject(id), ...mark };
  }
  const end = isSeries(part) ? (part.from === place.bus ? 'from' : 'to') : 'bus';
  const plan = moveTo(study, id, end, bus);
  if (!plan.edit || !order) return { ...plan, ...(plan.edit ? mark : {}) };
  const moved = plan.edit;
  const edit = makeEdit(moved.label, moved.words, (s) => reorderAlong(s, bus, order).apply(moved.apply(s)));
  return { ...plan, edit, ...mark };
}
