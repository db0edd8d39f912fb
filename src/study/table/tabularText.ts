/** Rows of cells as they were copied, and what parted them. */
export interface TabularText {
  separator: '\t' | ';' | ',' | null;
  rows: { line: number; cells: string[] }[];
  /** Lines with nothing on them. */
  blank: number;
}

/**
 * Cells of text copied from a spreadsheet or a file: parted by tabs, else semicolons, else commas where those
 * cannot be decimal marks. A quoted cell may hold separators, line ends and doubled quotes. Lines are counted
 * from 1; rows keep their cells as they stand, without the spaces around them.
 */
export function readTabular(text: string): TabularText {
  const source = text.replace(/^\ufeff/, '').replace(/\r\n?/g, '\n');
  const separator = separatorOf(source);
  const rows = separator === null ? source.split('\n').map((cell) => [cell]) : quotedRows(source, separator);
  if (rows.at(-1)?.every((cell) => cell === '')) rows.pop();
  const tidy = rows.map((cells, index) => ({ line: index + 1, cells: cells.map((cell) => cell.trim()) }));
  const filled = tidy.filter(({ cells }) => cells.some((cell) => cell !== ''));
  return { separator, rows: filled, blank: tidy.length - filled.length };
}

function separatorOf(source: string): TabularText['separator'] {
  const bare = source.replace(/"(?:[^"]|"")*"/g, '');
  if (bare.includes('\t')) return '\t';
  if (bare.includes(';')) return ';';
  const lines = bare.split('\n').filter((line) => line.trim() !== '');
  const counts = lines.map((line) => line.split(',').length - 1);
  const steady = counts.every((count) => count === counts[0]) && (counts[0] ?? 0) > 0;
  // One comma between digits on every line is a column of decimals, not two columns.
  const decimals = lines.every((line) => /^\s*-?\d*,\d+\s*$/.test(line));
  return steady && !decimals ? ',' : null;
}

function quotedRows(source: string, separator: string): string[][] {
  const rows: string[][] = [];
  let row: string[] = [];
  let cell = '';
  for (let at = 0; at < source.length; at += 1) {
    const sign = source.charAt(at);
    const end = sign === '"' && cell.trim() === '' ? closingQuote(source, at, separator) : -1;
    if (end > at) {
      cell = source
        .slice(at + 1, end)
        .replaceAll('""', '"')
        .replaceAll('\n', ' ');
      at = end;
    } else if (sign === separator || sign === '\n') {
      row.push(cell);
      cell = '';
      if (sign === '\n') {
        rows.push(row);
        row = [];
      }
    } else cell += sign;
  }
  rows.push([...row, cell]);
  return rows;
}

/** Where a quoted cell ends: at a quote before a separator or line end; -1 where the quote is only a sign. */
function closingQuote(source: string, from: number, separator: string): number {
  for (let at = source.indexOf('"', from + 1); at >= 0; at = source.indexOf('"', at + 1)) {
    const after = source.charAt(at + 1);
    if (after === '"') at += 1;
    else return after === '' || after === '\n' || after === separator ? at : -1;
  }
  return -1;
}

/** Cells as tab-separated text; cells that hold tabs, line ends or quotes are quoted. */
export function tabularText(rows: readonly (readonly string[])[]): string {
  const quote = (cell: string): string => (/[\t\n"]/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell);
  return rows.map((row) => row.map(quote).join('\t')).join('\n');
}
