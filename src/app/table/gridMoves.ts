/** A cell by row and column, counted from 0; row -1 is the heads. */
export interface GridPlace {
  row: number;
  column: number;
}

/** A rectangle of cells, from the cell where it began to the one with the keyboard. */
export interface GridRange {
  anchor: GridPlace;
  focus: GridPlace;
}

export interface GridSize {
  rows: number;
  columns: number;
  /** Rows that are seen at once. */
  page: number;
}

const within = (value: number, least: number, most: number): number => Math.max(least, Math.min(value, most));

/** Where a key leads from a cell; null for a key that moves nothing. The heads are above the first row. */
export function movedBy(key: string, from: GridPlace, size: GridSize, far: boolean): GridPlace | null {
  const lastRow = size.rows - 1;
  const lastColumn = size.columns - 1;
  const place = (row: number, column: number): GridPlace => ({
    row: within(row, -1, Math.max(-1, lastRow)),
    column: within(column, 0, lastColumn),
  });
  switch (key) {
    case 'ArrowUp':
      return place(far ? 0 : from.row - 1, from.column);
    case 'ArrowDown':
      return place(far ? lastRow : from.row + 1, from.column);
    case 'ArrowLeft':
      return place(from.row, far ? 0 : from.column - 1);
    case 'ArrowRight':
      return place(from.row, far ? lastColumn : from.column + 1);
    case 'Home':
      return place(far ? 0 : from.row, 0);
    case 'End':
      return place(far ? lastRow : from.row, lastColumn);
    case 'PageUp':
      return place(Math.max(0, from.row - size.page), from.column);
    case 'PageDown':
      return place(from.row + size.page, from.column);
    default:
      return null;
  }
}

/** Along the row to the next cell, and on to the next row; null past either end of the table. */
export function tabbed(from: GridPlace, size: GridSize, back: boolean): GridPlace | null {
  const column = from.column + (back ? -1 : 1);
  if (column >= 0 && column < size.columns) return { row: from.row, column };
  const row = from.row + (back ? -1 : 1);
  if (row < 0 || row >= size.rows) return null;
  return { row, column: back ? size.columns - 1 : 0 };
}

export interface Box {
  top: number;
  bottom: number;
  left: number;
  right: number;
}

/** The rectangle a range covers; the heads are never part of one. */
export function boxOf({ anchor, focus }: GridRange): Box {
  return {
    top: Math.max(0, Math.min(anchor.row, focus.row)),
    bottom: Math.max(anchor.row, focus.row),
    left: Math.min(anchor.column, focus.column),
    right: Math.max(anchor.column, focus.column),
  };
}

export function inBox(box: Box, row: number, column: number): boolean {
  return row >= box.top && row <= box.bottom && column >= box.left && column <= box.right;
}
