import type { KeyboardEvent, RefObject } from 'react';
import { moveInColumn } from './noteKeys.ts';
import type { NoteSubject } from './noteLetters.ts';

/** What any note may report to the column; stable, so that notes need not draw anew. */
export interface ColumnHandlers {
  hover(key: string, subject: NoteSubject, hovered: boolean): void;
  focus(key: string, subject: NoteSubject): void;
  toggle(key: string): void;
  /** Handles the keys that walk the column; returns whether it did. */
  walk(key: string, event: KeyboardEvent<HTMLElement>): boolean;
}

export interface ColumnState {
  keys: readonly string[];
  toggle(key: string): void;
  setFocused(key: string): void;
  onSubject: ((subject: NoteSubject | null, noteKey: string | null) => void) | undefined;
}

/** Handlers over the column's latest state. */
export function columnHandlers(
  state: RefObject<ColumnState>,
  column: RefObject<HTMLElement | null>,
): ColumnHandlers {
  return {
    hover: (key, subject, hovered) =>
      state.current.onSubject?.(hovered ? subject : null, hovered ? key : null),
    focus: (key, subject) => {
      state.current.setFocused(key);
      state.current.onSubject?.(subject, key);
    },
    toggle: (key) => state.current.toggle(key),
    walk: (key, event) => {
      const moved = moveInColumn(event.key, state.current.keys, key, (next) =>
        focusNote(column.current, next),
      );
      if (moved) event.preventDefault();
      return moved;
    },
  };
}

function focusNote(column: HTMLElement | null, key: string): void {
  const note = column?.querySelector(`[data-note="${CSS.escape(key)}"] .note-title`);
  if (note instanceof HTMLElement) note.focus();
}
