import { type RefObject, useCallback, useLayoutEffect, useRef, useState } from 'react';
import type { GridPlace, GridRange, GridSize } from './gridMoves.ts';

const start: GridPlace = { row: 0, column: 0 };

export interface RangeControl {
  range: GridRange;
  /** Goes to a cell and takes the keyboard there, alone or marking up to it. */
  go(place: GridPlace, marking: boolean): void;
  mark(range: GridRange): void;
  /** Takes the keyboard back to the cell, after a cell was written in. */
  hold(): void;
}

/**
 * The marked cells of a table and the one with the keyboard, which follows it into view. Whenever `first` is
 * another object its cell takes the keyboard; at the beginning only where the table does not wait.
 */
export function useGridRange(
  grid: RefObject<HTMLElement | null>,
  size: GridSize,
  first: GridPlace,
  waits: boolean,
): RangeControl {
  const [wished, setWished] = useState<GridRange>({ anchor: first, focus: first });
  const waiting = useRef(waits);
  const wanted = useRef(false);
  const inside = ({ row, column }: GridPlace): GridPlace => ({
    row: Math.min(row, size.rows - 1),
    column: Math.min(column, size.columns - 1),
  });
  const range = { anchor: inside(wished.anchor), focus: inside(wished.focus) };
  const { row, column } = range.focus;
  useLayoutEffect(() => {
    if (!wanted.current) return;
    const cell = grid.current?.querySelector<HTMLElement>(`[data-cell="${row} ${column}"]`);
    if (!cell) return;
    wanted.current = false;
    cell.focus({ preventScroll: true });
    cell.scrollIntoView({ block: 'nearest', inline: 'nearest' });
  });
  const mark = useCallback((next: GridRange) => {
    wanted.current = true;
    setWished({ ...next });
  }, []);
  const go = useCallback((place: GridPlace, marking: boolean) => {
    wanted.current = true;
    setWished((before) => ({ anchor: marking ? before.anchor : place, focus: place }));
  }, []);
  const hold = useCallback(() => {
    wanted.current = true;
    setWished((before) => ({ ...before }));
  }, []);
  // Before the next key: what is typed right after a new row belongs into it.
  useLayoutEffect(() => {
    if (!waiting.current) go(first, false);
    waiting.current = false;
  }, [first, go]);
  return { range: size.rows === 0 ? { anchor: start, focus: start } : range, go, mark, hold };
}
