/**
 * Roles of a table drawn a few rows at a time: rows that are not drawn are counted, and the elements lie where
 * they are scrolled to, which table elements do not.
 */
export const gridRoles = {
  grid: (label: string, rows: number, columns: number) =>
    ({
      role: 'grid',
      'aria-label': label,
      'aria-rowcount': rows + 1,
      'aria-colcount': columns,
      'aria-multiselectable': true,
    }) as const,
  group: { role: 'rowgroup' } as const,
  /** Counted from 1, the heads first. */
  row: (index: number) => ({ role: 'row', 'aria-rowindex': index }) as const,
  head: (column: number, sort: 'ascending' | 'descending' | 'none') =>
    ({ role: 'columnheader', 'aria-colindex': column + 1, 'aria-sort': sort }) as const,
  cell: (column: number, names: boolean, marked: boolean) =>
    ({
      role: names ? 'rowheader' : 'gridcell',
      'aria-colindex': column + 1,
      'aria-selected': marked,
    }) as const,
};
