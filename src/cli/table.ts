export interface Column {
  head: string;
  /** Numbers go to the right. */
  align: 'left' | 'right';
  /** Longer text is cut with an ellipsis. */
  most?: number;
}

/** Lines of an aligned table, heads first, indented by two. */
export function tableLines(columns: readonly Column[], rows: readonly (readonly string[])[]): string[] {
  const cut = (text: string, most = 100): string =>
    text.length > most ? `${text.slice(0, most - 1)}…` : text;
  const cells = rows.map((row) => columns.map((column, i) => cut(row[i] ?? '', column.most)));
  const widths = columns.map(({ head }, i) =>
    Math.max(head.length, ...cells.map((row) => row[i]?.length ?? 0)),
  );
  const line = (row: readonly string[]): string => {
    const padded = columns.map(({ align }, i) =>
      align === 'left' ? (row[i] ?? '').padEnd(widths[i] ?? 0) : (row[i] ?? '').padStart(widths[i] ?? 0),
    );
    return `  ${padded.join('  ')}`.trimEnd();
  };
  return [line(columns.map(({ head }) => head)), ...cells.map(line)];
}

/** A number with fixed decimals; "–" where there is none, and no minus before a rounded zero. */
export function fixed(value: number | null | undefined, decimals: number): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return '–';
  const text = value.toFixed(decimals);
  return Number(text) === 0 ? (0).toFixed(decimals) : text;
}

/** A number with so many significant digits, never in powers of ten within 1e-3…1e6. */
export function significant(value: number | null, digits: number): string {
  if (value === null || !Number.isFinite(value)) return '–';
  if (value === 0) return '0';
  const decimals = digits - 1 - Math.floor(Math.log10(Math.abs(value)));
  const plain = Math.abs(value) >= 1e-3 && Math.abs(value) < 1e6;
  return plain ? value.toFixed(Math.min(Math.max(decimals, 0), 6)) : value.toExponential(digits - 1);
}

/** Text broken at spaces into lines of a width, the first and the following ones indented. */
export function wrapped(text: string, width: number, first: string, next: string): string[] {
  const lines: string[] = [];
  let line = first;
  let empty = true;
  for (const word of text.trim().split(/\s+/)) {
    if (!empty && line.length + 1 + word.length > width) {
      lines.push(line);
      line = next;
      empty = true;
    }
    line += empty ? word : ` ${word}`;
    empty = false;
  }
  return [...lines, line];
}
