import type { Field } from '../fields/Field.ts';
import { fieldsOf } from '../fields/fieldsOf.ts';
import type { Bus, ElementKind, Study, StudyElement } from '../types.ts';

/** What a table lists: the parts of one kind, or the busbars. */
export type TableOwner = ElementKind | 'bus';

export type TableRecord = StudyElement | Bus;

/** A column of a table: one field of the catalogue, or one inside a small record of its own. */
export interface TableColumn {
  /** Key of the field; "controller.kCT" inside a record. */
  key: string;
  field: Field;
  /** Field of the record that holds it, where it lies inside one. */
  group: string | null;
  label: string;
  unit: string;
  /** Stands in the table without being asked for. */
  essential: boolean;
}

const columns = new Map<TableOwner, readonly TableColumn[]>();

/** Columns of a table: name, where it stands, what the result hangs on, in service, then everything else. */
export function tableColumns(owner: TableOwner): readonly TableColumn[] {
  const known = columns.get(owner);
  if (known) return known;
  const all = fieldsOf(owner).flatMap((field) => columnsOf(field));
  const rank = ({ key, field, essential }: TableColumn): number => {
    if (key === 'name') return 0;
    if (field.type === 'busRef') return 1;
    if (key === 'on') return 3;
    return essential ? 2 : 4;
  };
  const sorted = all.toSorted((a, b) => rank(a) - rank(b));
  columns.set(owner, sorted);
  return sorted;
}

function columnsOf(field: Field): TableColumn[] {
  if (field.type === 'opaque') return [];
  if (field.type !== 'group') return [columnOf(field, null)];
  return field.fields.map((inner) => columnOf(inner, field));
}

function columnOf(field: Field, group: Field | null): TableColumn {
  return {
    key: group ? `${group.key}.${field.key}` : field.key,
    field,
    group: group?.key ?? null,
    label: group ? `${group.label}: ${field.label}` : field.label,
    unit: 'unit' in field ? field.unit : '',
    essential: !group && !field.rare,
  };
}

/** The records a table lists, in study order. */
export function tableRecords(study: Study, owner: TableOwner): readonly TableRecord[] {
  return owner === 'bus' ? study.buses : study.elements.filter((element) => element.kind === owner);
}

/** The value of a column in a record, undefined where its default holds. */
export function columnValue(record: TableRecord, { group, field }: TableColumn): unknown {
  const own = valueAt(record, group ?? field.key);
  return group === null ? own : valueAt(own, field.key);
}

function valueAt(record: unknown, key: string): unknown {
  if (typeof record !== 'object' || record === null) return undefined;
  return new Map<string, unknown>(Object.entries(record)).get(key);
}
