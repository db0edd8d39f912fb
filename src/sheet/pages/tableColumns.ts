import type { Cell, Column, TableBlock } from '../document/model.ts';
import { textWidth } from './measure.ts';
import { TYPE } from './paper.ts';

/** Space between two columns. */
export const GUTTER = 9;
/** Room for a verdict's sign before the text of its cell. */
export const MARK_WIDTH = 10;

/** A column's place, and for decimal columns the widths left and right of the decimal point. */
export interface PlacedColumn {
  column: Column;
  x: number;
  width: number;
  whole: number;
  fraction: number;
}

interface Need {
  least: number;
  natural: number;
  whole: number;
  fraction: number;
}

const SIZE = TYPE.table;
/** A head up to this width is not broken where there is room. */
const HEAD_ROOM = 58;

/** Both halves of a number; text without digits counts as whole. */
export function halves(text: string): [whole: string, fraction: string] {
  const point = /\d\.\d/.test(text) ? text.indexOf('.') : -1;
  return point < 0 ? [text, ''] : [text.slice(0, point), text.slice(point)];
}

export const isNumeric = (text: string): boolean => /^[+−±≤≥<>~≈ ]*\d/.test(text);

const weightOf = (cell: Cell): 'regular' | 'semibold' => (cell.strong ? 'semibold' : 'regular');

/** Whole width of a cell set on one line. */
export function cellWidth(cell: Cell): number {
  const quiet = cell.quiet === undefined ? 0 : textWidth(` ${cell.quiet}`, SIZE);
  return textWidth(cell.text, SIZE, weightOf(cell)) + quiet + (cell.mark ? MARK_WIDTH : 0);
}

function longestWord(text: string): number {
  return Math.max(0, ...text.split(' ').map((word) => textWidth(word, SIZE)));
}

function needOf(column: Column, cells: Cell[]): Need {
  const head = Math.max(longestWord(column.head), textWidth(column.unit ?? '', SIZE));
  const easyHead = Math.max(head, Math.min(HEAD_ROOM, textWidth(column.head, SIZE)));
  const natural = Math.max(easyHead, ...cells.map((cell) => cellWidth(cell)));
  if (column.align === 'left') {
    const marked = cells.some((cell) => cell.mark) ? MARK_WIDTH : 0;
    const words = Math.max(0, ...cells.map((cell) => longestWord(`${cell.text} ${cell.quiet ?? ''}`)));
    return { least: Math.max(head, words + marked), natural, whole: 0, fraction: 0 };
  }
  const numbers = column.align === 'decimal' ? cells.filter((cell) => isNumeric(cell.text)) : [];
  const parts = numbers.map((cell) => halves(cell.text).map((part) => textWidth(part, SIZE, weightOf(cell))));
  const whole = Math.max(0, ...parts.map(([left = 0]) => left));
  const fraction = Math.max(0, ...parts.map(([, right = 0]) => right));
  const marked = cells.some((cell) => cell.mark) ? MARK_WIDTH : 0;
  const figures = Math.max(...cells.map((cell) => cellWidth(cell)), whole + fraction + marked);
  return { least: Math.max(head, figures), natural: Math.max(easyHead, figures), whole, fraction };
}

/**
 * Shares out the width: to each what it needs, then more to all alike until each has its natural width, so
 * that short columns stop wrapping before long ones; what is left by `grow`, evenly without one.
 */
function shareOut(columns: Column[], needs: Need[], available: number): number[] {
  const least = needs.reduce((sum, need) => sum + need.least, 0);
  if (least > available) return squeezed(columns, needs, least - available);
  const widths = needs.map((need) => need.least);
  let rest = available - least;
  for (;;) {
    const wanting = needs.flatMap((need, k) => {
      const lack = need.natural - (widths[k] ?? 0);
      return lack > 0.01 ? [{ k, lack }] : [];
    });
    if (wanting.length === 0 || rest <= 0.01) break;
    const more = Math.min(rest / wanting.length, ...wanting.map(({ lack }) => lack));
    for (const { k } of wanting) widths[k] = (widths[k] ?? 0) + more;
    rest -= more * wanting.length;
  }
  const grow = columns.map((column) => column.grow ?? 0);
  const total = grow.reduce((sum, share) => sum + share, 0);
  return widths.map(
    (width, k) => width + (total === 0 ? rest / columns.length : (rest * (grow[k] ?? 0)) / total),
  );
}

/** Text columns give way in proportion; their words are then cut. Numbers never are. */
function squeezed(columns: Column[], needs: Need[], excess: number): number[] {
  const give = columns.map((column, k) => (column.align === 'left' ? (needs[k]?.least ?? 0) : 0));
  const total = give.reduce((sum, width) => sum + width, 0);
  return needs.map((need, k) => need.least - (total === 0 ? 0 : (excess * (give[k] ?? 0)) / total));
}

/** Where each column of a table stands on a page of this width. */
export function placeColumns(table: TableBlock, width: number): PlacedColumn[] {
  const cellsOf = (k: number): Cell[] =>
    table.rows.flatMap((row) => {
      const cell = row.kind === 'cells' ? row.cells[k] : undefined;
      return cell ? [cell] : [];
    });
  const needs = table.columns.map((column, k) => needOf(column, cellsOf(k)));
  const widths = shareOut(table.columns, needs, width - GUTTER * (table.columns.length - 1));
  let x = 0;
  return table.columns.map((column, k) => {
    const placed = {
      column,
      x,
      width: widths[k] ?? 0,
      whole: needs[k]?.whole ?? 0,
      fraction: needs[k]?.fraction ?? 0,
    };
    x += placed.width + GUTTER;
    return placed;
  });
}
