import type { VerdictWord } from '../../checks/index.ts';

/** The sign of each verdict; the word always stands near it. */
export const SIGN_OF: Record<VerdictWord, string> = { pass: '✓', watch: '!', fail: '✕', unknown: '?' };
