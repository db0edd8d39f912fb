import {
  busName,
  counted,
  type DataOrigin,
  type Edit,
  fullNameOf,
  joinEdits,
  kindsWords,
  nameOf,
  type Study,
  setField,
  setOrigin,
  setTable,
  type TableColumn,
  type TableOwner,
  type TableRecord,
  tableRecords,
  takesOrigin,
  updateBus,
} from '../../study/index.ts';

/** A value for one cell. */
export interface CellValue {
  id: string;
  column: TableColumn;
  value: unknown;
}

/** "motors", "busbars": what a table lists. */
export function ownerWords(owner: TableOwner): string {
  return owner === 'bus' ? 'busbars' : kindsWords[owner];
}

/** A record as messages name it: "transformer T1", "busbar Main board". */
export function recordWords(study: Study, record: TableRecord): string {
  return 'kind' in record ? fullNameOf(record) : `busbar ${busName(study, record.id)}`;
}

/** One cell set, in the words its slip would use. */
function cellEdit(study: Study, owner: TableOwner, cell: CellValue, caseId: string | undefined): Edit {
  const { id, column, value } = cell;
  if (owner === 'bus') return updateBus(study, id, { [column.key]: value });
  // A name belongs to the part, whatever the case.
  const inCase = caseId === undefined || column.key === 'name' ? {} : { caseId };
  if (column.group === null) return setField(study, id, column.key, value, inCase);
  const record = tableRecords(study, owner).find((one) => one.id === id);
  const words = `set ${column.label} of ${record ? recordWords(study, record) : id}`;
  return setTable(study, owner, [{ id, values: { [column.key]: value } }], { words, ...inCase });
}

/** Several cells set as one step of undo. */
export function cellsEdit(
  study: Study,
  owner: TableOwner,
  cells: readonly CellValue[],
  caseId: string | undefined,
): Edit {
  const [first] = cells;
  if (cells.length === 1 && first) return cellEdit(study, owner, first, caseId);
  const ids = [...new Set(cells.map(({ id }) => id))];
  const rows = ids.map((id) => ({
    id,
    values: Object.fromEntries(
      cells.filter((cell) => cell.id === id).map(({ column, value }) => [column.key, value]),
    ),
  }));
  const labels = new Set(cells.map(({ column }) => column.label));
  const what = labels.size === 1 ? `the ${[...labels].join()}` : counted(cells.length, 'value');
  const whose =
    ids.length === 1 ? nameOf(recordOf(study, owner, ids[0] ?? '')) : `${ids.length} ${ownerWords(owner)}`;
  return setTable(study, owner, rows, { words: `set ${what} of ${whose}`, caseId });
}

function recordOf(study: Study, owner: TableOwner, id: string): { id: string; name?: string } {
  return tableRecords(study, owner).find((record) => record.id === id) ?? { id };
}

/** The origin of several cells' values; cells without one are passed over. */
export function originsEdit(
  study: Study,
  owner: TableOwner,
  cells: readonly { id: string; column: TableColumn }[],
  origin: (before: DataOrigin | undefined) => DataOrigin | null,
): Edit | null {
  const records = new Map(tableRecords(study, owner).map((record) => [record.id, record]));
  const marked = cells.flatMap(({ id, column }) => {
    const record = records.get(id);
    return record && takesOrigin(column.field) && column.group === null ? [{ record, key: column.key }] : [];
  });
  const edits = marked.map(({ record, key }) => {
    const list = 'kind' in record ? 'elements' : 'buses';
    return setOrigin(study, record, key, origin(study.origins?.[`${list}.${record.id}.${key}`]));
  });
  const [first] = edits;
  if (!first) return null;
  if (edits.length === 1) return first;
  return joinEdits(
    'origin.set',
    `note the origin of ${counted(edits.length, 'value')}`,
    edits.map((edit) => () => edit),
  );
}
