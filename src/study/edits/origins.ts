import { fieldOf, fieldsOf } from '../fields/fieldsOf.ts';
import { takesOrigin } from '../fields/takesOrigin.ts';
import { elementById } from '../lookup.ts';
import { busName, fullNameOf } from '../names.ts';
import type { Bus, DataOrigin, Edit, Study, StudyElement } from '../types.ts';
import { makeEdit, patched, withField } from './edit.ts';

/** Key of a field in `study.origins`: "elements.<id>.<field>", "buses.<id>.<field>" or a study field alone. */
export function originPath(list: 'elements' | 'buses' | 'study', id: string, field: string): string {
  return list === 'study' ? field : `${list}.${id}.${field}`;
}

/** Where a part's or busbar's value comes from, or undefined where nobody has said. */
export function originOf(study: Study, owner: StudyElement | Bus, field: string): DataOrigin | undefined {
  return study.origins?.[originPath('kind' in owner ? 'elements' : 'buses', owner.id, field)];
}

/** Notes where a value comes from; null takes the note away. */
export function setOrigin(
  study: Study,
  owner: StudyElement | Bus,
  field: string,
  origin: DataOrigin | null,
): Edit {
  const isElement = 'kind' in owner;
  const path = originPath(isElement ? 'elements' : 'buses', owner.id, field);
  const label = fieldOf(isElement ? owner.kind : 'bus', field)?.label ?? field;
  const name = isElement ? fullNameOf(elementById(study, owner.id) ?? owner) : busName(study, owner.id);
  return makeEdit('origin.set', `note the origin of ${label} of ${name}`, (current) =>
    putOrigins(current, { [path]: origin }),
  );
}

/** The study with origins put in or, by null, taken out; an empty record disappears. */
export function putOrigins(study: Study, entries: Readonly<Record<string, DataOrigin | null>>): Study {
  const before = study.origins ?? {};
  const origins = patched(before, entries);
  if (origins === before) return study;
  return withField(study, 'origins', Object.keys(origins).length === 0 ? undefined : origins);
}

/** Origins of the fields of one record, by field. */
export function originsOf(study: Study, list: 'elements' | 'buses', id: string): Record<string, DataOrigin> {
  const prefix = `${list}.${id}.`;
  const own = Object.entries(study.origins ?? {}).filter(
    ([path]) => path.startsWith(prefix) && !path.slice(prefix.length).includes('.'),
  );
  return Object.fromEntries(own.map(([path, origin]) => [path.slice(prefix.length), origin]));
}

/** How many of a record's values come from where; a value that falls back to its default is not counted. */
export type OriginTally = Record<DataOrigin['origin'] | 'notStated', number>;

export function originTally(study: Study, owner: StudyElement | Bus): OriginTally {
  const tally: OriginTally = { measured: 0, nameplate: 0, typical: 0, assumed: 0, notStated: 0 };
  const values = new Map<string, unknown>(Object.entries(owner));
  for (const field of fieldsOf('kind' in owner ? owner.kind : 'bus')) {
    if (!takesOrigin(field) || values.get(field.key) === undefined) continue;
    tally[originOf(study, owner, field.key)?.origin ?? 'notStated'] += 1;
  }
  return tally;
}

/**
 * Takes the typical values of parts for what their nameplates say, in one step. The note named the table the
 * value came from and goes with the mark.
 */
export function confirmTypical(study: Study, ids: readonly string[]): Edit {
  const parts = ids.flatMap((id) => elementById(study, id) ?? []);
  const [first] = parts;
  const name = parts.length === 1 && first ? fullNameOf(first) : `${parts.length} parts`;
  return makeEdit('origin.confirm', `confirm typical values of ${name} as nameplate data`, (current) => {
    const typical = parts.flatMap(({ id }) =>
      Object.entries(originsOf(current, 'elements', id))
        .filter(([, { origin }]) => origin === 'typical')
        .map(([field]) => [originPath('elements', id, field), { origin: 'nameplate' as const }] as const),
    );
    return putOrigins(current, Object.fromEntries(typical));
  });
}
