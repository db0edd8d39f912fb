import { type ClipboardEvent, useState } from 'react';
import { counted, fieldsOf, type HarmonicRow, type NumberField, parseRows } from '../../study/index.ts';
import { QuantityInput } from './QuantityInput.tsx';

export interface RowsTableProps {
  id: string;
  caption: string;
  rows: readonly HarmonicRow[];
  onFocus(): void;
  onCommit(rows: HarmonicRow[]): string | null;
}

const columns = fieldsOf('harmonicRow').filter(
  (field): field is NumberField => field.type === 'number' || field.type === 'integer',
);
const heads: Readonly<Record<string, string>> = { h: 'h', percent: '%', angleDeg: 'angle °' };

/** The next odd order that is free: 3, 5, 7 … */
export function nextOrder(rows: readonly HarmonicRow[]): number {
  const highest = Math.max(1, ...rows.map((row) => row.h));
  return highest + (highest % 2 === 0 ? 1 : 2);
}

/** Harmonic rows as a table; a table copied from a sheet or a report can be pasted over any cell. */
export function RowsTable({ id, caption, rows, onFocus, onCommit }: RowsTableProps) {
  const [error, setError] = useState<string | null>(null);
  const [said, setSaid] = useState('');
  const take = (next: HarmonicRow[]) => {
    const outcome = onCommit(next);
    setError(outcome);
    setSaid('');
    return outcome;
  };
  const onPaste = (event: ClipboardEvent) => {
    const text = event.clipboardData.getData('text');
    if (!/[\n\t;]/.test(text.trim())) return;
    event.preventDefault();
    const parsed = parseRows(text);
    if (!parsed.ok) {
      setError(parsed.error);
      setSaid('');
    } else if (take(parsed.rows) === null) {
      setSaid([`${counted(parsed.rows.length, 'row')} pasted.`, parsed.said].filter(Boolean).join(' '));
    }
  };
  return (
    <div className="slip-rows" onPasteCapture={onPaste}>
      {rows.length > 0 && (
        <table>
          <caption className="slip-hidden">{caption}</caption>
          <thead>
            <tr>
              {columns.map((column) => (
                <th key={column.key} scope="col">
                  {heads[column.key]}
                </th>
              ))}
              <th scope="col">
                <span className="slip-hidden">remove</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row, index) => (
              <tr key={row.h}>
                {columns.map((column) => (
                  <td key={column.key}>
                    <QuantityInput
                      id={index === 0 && column.key === 'h' ? id : `${id}-${row.h}-${column.key}`}
                      field={column}
                      label={`Order ${row.h}, ${column.label}`}
                      value={row[column.key as keyof HarmonicRow]}
                      onFocus={onFocus}
                      onCommit={(value) => take(rows.with(index, changedRow(row, column.key, value)))}
                    />
                  </td>
                ))}
                <td>
                  <button
                    type="button"
                    className="slip-small"
                    aria-label={`Remove order ${row.h}`}
                    onClick={() => take(rows.toSpliced(index, 1))}
                  >
                    ×
                  </button>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <button
        type="button"
        id={rows.length === 0 ? id : undefined}
        className="slip-small"
        onClick={() => take([...rows, { h: nextOrder(rows), percent: 1 }])}
      >
        Add an order
      </button>
      <p className="slip-summary">or paste order, per cent and angle from a sheet</p>
      {said !== '' && (
        <p className="slip-summary" role="status">
          {said}
        </p>
      )}
      {error !== null && (
        <span className="slip-error" role="alert">
          {error}
        </span>
      )}
    </div>
  );
}

/** The row with one cell changed; an emptied angle is unknown, not zero. */
export function changedRow(row: HarmonicRow, key: string, value: number | undefined): HarmonicRow {
  if (key === 'angleDeg' && value === undefined) {
    const { angleDeg: _angle, ...rest } = row;
    return rest;
  }
  return { ...row, [key]: value };
}
