import type { Pin } from '../../study/types.ts';

/** The pins with the one at `from` moved one place up (−1) or down (+1); null at an end. */
export function movedPin(pins: readonly Pin[], from: number, by: 1 | -1): Pin[] | null {
  const to = from + by;
  const pin = pins[from];
  if (!pin || to < 0 || to >= pins.length) return null;
  const rest = pins.filter((_, i) => i !== from);
  return [...rest.slice(0, to), pin, ...rest.slice(to)];
}
