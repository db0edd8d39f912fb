import type { Cell, Row, TableBlock } from '../document/model.ts';
import { SIGN_OF } from '../document/signs.ts';
import { type Ink, type PageMark, shifted, type Weight } from './marks.ts';
import { textWidth } from './measure.ts';
import { LEADING, TYPE } from './paper.ts';
import type { Slice } from './slice.ts';
import { halves, isNumeric, MARK_WIDTH, type PlacedColumn, placeColumns } from './tableColumns.ts';
import { baseline, paragraphSlices, textMark } from './textSlices.ts';
import { wrap } from './wrap.ts';

const SIZE = TYPE.table;
const LINE = SIZE * LEADING;
const PADDING = 1.9;
/** White space over the name of a group. */
const GROUP_GAP = 3;

function rule(y: number, width: number, stroke: number, ink: Ink): PageMark {
  return { kind: 'line', x1: 0, y1: y, x2: width, y2: y, width: stroke, ink };
}

/** Column heads with their units under them, repeated wherever the table goes on. */
function headSlice(columns: PlacedColumn[], width: number): Slice {
  const heads = columns.map(({ column, width: room }) => [
    ...wrap(column.head, room, SIZE),
    ...(column.unit === undefined ? [] : [column.unit]),
  ]);
  const lines = Math.max(1, ...heads.map((head) => head.length));
  const marks: PageMark[] = columns.flatMap((placed, k) => {
    const head = heads[k] ?? [];
    return head.map((line, index) => {
      const right = placed.column.align !== 'left';
      const x = right ? placed.x + placed.width - textWidth(line, SIZE) : placed.x;
      const y = (lines - head.length + index) * LINE + baseline(SIZE);
      return textMark(line, { size: SIZE, ink: 'quiet', x }, y);
    });
  });
  const height = lines * LINE + PADDING + 1;
  return { height, marks: [...marks, rule(height - 0.6, width, 0.9, 'ink')], glued: true };
}

interface CellLines {
  marks: PageMark[];
  lines: number;
}

function signMark(cell: Cell, x: number): PageMark[] {
  if (!cell.mark) return [];
  const ink: Ink = cell.mark === 'unknown' ? 'quiet' : cell.mark;
  const style = { size: SIZE, weight: 'semibold', ink, x } as const;
  return [textMark(SIGN_OF[cell.mark], style, PADDING + baseline(SIZE))];
}

/** Lines one under the other, the first of them on line `first` of the row. */
function linesAt(
  lines: string[],
  first: number,
  style: { weight?: Weight; ink?: Ink; x: number },
): PageMark[] {
  return lines.map((line, index) =>
    textMark(line, { size: SIZE, ...style }, PADDING + (first + index) * LINE + baseline(SIZE)),
  );
}

/** A wrapped cell: its text, then what follows it in lighter ink, on the same line where there is room. */
function leftCell(cell: Cell, placed: PlacedColumn): CellLines {
  const weight = cell.strong ? 'semibold' : 'regular';
  const x = placed.x + (cell.mark ? MARK_WIDTH : 0);
  const room = placed.width - (cell.mark ? MARK_WIDTH : 0) + 0.01;
  const lines = cell.text === '' ? [] : wrap(cell.text, room, SIZE, weight);
  const marks = [...signMark(cell, placed.x), ...linesAt(lines, 0, { weight, x })];
  if (cell.quiet === undefined || cell.quiet === '') return { marks, lines: lines.length };
  const after = textWidth(`${lines.at(-1) ?? ''} `, SIZE, weight);
  const beside = lines.length > 0 && after + textWidth(cell.quiet, SIZE) <= room;
  const quiet = beside ? [cell.quiet] : wrap(cell.quiet, room, SIZE);
  const first = beside ? lines.length - 1 : lines.length;
  marks.push(...linesAt(quiet, first, { ink: 'quiet', x: beside ? x + after : x }));
  return { marks, lines: first + quiet.length };
}

