import type { HarmonicRow } from '../types.ts';
import { minusSign } from './formatQuantity.ts';
import { type ParsedRows, parseRows } from './parseRows.ts';

/** Harmonic rows on one line, as a cell of a table holds them: "5: 38.2 % ∠174°, 7: 14 %". */
export function rowsLine(rows: readonly HarmonicRow[]): string {
  return rows
    .map(({ h, percent, angleDeg }) => {
      const angle = angleDeg === undefined ? '' : ` ∠${String(angleDeg).replace('-', minusSign)}°`;
      return `${h}: ${percent} %${angle}`;
    })
    .join(', ');
}

/** Rows from such a line; each starts with its order and a colon. An error is a sentence. */
export function parseRowsLine(text: string): ParsedRows {
  const rows = text
    .split(/[,;]?\s*(?=\b\d+\s*:)/)
    .map((row) => row.replace(/[,;]\s*$/, '').trim())
    .filter((row) => row !== '');
  const strange = rows.find((row) => !/^\d+\s*:/.test(row));
  if (strange !== undefined)
    return { ok: false, error: `"${strange}" is no order; write each as 5: 38.2 % ∠174°.` };
  const lines = rows.map((row) =>
    row
      .replace(':', '\t')
      .replace('∠', '\t')
      .replaceAll(/\s*\t\s*/g, '\t'),
  );
  return parseRows(lines.join('\n'));
}
