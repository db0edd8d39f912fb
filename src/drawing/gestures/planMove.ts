import {
  alongWith,
  busById,
  busesLosingFeed,
  busName,
  counted,
  type Edit,
  elementById,
  isSeries,
  type Move,
  makeEdit,
  moveObstacle,
  moveParts,
  nameOf,
  reorderAlong,
  type Study,
  withBelow,
} from '../../study/index.ts';
import type { Layout } from '../layout/index.ts';
import { partSubject } from '../subject.ts';
import { partsAlong } from './busAt.ts';
import { type DropOutcome, notPossible } from './DropOutcome.ts';
import type { Insertion } from './insertion.ts';

/** Parts to another busbar with what hangs below them, or to another place along their own. */
export function planMove(
  study: Study,
  layout: Layout,
  ids: readonly string[],
  bus: string,
  { order, mark }: Insertion,
): DropOutcome {
  const lifted = topmost(study, ids);
  const places = layout.parts.filter((part) => lifted.includes(part.id));
  const name = heldWords(study, lifted);
  if (places.length === 0) return { words: 'the part is gone' };
  const select = lifted.map(partSubject);
  if (places.every((place) => place.bus === bus)) {
    const edit = alongEdit(study, layout, lifted, bus, order, mark !== undefined);
    if (!edit) return { words: `${name} ${lifted.length === 1 ? 'stays' : 'stay'} where it is`, bus };
    return { words: `move ${name} along ${busName(study, bus)}`, edit, bus, select, ...(mark && { mark }) };
  }
  const moves = places
    .filter((place) => place.bus !== bus)
    .map((place) => ({ id: place.id, end: upperEnd(study, place.id, place.bus) }));
  const obstacle = moveObstacle(study, moves, bus);
  if (obstacle !== null) return notPossible(obstacle, bus);
  const moved = moveParts(study, moves, bus);
  const edit = order
    ? makeEdit(moved.label, moved.words, (s) => reorderAlong(s, bus, order).apply(moved.apply(s)))
    : moved;
  const along = alongWith(study, moves);
  const words = `hang ${name}${along ? ` with ${along} below` : ''} on ${busName(study, bus)}`;
  return { words: `${words}${afterwards(study, moved)}`, edit, bus, select, ...(mark && { mark }) };
}

/** One end of a series part to another busbar. */
export function planEnd(study: Study, id: string, end: 'from' | 'to', bus: string): DropOutcome {
  const part = elementById(study, id);
  if (!part || !isSeries(part)) return { words: 'the part is gone' };
  const [own, other] = end === 'from' ? [part.from, part.to] : [part.to, part.from];
  if (bus === own) return { words: `${nameOf(part)} stays at ${busName(study, bus)}`, bus };
  if (bus === other)
    return notPossible(`both ends of ${nameOf(part)} would be at ${busName(study, bus)}`, bus);
  const edit = moveParts(study, [{ id, end }], bus);
  const words = `join ${busName(study, other)} and ${busName(study, bus)} by ${nameOf(part)}`;
  return { words: `${words}${afterwards(study, edit)}`, edit, bus, select: [partSubject(id)] };
}

/** Parts that hang below another one of the list come along with it and are not lifted themselves. */
function topmost(study: Study, ids: readonly string[]): string[] {
  return ids.filter((id) => !ids.some((other) => other !== id && withBelow(study, [other]).elements.has(id)));
}

function heldWords(study: Study, ids: readonly string[]): string {
  const [only] = ids.flatMap((id) => elementById(study, id) ?? []);
  return ids.length === 1 && only ? nameOf(only) : counted(ids.length, 'part');
}

/** The end of a part that touches the busbar it is drawn hanging from. */
function upperEnd(study: Study, id: string, bus: string): Move['end'] {
  const part = elementById(study, id);
  if (!part || !isSeries(part)) return 'bus';
  return part.from === bus ? 'from' : 'to';
}

function alongEdit(
  study: Study,
  layout: Layout,
  ids: readonly string[],
  bus: string,
  order: readonly string[] | undefined,
  placed: boolean,
): Edit | undefined {
  const along = partsAlong(layout, bus).map((part) => part.id);
  const moving = ids.filter((id) => along.includes(id));
  if (!placed || moving.length === 0) return undefined;
  const wished = order ?? [...along.filter((id) => !moving.includes(id)), ...moving];
  if (wished.every((id, at) => id === along[at])) return undefined;
  return reorderAlong(study, bus, wished, moving);
}

/** What else the edit does, said before it is done. */
function afterwards(study: Study, edit: Edit): string {
  const after = edit.apply(study);
  const bare = study.buses.filter((bus) => !busById(after, bus.id)).map(nameOf);
  const unfed = busesLosingFeed(study, edit).map((id) => busName(study, id));
  return [
    ...bare.map((name) => `; ${name} is left bare and goes`),
    ...(unfed.length > 0
      ? [`; ${unfed.join(' and ')} ${unfed.length === 1 ? 'loses its' : 'lose their'} feed`]
      : []),
  ].join('');
}
