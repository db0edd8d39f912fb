import type { MouseEvent } from 'react';
import { Formula } from '../../drawing/index.ts';
import type { RowOrder, TableColumn } from '../../study/index.ts';

import { gridRoles } from './gridRoles.ts';

export interface TableHeadProps {
  columns: readonly TableColumn[];
  order: RowOrder | null;
  /** The column with the keyboard, where it is in the heads. */
  focus: number | null;
  onSort(column: number): void;
}

/** The heads of a table: what a column holds, its unit, and whether the rows are in its order. */
export function TableHead({ columns, order, focus, onSort }: TableHeadProps) {
  const onPress = (at: number) => ({
    onMouseDown: (event: MouseEvent) => {
      event.preventDefault();
      onSort(at);
    },
  });
  return (
    <div className="table-head" {...gridRoles.row(1)}>
      {columns.map((column, at) => {
        const sorted = order?.column.key === column.key ? order : null;
        return (
          <div
            key={column.key}
            {...gridRoles.head(at, sorted ? (sorted.descending ? 'descending' : 'ascending') : 'none')}
            data-cell={`-1 ${at}`}
            className={'unit' in column.field ? 'table-cell table-number' : 'table-cell'}
            tabIndex={focus === at ? 0 : -1}
            title={column.field.help}
            {...onPress(at)}
          >
            <span className="table-label">
              <Formula text={column.label} />
            </span>
            <span className="unit">
              {column.unit}
              {sorted && <span aria-hidden="true">{sorted.descending ? ' ▼' : ' ▲'}</span>}
            </span>
          </div>
        );
      })}
    </div>
  );
}
