import { studyInCase } from '../cases.ts';
import { fieldOf, seriesKinds } from '../fields/fieldsOf.ts';
import { takesOrigin } from '../fields/takesOrigin.ts';
import { busById, elementById } from '../lookup.ts';
import type { TableOwner } from '../table/tableColumns.ts';
import type { DataOrigin, Edit, ElementKind, Study } from '../types.ts';
import { addBus, addPart } from './addParts.ts';
import { joinEdits, makeEdit, type Patch } from './edit.ts';
import { originPath, putOrigins } from './origins.ts';
import { setField } from './setField.ts';
import { updateBus, updateElement } from './updates.ts';

/** What becomes of one row of a table. */
export interface RowChange {
  /** The part or busbar that stands; absent for a new one. */
  id?: string | undefined;
  /** Values by column key; undefined falls back to the default. "controller.kCT" is a field inside a record. */
  values: Patch;
}

export interface SetTableOptions {
  /** Words for undo: "paste 12 motors". */
  words: string;
  /** Parts that stand are changed in this case alone; new parts and busbars belong to the base study. */
  caseId?: string | undefined;
  /** Where the values come from; absent: not stated. */
  origin?: DataOrigin | undefined;
  /** Busbar of a new part whose row names none. */
  place?: string | undefined;
}

const ends: ReadonlySet<string> = new Set(['bus', 'from', 'to']);

/**
 * Values of a whole table as one step of undo: rows that stand are changed, new ones are added with typical
 * values for what their row leaves open. A new part needs a busbar, of its row or of the options; a series
 * part without a lower one brings it.
 */
export function setTable(
  study: Study,
  owner: TableOwner,
  rows: readonly RowChange[],
  options: SetTableOptions,
): Edit {
  const makers = rows.map(
    (row) => (current: Study) =>
      makeEdit('row.set', options.words, () => withRow(current, owner, row, options)),
  );
  const label = owner === 'bus' ? 'buses.setTable' : `${owner}.setTable`;
  return rows.length === 0
    ? makeEdit(label, options.words, () => study)
    : joinEdits(label, options.words, makers);
}

function withRow(study: Study, owner: TableOwner, row: RowChange, options: SetTableOptions): Study {
  if (row.id !== undefined) return withChanged(study, owner, row.id, row.values, options);
  const added = owner === 'bus' ? withNewBus(study, row) : withNewPart(study, owner, row, options);
  return added === null ? study : noted(added.study, owner, added.id, row.values, options);
}

function withChanged(
  study: Study,
  owner: TableOwner,
  id: string,
  values: Patch,
  options: SetTableOptions,
): Study {
  if (owner === 'bus') {
    const next = updateBus(study, id, values).apply(study);
    return next === study ? study : noted(next, owner, id, values, options);
  }
  const element = elementById(study, id);
  const { caseId } = options;
  if (!element) return study;
  // A name belongs to the part, whatever the case.
  const written = (key: string) => (caseId === undefined || key === 'name' ? {} : { caseId });
  const single = Object.keys(values).filter((key) => ends.has(key) || key === 'spectrum' || key === 'name');
  const standing = caseId === undefined ? element : elementById(studyInCase(study, caseId), id);
  const together = grouped(values, new Set(single), new Map(Object.entries(standing ?? {})));
  let next = updateElement(study, id, together, caseId === undefined ? {} : { caseId }).apply(study);
  for (const key of single) next = setField(next, id, key, values[key], written(key)).apply(next);
  return next === study || caseId !== undefined ? next : noted(next, owner, id, values, options);
}

/** The values as fields of a record: those inside a record of its own go into a copy of that. */
function grouped(values: Patch, skip: ReadonlySet<string>, standing: ReadonlyMap<string, unknown>): Patch {
  const patch = new Map<string, unknown>();
  for (const [key, value] of Object.entries(values)) {
    if (skip.has(key)) continue;
    const [group = '', field] = key.split('.');
    if (field === undefined) {
      patch.set(key, value);
      continue;
    }
    const before = patch.get(group) ?? standing.get(group) ?? {};
    const entries = Object.entries(before).filter(([name]) => name !== field);
    if (value !== undefined && value !== null) entries.push([field, value]);
    patch.set(group, entries.length === 0 ? undefined : Object.fromEntries(entries));
  }
  return Object.fromEntries(patch);
}

interface Added {
  study: Study;
  id: string;
}

function withNewBus(study: Study, { values }: RowChange): Added {
  const given = Object.entries(values).filter(([, value]) => value !== undefined && value !== null);
  const edit = addBus(study, Object.fromEntries(given));
  return { study: edit.apply(study), id: edit.busId };
}

function withNewPart(
  study: Study,
  kind: ElementKind,
  { values }: RowChange,
  { place }: SetTableOptions,
): Added | null {
  const isSeriesKind = seriesKinds.includes(kind);
  const upper = String((isSeriesKind ? values.from : values.bus) ?? place ?? '');
  const lower = isSeriesKind && typeof values.to === 'string' ? values.to : undefined;
  if (!busById(study, upper) || (lower !== undefined && !busById(study, lower))) return null;
  const edit = addPart(study, {
    kind,
    bus: upper,
    ...(lower === undefined ? {} : { to: lower }),
    values: grouped(values, ends, new Map()),
  });
  return { study: edit.apply(study), id: edit.elementId };
}

/** The study with the origin of the values written, where one was given; a built-in spectrum keeps its own. */
function noted(
  study: Study,
  owner: TableOwner,
  id: string,
  values: Patch,
  { origin }: SetTableOptions,
): Study {
  if (!origin) return study;
  const list = owner === 'bus' ? 'buses' : 'elements';
  const keys = Object.entries(values).filter(([key, value]) => {
    const field = fieldOf(owner, key);
    const isReference = field?.type === 'spectrum' && typeof value === 'string';
    return value !== undefined && value !== null && field && takesOrigin(field) && !isReference;
  });
  return putOrigins(study, Object.fromEntries(keys.map(([key]) => [originPath(list, id, key), origin])));
}
