import {
  addBus,
  addPart,
  busById,
  busName,
  type ElementKind,
  elementById,
  fullNameOf,
  makeEdit,
  reorderAlong,
  replaceObstacle,
  replacePart,
  type Study,
} from '../../study/index.ts';
import { busSubject, partSubject } from '../subject.ts';
import { type DropOutcome, notPossible } from './DropOutcome.ts';
import type { Insertion } from './insertion.ts';
import { isSeriesKind, trayNames } from './TrayKind.ts';

/** A busbar of its own, at the volts of another one where that is given. */
export function planNewBusbar(study: Study, like?: string): DropOutcome {
  const nominalV = like === undefined ? undefined : busById(study, like)?.nominalV;
  const edit = addBus(study, nominalV === undefined ? {} : { nominalV });
  return { words: 'a new busbar, joined to nothing yet', edit, select: [busSubject(edit.busId)] };
}

/** On a study without busbars the first part brings its busbar with it. */
export function planFirstPart(study: Study, kind: ElementKind): DropOutcome {
  const bus = addBus(study, { name: 'Intake', pcc: true });
  const part = addPart(bus.apply(study), { kind, bus: bus.busId });
  const name = trayNames[kind];
  return {
    words: `${name} with its busbar`,
    edit: makeEdit(part.label, `add ${name} with its busbar`, (s) => part.apply(bus.apply(s))),
    select: [partSubject(part.elementId)],
  };
}

/** A new part from a busbar; a series part brings its lower busbar. */
export function planNewPart(
  study: Study,
  kind: ElementKind,
  bus: string,
  insert: (id: string) => Insertion,
): DropOutcome {
  const part = addPart(study, { kind, bus });
  const { order, mark } = insert(part.elementId);
  const edit =
    order === undefined
      ? part
      : makeEdit(part.label, part.words, (s) => reorderAlong(s, bus, order).apply(part.apply(s)));
  return {
    words: newPartWords(kind, busName(study, bus)),
    edit,
    bus,
    select: [partSubject(part.elementId)],
    ...(mark ? { mark } : {}),
  };
}

function newPartWords(kind: ElementKind, bus: string): string {
  const name = trayNames[kind];
  if (isSeriesKind(kind)) return `hang ${name} on ${bus}, with a new busbar at its lower end`;
  return kind === 'supply' || kind === 'generator' ? `let ${name} feed ${bus}` : `hang ${name} on ${bus}`;
}

/** A new series part between two busbars that stand. */
export function planBetween(study: Study, kind: ElementKind, upper: string, lower: string): DropOutcome {
  const [from, to] = [busName(study, upper), busName(study, lower)];
  if (upper === lower) return notPossible(`both ends of the ${trayNames[kind]} would be at ${from}`, lower);
  const part = addPart(study, { kind, bus: upper, to: lower });
  return {
    words: `join ${from} and ${to} by ${trayNames[kind]}`,
    edit: makeEdit(part.label, `${part.words}, joining ${to}`, part.apply),
    bus: lower,
    select: [partSubject(part.elementId)],
  };
}

/** Another kind in a part's place. */
export function planReplace(study: Study, id: string, kind: ElementKind): DropOutcome {
  const part = elementById(study, id);
  const obstacle = replaceObstacle(study, id, kind);
  if (!part || obstacle !== null) return notPossible(obstacle ?? 'the part is gone');
  return {
    words: `replace ${fullNameOf(part)} by ${trayNames[kind]}, keeping name and place`,
    edit: replacePart(study, id, kind),
    replaces: id,
    select: [partSubject(id)],
  };
}
