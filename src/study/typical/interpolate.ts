/**
 * Linear interpolation in a column of a table whose first column rises: y = y0 + (y1 − y0)·(x − x0)/(x1 − x0);
 * on a row its value itself. Throws RangeError outside the table: callers tell the user its range first.
 */
export function interpolate(table: readonly (readonly number[])[], column: number, x: number): number {
  const above = table.findIndex((row) => (row[0] ?? 0) >= x);
  const upper = table[above];
  const lower = table[above - 1];
  const [x1 = 0] = upper ?? [];
  const y1 = upper?.[column];
  if (y1 !== undefined && x1 === x) return y1;
  const y0 = lower?.[column];
  const [x0 = 0] = lower ?? [];
  if (y0 === undefined || y1 === undefined)
    throw new RangeError(`${x} is outside the table; allowed is ${rangeOf(table).join(' to ')}`);
  return y0 + ((y1 - y0) * (x - x0)) / (x1 - x0);
}

/** First and last entry of a table's first column. */
export function rangeOf(table: readonly (readonly number[])[]): [number, number] {
  return [table[0]?.[0] ?? Number.NaN, table.at(-1)?.[0] ?? Number.NaN];
}

/** Whether a value lies within a table; not a number lies nowhere. */
export function isWithin(table: readonly (readonly number[])[], x: number): boolean {
  const [low, high] = rangeOf(table);
  return x >= low && x <= high;
}
