import type { MouseEvent, ReactNode } from 'react';
import { originLetters } from '../../drawing/index.ts';
import {
  busById,
  cellText,
  columnValue,
  defaultOf,
  homeBusOf,
  nameOf,
  originOf,
  originTally,
  type Study,
  sameData,
  type TableColumn,
  type TableRecord,
  takesOrigin,
} from '../../study/index.ts';

import { gridRoles } from './gridRoles.ts';

export interface TableRowProps {
  index: number;
  top: number;
  record: TableRecord;
  /** As it stands in the base study; another object where the case changes it. */
  base: TableRecord;
  columns: readonly TableColumn[];
  study: Study;
  /** Columns of this row that are marked, and the one with the keyboard. */
  marked: readonly [from: number, to: number] | null;
  focus: number | null;
  /** Keys of the fields somebody has something to say about. */
  found: ReadonlySet<string>;
  /** The cell being written in. */
  editor: { column: number; node: ReactNode } | null;
  onPress(event: MouseEvent, row: number, column: number): void;
  onDrag(row: number, column: number): void;
  onOpen(row: number, column: number): void;
}

/** One part or busbar as a row of cells. */
export function TableRow(props: TableRowProps) {
  const { index, top, record, base, columns, study, marked, focus, found, editor } = props;
  const nominalV = 'kind' in record ? busById(study, homeBusOf(record))?.nominalV : record.nominalV;
  const mouse = (at: number) => ({
    onMouseDown: (event: MouseEvent) => props.onPress(event, index, at),
    onMouseEnter: () => props.onDrag(index, at),
    onDoubleClick: () => props.onOpen(index, at),
  });
  return (
    <div className="table-row" style={{ top }} {...gridRoles.row(index + 2)}>
      {columns.map((column, at) => {
        const value = columnValue(record, column);
        const standing = value ?? defaultOf(column.field, { owner: { ...record }, nominalV });
        const isName = column.key === 'name';
        const text = isName ? nameOf(record) : cellText(study, column.field, standing, 'shown');
        const changed = record !== base && !sameData(value ?? null, columnValue(base, column) ?? null);
        const own = editor?.column === at ? editor.node : null;
        const origin = takesOrigin(column.field) && value !== undefined && originOf(study, base, column.key);
        const classes = [
          'table-cell',
          'unit' in column.field && 'table-number',
          value === undefined && !isName && column.key !== 'on' && 'table-default',
          changed && 'table-changed',
          own && 'table-open',
        ];
        return (
          <div
            key={column.key}
            {...gridRoles.cell(at, isName, marked !== null && at >= marked[0] && at <= marked[1])}
            data-cell={`${index} ${at}`}
            data-found={found.has(column.group ?? column.key) || undefined}
            className={classes.filter(Boolean).join(' ')}
            tabIndex={focus === at && !own ? 0 : -1}
            title={
              changed
                ? `base: ${cellText(study, column.field, columnValue(base, column), 'shown') || 'default'}`
                : undefined
            }
            {...mouse(at)}
          >
            {own ?? (
              <>
                <span className="table-text">{text}</span>
                {isName && <OpenCount study={study} record={base} />}
                {origin && (
                  <span className="table-origin" data-origin={origin.origin}>
                    <span aria-hidden="true">{originLetters[origin.origin]}</span>
                    <span className="visually-hidden">, {origin.origin}</span>
                  </span>
                )}
              </>
            )}
          </div>
        );
      })}
    </div>
  );
}

/** How many values of the record nobody has confirmed, beside its name. */
function OpenCount({ study, record }: { study: Study; record: TableRecord }) {
  const { typical, assumed } = originTally(study, record);
  if (typical + assumed === 0) return null;
  const words = [typical > 0 && `${typical} typical`, assumed > 0 && `${assumed} assumed`].filter(Boolean);
  return (
    <span className="table-open-count" title={`${words.join(', ')}, to be confirmed`}>
      <span aria-hidden="true">
        {[typical > 0 && `${typical} T`, assumed > 0 && `${assumed} A`].filter(Boolean).join(' ')}
      </span>
      <span className="visually-hidden">, {words.join(', ')}</span>
    </span>
  );
}
