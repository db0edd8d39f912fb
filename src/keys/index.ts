export type { KeyRow, KeyTable } from './KeyTable.ts';
export { type KeyPress, matchesKeys } from './matchesKeys.ts';
export { shownKeys } from './shownKeys.ts';