function numberCell(cell: Cell, placed: PlacedColumn): CellLines {
  const weight = cell.strong ? 'semibold' : 'regular';
  const right = placed.x + placed.width;
  const [whole] = halves(cell.text);
  const x =
    placed.column.align === 'decimal' && isNumeric(cell.text)
      ? right - placed.fraction - textWidth(whole, SIZE, weight)
      : right - textWidth(cell.text, SIZE, weight);
  return { marks: [...signMark(cell, x - MARK_WIDTH), ...linesAt([cell.text], 0, { weight, x })], lines: 1 };
}

function rowSlice(row: Row, columns: PlacedColumn[], width: number, repeat: Slice): Slice {
  if (row.kind === 'group') return groupSlice(row, width, repeat);
  const cells = columns.map((placed, k) => {
    const cell = row.cells[k] ?? { text: '' };
    return placed.column.align === 'left' ? leftCell(cell, placed) : numberCell(cell, placed);
  });
  const height = Math.max(1, ...cells.map((cell) => cell.lines)) * LINE + 2 * PADDING;
  const marks = cells
    .flatMap((cell) => cell.marks)
    .filter((mark) => mark.kind !== 'text' || mark.text !== '');
  return { height, marks: [...marks, rule(height, width, 0.4, 'hairline')], glued: false, repeat };
}

/** A group's name over the whole width, its aside beside it or, where it is too long, under it. */
function groupSlice(row: Extract<Row, { kind: 'group' }>, width: number, repeat: Slice): Slice {
  const lines = wrap(row.text, width, SIZE, 'semibold');
  const marks = linesAt(lines, 0, { weight: 'semibold', x: 0 });
  const aside = row.aside ?? '';
  const after = textWidth(lines.at(-1) ?? '', SIZE, 'semibold') + 8;
  const beside = after + textWidth(aside, SIZE) <= width;
  const under = beside ? [] : wrap(aside, width, SIZE);
  if (aside !== '' && beside) marks.push(...linesAt([aside], lines.length - 1, { ink: 'quiet', x: after }));
  marks.push(...linesAt(under, lines.length, { ink: 'quiet', x: 0 }));
  const height = (lines.length + under.length) * LINE + 2 * PADDING + GROUP_GAP;
  return {
    height,
    marks: [...marks.map((mark) => shifted(mark, 0, GROUP_GAP)), rule(height, width, 0.4, 'hairline')],
    glued: true,
    repeat,
  };
}

/** A group no higher than this, in points, stays on one page. */
const WHOLE_GROUP = 110;

/** Rows of each group: from after its name to the next. */
function keepGroupsWhole(table: TableBlock, rows: readonly Slice[]): void {
  let group: Slice[] = [];
  const close = (): void => {
    const height = group.reduce((sum, slice) => sum + slice.height, 0);
    if (height <= WHOLE_GROUP) for (const slice of group.slice(0, -1)) slice.glued = true;
  };
  rows.forEach((slice, index) => {
    if (table.rows[index]?.kind === 'group') {
      close();
      group = [];
    }
    if (group.length > 0 || table.rows[index]?.kind === 'group') group.push(slice);
  });
  close();
}

/** A table cut into rows: never a head without two rows, a group's name without a row, a last row alone. */
export function tableSlices(table: TableBlock, width: number): Slice[] {
  const columns = placeColumns(table, width);
  const head = headSlice(columns, width);
  const rows = table.rows.map((row) => rowSlice(row, columns, width, head));
  keepGroupsWhole(table, rows);
  rows.forEach((slice, index) => {
    if (rows.length > 1 && (index === 0 || index === rows.length - 2)) slice.glued = true;
  });
  const last = rows.at(-1);
  const notes = table.notes.flatMap((note) => paragraphSlices(note, width, true));
  if (last) last.glued = notes.length > 0;
  return [{ ...head, gap: 5 }, ...rows, ...notes];
}
