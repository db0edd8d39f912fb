import type { HarmonicRow } from '../types.ts';
import { formatNumber } from './formatQuantity.ts';
import { parseQuantity } from './parseQuantity.ts';

export type ParsedRows =
  | {
      ok: true;
      rows: HarmonicRow[];
      /** What is not plain from the rows themselves, as a sentence; '' for nothing. */
      said: string;
    }
  | { ok: false; error: string };

class Refusal extends Error {}

/**
 * Harmonic rows pasted from a sheet or a report: one row a line, order, per cent and, where known, degrees,
 * parted by tabs, semicolons or spaces. Head lines before the first row are skipped, nothing after it is.
 * Where order 1 is not 100 the column holds amperes, and the rows are brought to per cent of it. An error
 * names the line.
 */
export function parseRows(text: string): ParsedRows {
  const rows: HarmonicRow[] = [];
  try {
    for (const [index, line] of text.split(/\r?\n/).entries()) {
      const cells = cellsOf(line);
      if (cells.length === 0 || (rows.length === 0 && isHead(cells))) continue;
      rows.push(rowOf(cells, rows, `Line ${index + 1}: `));
    }
  } catch (refusal) {
    if (!(refusal instanceof Refusal)) throw refusal;
    return { ok: false, error: refusal.message };
  }
  if (rows.length === 0)
    return { ok: false, error: 'No rows were found; each needs an order and a percentage.' };
  return ofFundamental(rows);
}

/** Cells of a line without their units; tabs and semicolons part cells that hold spaces. */
function cellsOf(line: string): string[] {
  const parted = /[\t;]/.test(line) ? line.split(/[\t;]/) : line.split(/\s+/);
  const cells = parted.map((cell) => cell.trim()).filter((cell) => cell !== '%' && cell !== '°');
  while (cells.at(-1) === '') cells.pop();
  return cells.every((cell) => cell === '') ? [] : cells;
}

/** Words above the rows, and their units: no order, and no number beside it. */
function isHead(cells: readonly string[]): boolean {
  return !/\d/.test(cells[0] ?? '') && !cells.some((cell) => /^[-+−]?[.,]?\d/.test(cell));
}

function rowOf(cells: readonly string[], rows: readonly HarmonicRow[], where: string): HarmonicRow {
  const [order = '', percent = '', angle = '', more] = cells;
  if (more !== undefined)
    throw new Refusal(
      `${where}${cells.length} columns stand there; copy order, per cent and, where known, angle alone.`,
    );
  const h = Number(order.replace(/^h\s*=?\s*/i, ''));
  if (order === '' || !Number.isInteger(h) || h < 1)
    throw new Refusal(`${where}"${order}" is no whole order.`);
  if (rows.some((row) => row.h === h)) throw new Refusal(`${where}order ${h} stands there twice.`);
  const magnitude = parseQuantity(percent, '%');
  if (!magnitude.ok || magnitude.value < 0)
    throw new Refusal(`${where}"${percent}" is no percentage from 0 up.`);
  if (angle === '' || /^[-–—]$/.test(angle)) return { h, percent: magnitude.value };
  const turned = parseQuantity(angle, '°');
  if (!turned.ok) throw new Refusal(`${where}"${angle}" is no angle.`);
  return { h, percent: magnitude.value, angleDeg: turned.value };
}

/** Rows in per cent of the fundamental: order 1 tells what the column counts, and is no harmonic itself. */
function ofFundamental(rows: HarmonicRow[]): ParsedRows {
  const base = rows.find((row) => row.h === 1)?.percent;
  const harmonics = rows.filter((row) => row.h !== 1);
  if (base === undefined) return { ok: true, rows, said: '' };
  if (base <= 0 || harmonics.length === 0)
    return {
      ok: false,
      error: 'Order 1 is the fundamental; rows of higher orders and a value above 0 are needed.',
    };
  if (base === 100)
    return { ok: true, rows: harmonics, said: 'Order 1 is the fundamental, 100 %, and is left out.' };
  const scaled = harmonics.map((row) => ({
    ...row,
    percent: Number(((100 * row.percent) / base).toPrecision(6)),
  }));
  return {
    ok: true,
    rows: scaled,
    said: `Order 1 is ${formatNumber(base)}, so the rows are taken as amperes and brought to per cent of it.`,
  };
}
