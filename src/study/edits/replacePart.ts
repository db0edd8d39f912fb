import { fieldOf, seriesKinds } from '../fields/fieldsOf.ts';
import { busById, elementById, homeBusOf, isSeries } from '../lookup.ts';
import { fullNameOf, nameOf, shortKindWords } from '../names.ts';
import { placeKeys, typicalValues } from '../newPart.ts';
import type { CaseChange, DataOrigin, Edit, ElementKind, Study, StudyElement } from '../types.ts';
import { makeEdit, mapById, type Patch } from './edit.ts';
import { originPath, originsOf, putOrigins } from './origins.ts';
import { convertedValues, sameField } from './sameMeaning.ts';

/** Why a part cannot be replaced by another kind, as a clause; null where it can. */
export function replaceObstacle(study: Study, id: string, kind: ElementKind): string | null {
  const part = elementById(study, id);
  if (!part) return 'the part is gone';
  if (part.kind === kind) return `${nameOf(part)} is a ${shortKindWords[kind]} already`;
  if (isSeries(part) === seriesKinds.includes(kind)) return null;
  return isSeries(part)
    ? `${nameOf(part)} joins two busbars and a ${shortKindWords[kind]} hangs from one`
    : `${nameOf(part)} hangs from one busbar and a ${shortKindWords[kind]} joins two`;
}

/**
 * Puts another kind of part in a part's place. Name, busbars, place along them, pins and the values that
 * mean the same stay, with their origins and in every case; the rest is typical for the new kind.
 */
export function replacePart(study: Study, id: string, kind: ElementKind): Edit {
  const part = elementById(study, id);
  const words = `replace ${part ? fullNameOf(part) : id} by ${shortKindWords[kind]}`;
  return makeEdit('part.replace', words, (current) => {
    const before = elementById(current, id);
    if (!before || replaceObstacle(current, id, kind) !== null) return current;
    const { element, origins } = successor(current, before, kind);
    const next: Study = { ...current, elements: mapById(current.elements, id, () => element) };
    if (current.cases) {
      next.cases = current.cases.map((item) => {
        const changes = item.changes.flatMap((change) => carriedChange(change, before, kind));
        return changes.every((change, at) => change === item.changes[at]) &&
          changes.length === item.changes.length
          ? item
          : { ...item, changes };
      });
    }
    return putOrigins(next, origins);
  });
}

function successor(study: Study, before: StudyElement, kind: ElementKind) {
  const upper = isSeries(before) ? before.from : before.bus;
  const typical: Patch = {
    ...typicalValues(kind, {
      nominalV: busById(study, upper)?.nominalV ?? 400,
      frequencyHz: study.frequencyHz,
      lowerV: isSeries(before) ? busById(study, homeBusOf(before))?.nominalV : undefined,
    }),
  };
  const kept = carriedFields(before, before.kind, kind);
  const converted = convertedValues(study, before, kind, typical);
  const ends = isSeries(before) ? { from: before.from, to: before.to } : { bus: before.bus };
  const element = {
    id: before.id,
    kind,
    ...(before.name === undefined ? {} : { name: before.name }),
    ...(before.on === undefined ? {} : { on: before.on }),
    ...ends,
    ...typical,
    ...converted,
    ...kept,
  } as unknown as StudyElement;
  return { element, origins: originsAfter(study, before, element, typical, converted) };
}

/** The fields of a record of one kind that another kind has as well, under its own keys. */
function carriedFields(record: object, from: ElementKind, to: ElementKind): Record<string, unknown> {
  return Object.fromEntries(
    Object.entries(record).flatMap(([key, value]) => {
      const own = sameField(from, key, to);
      if (own === undefined) return [];
      // Only a converter feeds in; a value a case takes away must be one the new kind can do without.
      const feedsIn = own === 'kW' && to !== 'converter' && Number(value) < 0;
      const needed = value === null && fieldOf(to, own)?.required === true;
      return feedsIn || needed ? [] : [[own, value] as const];
    }),
  );
}

function carriedChange(change: CaseChange, before: StudyElement, kind: ElementKind): CaseChange[] {
  if (change.element !== before.id) return [change];
  const own = ['on', 'name', 'bus', 'from', 'to'].filter((key) => key in change.set);
  const set = {
    ...Object.fromEntries(own.map((key) => [key, change.set[key]])),
    ...carriedFields(change.set, before.kind, kind),
  };
  return Object.keys(set).length === 0 ? [] : [{ ...change, set }];
}

/** Kept values keep their origin, calculated ones are assumed, the rest is typical. */
function originsAfter(
  study: Study,
  before: StudyElement,
  element: StudyElement,
  typical: Patch,
  converted: Patch,
): Record<string, DataOrigin | null> {
  const path = (key: string) => originPath('elements', before.id, key);
  const old = originsOf(study, 'elements', before.id);
  const result: Record<string, DataOrigin | null> = {};
  for (const key of Object.keys(old)) result[path(key)] = null;
  for (const key of Object.keys(typical)) if (!placeKeys.has(key)) result[path(key)] = { origin: 'typical' };
  const note = `calculated from the ${shortKindWords[before.kind]} it replaces`;
  for (const key of Object.keys(converted)) result[path(key)] = { origin: 'assumed', note };
  for (const key of Object.keys(carriedFields(before, before.kind, element.kind))) result[path(key)] = null;
  for (const [key, origin] of Object.entries(old)) {
    const own = sameField(before.kind, key, element.kind);
    if (own !== undefined && key in before) result[path(own)] = origin;
  }
  return result;
}
