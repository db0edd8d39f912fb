import type { KeyboardEvent, RefObject } from 'react';
import { actionForKey, type NoteActions } from './noteActions.ts';
import { moveInColumn } from './noteKeys.ts';
import type { NoteSubject } from './noteLetters.ts';

/** What any note may report to the column; stable, so that notes need not draw anew. */
export interface ColumnHandlers {
  hover(key: string, subject: NoteSubject, hovered: boolean): void;
  focus(key: string, subject: NoteSubject): void;
  toggle(key: string): void;
  menu(key: string, anchor: HTMLElement): void;
  /** Keys on a note's title: they walk the column, or do what the note's menu offers. */
  press(key: string, event: KeyboardEvent<HTMLElement>): void;
}

export interface ColumnState {
  keys: readonly string[];
  actionsOf(key: string): NoteActions;
  toggle(key: string): void;
  openMenu(key: string, anchor: HTMLElement): void;
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
    menu: (key, anchor) => state.current.openMenu(key, anchor),
    press: (key, event) => {
      const action = actionForKey(state.current.actionsOf(key), event);
      const walk = !event.altKey && !event.ctrlKey && !event.metaKey;
      if (action) action.run?.();
      else if (
        !walk ||
        !moveInColumn(event.key, state.current.keys, key, (next) => focusNote(column.current, next))
      )
        return;
      event.preventDefault();
    },
  };
}

export function focusNote(column: HTMLElement | null, key: string): void {
  const note = column?.querySelector(`[data-note="${CSS.escape(key)}"] .note-title`);
  if (note instanceof HTMLElement) note.focus();
}
