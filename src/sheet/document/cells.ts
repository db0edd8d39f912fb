import type { Cell, Row } from './model.ts';

export const cell = (text: string, quiet?: string): Cell =>
  quiet === undefined ? { text } : { text, quiet };

export const cells = (...list: (Cell | string)[]): Row => ({
  kind: 'cells',
  cells: list.map((item) => (typeof item === 'string' ? { text: item } : item)),
});

/** Printed where there is no number; the reason stands beside or under the table. */
export const NONE = '–';
