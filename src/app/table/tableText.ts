import {
  cellText,
  columnValue,
  nameOf,
  type Study,
  type TableColumn,
  type TableRecord,
  tabularText,
} from '../../study/index.ts';

/** A whole table as tab-separated text, heads with units first; pasted again it changes nothing. */
export function tableText(
  study: Study,
  columns: readonly TableColumn[],
  rows: readonly TableRecord[],
): string {
  const heads = columns.map(({ label, unit }) => (unit === '' ? label : `${label} [${unit}]`));
  const cells = rows.map((record) =>
    columns.map((column) =>
      cellText(
        study,
        column.field,
        column.key === 'name' ? nameOf(record) : columnValue(record, column),
        'plain',
      ),
    ),
  );
  return tabularText([heads, ...cells]);
}
