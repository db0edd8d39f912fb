import type { HarmonicRow } from '../types.ts';
import { parseQuantity } from './parseQuantity.ts';

export type ParsedRows = { ok: true; rows: HarmonicRow[] } | { ok: false; error: string };

/**
 * Harmonic rows pasted from a table: one row a line, order, per cent and, where known, degrees, parted by
 * tabs, semicolons or spaces. A head line without digits is skipped. An error names the line.
 */
export function parseRows(text: string): ParsedRows {
  const rows: HarmonicRow[] = [];
  const lines = text.split(/\r?\n/).map((line) => line.trim());
  for (const [index, line] of lines.entries()) {
    if (line === '' || !/\d/.test(line)) continue;
    const cells = line.split(/[\t;]+|\s+/).filter((cell) => cell !== '' && cell !== '%' && cell !== '°');
    const [order, percent, angle] = cells;
    const h = Number((order ?? '').replace(/^h\s*=?/i, ''));
    if (!Number.isInteger(h) || h < 1)
      return { ok: false, error: `Line ${index + 1}: "${order}" is no whole order.` };
    if (rows.some((row) => row.h === h))
      return { ok: false, error: `Line ${index + 1}: order ${h} stands there twice.` };
    const magnitude = parseQuantity(percent ?? '', '%');
    if (!magnitude.ok || magnitude.value < 0)
      return { ok: false, error: `Line ${index + 1}: "${percent ?? ''}" is no percentage from 0 up.` };
    const turned = angle === undefined || angle === '-' ? undefined : parseQuantity(angle, '°');
    if (turned && !turned.ok) return { ok: false, error: `Line ${index + 1}: "${angle}" is no angle.` };
    rows.push({ h, percent: magnitude.value, ...(turned?.ok ? { angleDeg: turned.value } : {}) });
  }
  if (rows.length === 0)
    return { ok: false, error: 'No rows were found; each needs an order and a percentage.' };
  return { ok: true, rows };
}
