/**
 * How many places a note moves when dropped at `y`: counted over the middles (ascending) of the other notes it
 * has passed, negative upwards.
 */
export function dropPlace(middles: readonly number[], from: number, y: number): number {
  const above = middles.slice(0, from).filter((middle) => y < middle).length;
  if (above > 0) return -above;
  return middles.slice(from + 1).filter((middle) => y > middle).length;
}
