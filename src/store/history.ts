import type { Study } from '../study/index.ts';

/** A study as it stood before (past) or after (future) the edit the words name. */
export interface Revision {
  study: Study;
  label: string;
  words: string;
}

/**
 * Undo and redo as a value around the study: the study itself knows nothing of it.
 * `past` ends with the latest edit, `future` ends with the edit redone first. Unlimited within a session.
 */
export interface History {
  past: readonly Revision[];
  future: readonly Revision[];
}

export const noHistory: History = { past: [], future: [] };

/** The history after an edit of `before`; what could be redone is gone. */
export function record(history: History, before: Study, label: string, words: string): History {
  return { past: [...history.past, { study: before, label, words }], future: [] };
}

/** The study and history one step back; null where there is nothing to undo. */
export function stepBack(history: History, now: Study): { study: Study; history: History } | null {
  const last = history.past.at(-1);
  if (!last) return null;
  return {
    study: last.study,
    history: { past: history.past.slice(0, -1), future: [...history.future, { ...last, study: now }] },
  };
}

/** The study and history one step forward again; null where nothing was undone. */
export function stepForward(history: History, now: Study): { study: Study; history: History } | null {
  const next = history.future.at(-1);
  if (!next) return null;
  return {
    study: next.study,
    history: { past: [...history.past, { ...next, study: now }], future: history.future.slice(0, -1) },
  };
}

/** The last steps of a history, for keeping across sessions. */
export function tailOf(history: History, steps: number): History {
  return { past: history.past.slice(-steps), future: history.future.slice(-steps) };
}
