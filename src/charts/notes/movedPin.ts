import type { Pin } from '../../study/index.ts';

/** The pins with the one at `from` moved up (negative) or down by a number of places; null beyond an end. */
export function movedPin(pins: readonly Pin[], from: number, by: number): Pin[] | null {
  const to = from + by;
  const pin = pins[from];
  if (!pin || to < 0 || to >= pins.length) return null;
  const rest = pins.filter((_, i) => i !== from);
  return [...rest.slice(0, to), pin, ...rest.slice(to)];
}
