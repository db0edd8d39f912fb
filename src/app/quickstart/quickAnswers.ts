import { createStore } from 'zustand';
import type { SiteAnswers } from '../../study/index.ts';

interface QuickAnswers {
  answers: SiteAnswers;
  /** The study they are meant for; another one begins with none. */
  documentId: string;
  /** Rises when the command asks for the form: its first field then takes the keyboard. */
  asked: number;
  /** What the site on the table assumes is listed beside the drawing. */
  listed: boolean;
}

/**
 * What was typed into the quick start, kept apart from the study: undoing the drawn site brings the form back
 * as it was.
 */
export const quickAnswers = createStore<QuickAnswers>(() => ({
  answers: {},
  documentId: '',
  asked: 0,
  listed: false,
}));

export function setAnswers(change: Partial<{ [K in keyof SiteAnswers]: SiteAnswers[K] | undefined }>): void {
  quickAnswers.setState(({ answers }) => {
    const entries = Object.entries({ ...answers, ...change }).filter(([, value]) => value !== undefined);
    return { answers: Object.fromEntries(entries) as SiteAnswers };
  });
}

/** Begins anew where the answers were given for another study. */
export function answerFor(documentId: string): void {
  quickAnswers.setState((state) => (state.documentId === documentId ? state : { answers: {}, documentId }));
}

export function listAssumptions(listed: boolean): void {
  quickAnswers.setState({ listed });
}
