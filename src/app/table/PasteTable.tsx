import {
  type Paste,
  type PastedCell,
  type PastedRow,
  type TableOwner,
  tableColumns,
} from '../../study/index.ts';

export interface PasteTableProps {
  owner: TableOwner;
  paste: Paste;
  /** The rows of the paste, those the study refuses among them. */
  rows: readonly PastedRow[];
  onColumn(index: number, key: string | null): void;
  onCell(line: number, index: number, text: string): void;
  onUse(line: number, use: boolean): void;
}

/** The pasted rows as they are read: which column is which, which row is which part, and what is wrong. */
export function PasteTable({ owner, paste, rows, onColumn, onCell, onUse }: PasteTableProps) {
  const columns = tableColumns(owner);
  return (
    <div className="paste-table">
      <table>
        <caption className="visually-hidden">The pasted rows as they are read</caption>
        <thead>
          <tr>
            <th scope="col">use</th>
            <th scope="col">row</th>
            {paste.columns.map(({ head, column, unit }, index) => (
              // biome-ignore lint/suspicious/noArrayIndexKey: a pasted column is known by its place alone
              <th key={index} scope="col" data-unused={column === null || undefined}>
                <span className="paste-head">{head || `column ${index + 1}`}</span>
                <select
                  aria-label={`Column ${head || index + 1} is`}
                  value={column?.key ?? ''}
                  onChange={(event) => onColumn(index, event.target.value || null)}
                >
                  <option value="">leave out</option>
                  {columns.map(({ key, label, unit: own }) => (
                    <option key={key} value={key}>
                      {own === '' ? label : `${label} [${own}]`}
                    </option>
                  ))}
                </select>
                {unit !== '' && unit !== column?.unit && column && (
                  <span className="unit">
                    in {unit}, to {column.unit || 'a ratio'}
                  </span>
                )}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.line} data-fate={row.fate}>
              <td>
                <input
                  type="checkbox"
                  aria-label={`Use line ${row.line}`}
                  checked={row.fate !== 'left out'}
                  onChange={(event) => onUse(row.line, event.target.checked)}
                />
              </td>
              <th scope="row">
                {fateWords(row)}
                {row.error !== null && <span className="slip-error">{row.error}</span>}
              </th>
              {row.cells.map((cell, index) => (
                // biome-ignore lint/suspicious/noArrayIndexKey: a pasted cell is known by its place alone
                <td key={index} data-unused={paste.columns[index]?.column === null || undefined}>
                  <ReadCell
                    cell={cell}
                    used={paste.columns[index]?.column !== null}
                    label={`Line ${row.line}, ${paste.columns[index]?.column?.label ?? ''}`}
                    onText={(text) => onCell(row.line, index, text)}
                  />
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function fateWords({ fate, name }: PastedRow): string {
  switch (fate) {
    case 'new':
      return name === '' ? 'new' : `new: ${name}`;
    case 'change':
      return `changes ${name}`;
    case 'same':
      return `${name}, already so`;
    case 'left out':
      return `${name} left out`;
    case 'refused':
      return `${name || 'row'} refused`;
  }
}

interface ReadCellProps {
  cell: PastedCell;
  used: boolean;
  label: string;
  onText(text: string): void;
}

/** A cell as it is read, with what was written where that differs; a wrong one can be mended here. */
function ReadCell({ cell, used, label, onText }: ReadCellProps) {
  const { text, read, error } = cell;
  if (error !== null)
    return (
      <>
        <input
          type="text"
          aria-label={label}
          aria-invalid="true"
          value={text}
          onChange={(event) => onText(event.target.value)}
        />
        <span className="slip-error">{error}</span>
      </>
    );
  if (!used) return text;
  return (
    <>
      {read || '–'}
      {text !== '' && text !== read && <span className="unit paste-written">{text}</span>}
    </>
  );
}
