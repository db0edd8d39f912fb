import { useState } from 'react';
import {
  arrangeRows,
  type RowFilter,
  type RowOrder,
  type Study,
  type TableColumn,
  type TableRecord,
} from '../../study/index.ts';

const everything: RowFilter = { text: '', origin: 'any' };

/** Rows as they were arranged when filter or order was last chosen. */
interface Arranged {
  shown: readonly string[];
  known: ReadonlySet<string>;
}

/**
 * Filter and order of a table's rows. Both hold from the moment they are chosen: a row being edited neither
 * jumps nor vanishes under the hand, and new rows come at the end.
 */
export function useRows(study: Study, records: readonly TableRecord[], columns: readonly TableColumn[]) {
  const [filter, setFilter] = useState<RowFilter>(everything);
  const [order, setOrder] = useState<RowOrder | null>(null);
  const [arranged, setArranged] = useState<Arranged | null>(null);
  const arrange = (nextFilter: RowFilter, nextOrder: RowOrder | null) => {
    setFilter(nextFilter);
    setOrder(nextOrder);
    const plain = nextOrder === null && nextFilter.text.trim() === '' && nextFilter.origin === 'any';
    const rows = arrangeRows(study, records, columns, nextFilter, nextOrder);
    setArranged(
      plain ? null : { shown: rows.map(({ id }) => id), known: new Set(records.map(({ id }) => id)) },
    );
  };
  const byId = new Map(records.map((record) => [record.id, record]));
  const rows = arranged
    ? [
        ...arranged.shown.flatMap((id) => byId.get(id) ?? []),
        ...records.filter(({ id }) => !arranged.known.has(id)),
      ]
    : records;
  return {
    rows,
    filter,
    order,
    onFilter: (next: RowFilter) => arrange(next, order),
    /** Up, down, and as the study has them. */
    onSort: (column: TableColumn) => {
      const same = order?.column.key === column.key;
      arrange(
        filter,
        !same ? { column, descending: false } : order.descending ? null : { column, descending: true },
      );
    },
  };
}
