import type { FieldType, TableColumn } from '../../study/index.ts';

/** Widths in px that hold the usual values of a type. */
const usual: Partial<Record<FieldType, number>> = {
  number: 92,
  integer: 80,
  boolean: 72,
  choice: 132,
  busRef: 132,
  vectorGroup: 88,
  text: 132,
  steps: 150,
  spectrum: 196,
  rows: 196,
  skin: 110,
  tolerance: 110,
};

const nameWidth = 168;
const letter = 6.4;
const edges = 18;

/** Width of a column in px: its usual values, and its head in two lines with no word broken. */
export function columnWidth({ key, label, field }: TableColumn): number {
  if (key === 'name') return nameWidth;
  const longestWord = Math.max(...label.split(/[\s-]/).map((word) => word.length));
  const head = Math.max(longestWord, Math.ceil(label.length / 2) + 2) * letter + edges;
  return Math.round(Math.max(usual[field.type] ?? 100, Math.min(head, 150)));
}
