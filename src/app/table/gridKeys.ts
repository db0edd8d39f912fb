import type { KeyboardEvent } from 'react';
import type { DataOrigin } from '../../study/index.ts';
import {
  type Box,
  boxOf,
  type GridPlace,
  type GridRange,
  type GridSize,
  movedBy,
  tabbed,
} from './gridMoves.ts';

/** What the keys of a table do; every one acts on the cell with the keyboard, or on the cells marked. */
export interface GridActions {
  size: GridSize;
  range: GridRange;
  /** Goes to a cell, alone or marking up to it. */
  go(place: GridPlace, marking: boolean): void;
  /** Enter goes back to the column where a run of Tabs began. */
  runStart: number | null;
  setRunStart(column: number | null): void;
  mark(range: GridRange): void;
  sort(column: number): void;
  /** Opens a cell, or writes over it from a letter. */
  write(place: GridPlace, letter: string | null): void;
  /** Turns yes to no; false where the cell is no such choice. */
  toggle(place: GridPlace): boolean;
  clear(box: Box): void;
  fillDown(box: Box): void;
  setOrigin(box: Box, word: DataOrigin['origin'] | null): void;
  /** Shows the row on the drawing, with its data open. */
  open(row: number): void;
  remove(box: Box): void;
  add(): void;
  /** Below the last row. */
  pastEnd(): void;
  leave(): void;
}

const originKeys: Readonly<Record<string, DataOrigin['origin'] | null>> = {
  KeyN: 'nameplate',
  KeyM: 'measured',
  KeyT: 'typical',
  KeyA: 'assumed',
  Digit0: null,
};

/** Every key of the table, as the key map lists them. */
export const tableKeys: readonly (readonly [string, string])[] = [
  ['←  →  ↑  ↓', 'move; with Ctrl to the edge, with Shift marking cells'],
  ['F2', 'write in the cell; typing writes over it'],
  ['Enter', 'take it and go down; with Shift up'],
  ['Tab', 'take it and go right; with Shift left'],
  ['Escape', 'put the old value back; else to the tools, then to the drawing'],
  ['Delete', 'back to the default'],
  ['Mod+C', 'copy the marked cells'],
  ['Mod+V', 'paste a value, or a table with a preview'],
  ['Mod+D', 'fill down from the first marked row'],
  ['Alt+N  M  T  A', 'origin: nameplate, measured, typical, assumed; 0 for none'],
  ['Insert', 'a new row'],
  ['Shift+Delete', 'remove the marked rows'],
  ['Mod+Enter', 'show the part on the drawing with its data'],
];

/** Whether the key meant something in the table; it then goes no further. */
export function gridKey(event: KeyboardEvent, actions: GridActions): boolean {
  const { range, size } = actions;
  const at = range.focus;
  const mod = event.ctrlKey || event.metaKey;
  if (event.altKey) return originKey(event, actions);
  const moved = movedBy(event.key, at, size, mod);
  if (moved) return move(event, actions, moved);
  if (at.row < 0) return headKey(event, actions);
  if (mod) return chord(event, actions);
  switch (event.key) {
    case 'Enter':
      return enter(event.shiftKey, actions);
    case 'Tab':
      return tab(event.shiftKey, actions);
    case 'F2':
      actions.write(at, null);
      return true;
    case 'Delete':
    case 'Backspace':
      if (event.shiftKey) actions.remove(boxOf(range));
      else actions.clear(boxOf(range));
      return true;
    case 'Insert':
      actions.add();
      return true;
    case 'Escape':
      actions.leave();
      return true;
    case ' ':
      return actions.toggle(at);
    default:
      if (event.key.length !== 1) return false;
      actions.write(at, event.key);
      return true;
  }
}

function move(event: KeyboardEvent, actions: GridActions, moved: GridPlace): true {
  const { range, size } = actions;
  actions.setRunStart(null);
  const stuck = event.key === 'ArrowDown' && !event.shiftKey && range.focus.row === size.rows - 1;
  if (stuck) actions.pastEnd();
  else actions.go(moved, event.shiftKey && moved.row >= 0);
  return true;
}

function headKey(event: KeyboardEvent, actions: GridActions): boolean {
  const { column } = actions.range.focus;
  if (event.key === 'Enter' || event.key === ' ') actions.sort(column);
  else if (event.key === 'Escape') actions.leave();
  else return false;
  return true;
}

function chord(event: KeyboardEvent, actions: GridActions): boolean {
  const { range, size } = actions;
  switch (event.key.toLowerCase()) {
    case 'a':
      actions.mark({
        anchor: { row: 0, column: 0 },
        focus: { row: size.rows - 1, column: size.columns - 1 },
      });
      return true;
    case 'd':
      actions.fillDown(boxOf(range));
      return true;
    case 'enter':
      actions.open(range.focus.row);
      return true;
    default:
      return false;
  }
}

function originKey(event: KeyboardEvent, actions: GridActions): boolean {
  if (!Object.hasOwn(originKeys, event.code) || actions.range.focus.row < 0) return false;
  actions.setOrigin(boxOf(actions.range), originKeys[event.code] ?? null);
  return true;
}

/** Down, to the column where the row was begun. */
export function enter(back: boolean, { range, size, runStart, ...actions }: GridActions): true {
  const { row, column } = range.focus;
  if (!back && row === size.rows - 1) actions.pastEnd();
  else actions.go({ row: Math.max(0, row + (back ? -1 : 1)), column: runStart ?? column }, false);
  actions.setRunStart(null);
  return true;
}

/** Right, to the next row after the last column; past the last cell the Tab leaves the table. */
export function tab(back: boolean, { range, size, runStart, ...actions }: GridActions): boolean {
  const next = tabbed(range.focus, size, back);
  if (!next) return false;
  if (runStart === null && !back) actions.setRunStart(range.focus.column);
  actions.go(next, false);
  return true;
}
