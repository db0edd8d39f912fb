import { originOf } from '../edits/origins.ts';
import { takesOrigin } from '../fields/takesOrigin.ts';
import { nameOf } from '../names.ts';
import type { DataOrigin, Study } from '../types.ts';
import { cellText } from './cellText.ts';
import { columnValue, type TableColumn, type TableRecord } from './tableColumns.ts';

export interface RowOrder {
  column: TableColumn;
  descending: boolean;
}

/** Rows whose values come from there: any, still to be confirmed, of one origin, or of none that was stated. */
export type OriginFilter = 'any' | 'open' | DataOrigin['origin'] | 'not stated';

export interface RowFilter {
  /** Words that stand in a row, in any column. */
  text: string;
  origin: OriginFilter;
}

/** The rows of a table as they are listed: filtered, and in the order of a column; equal ones as they stand. */
export function arrangeRows(
  study: Study,
  records: readonly TableRecord[],
  columns: readonly TableColumn[],
  filter: RowFilter,
  order: RowOrder | null,
): TableRecord[] {
  const words = filter.text.trim().toLowerCase().split(/\s+/).filter(Boolean);
  const kept = records.filter((record) => {
    const cells = [nameOf(record), ...columns.map((column) => cellOf(study, record, column))];
    const text = cells.join('\n').toLowerCase();
    return words.every((word) => text.includes(word)) && hasOrigin(study, record, columns, filter.origin);
  });
  if (!order) return kept;
  const sign = order.descending ? -1 : 1;
  return kept.toSorted((a, b) => compared(study, a, b, order.column, sign));
}

function cellOf(study: Study, record: TableRecord, column: TableColumn): string {
  return cellText(study, column.field, columnValue(record, column), 'shown');
}

/** Whether an origin is one the filter looks for. */
export function matchesOrigin(origin: DataOrigin | undefined, filter: OriginFilter): boolean {
  if (filter === 'open') return origin?.origin === 'typical' || origin?.origin === 'assumed';
  if (filter === 'not stated') return origin === undefined;
  return filter === 'any' || origin?.origin === filter;
}

function hasOrigin(
  study: Study,
  record: TableRecord,
  columns: readonly TableColumn[],
  filter: OriginFilter,
): boolean {
  if (filter === 'any') return true;
  return columns.some(
    (column) =>
      takesOrigin(column.field) &&
      columnValue(record, column) !== undefined &&
      matchesOrigin(originOf(study, record, column.group ?? column.key), filter),
  );
}

/** Numbers by size, words as people sort them; what is absent comes last in either direction. */
function compared(study: Study, a: TableRecord, b: TableRecord, column: TableColumn, sign: number): number {
  const [left, right] = [columnValue(a, column), columnValue(b, column)];
  if (left === undefined || right === undefined)
    return Number(left === undefined) - Number(right === undefined);
  if (typeof left === 'number' && typeof right === 'number') return sign * (left - right);
  const [first, second] = [cellOf(study, a, column), cellOf(study, b, column)];
  return sign * first.localeCompare(second, 'en', { numeric: true, sensitivity: 'base' });
}
