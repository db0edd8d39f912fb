import type { Resonance } from '../types.ts';
import { crossing } from './crossing.ts';
import { minimum } from './minimum.ts';

/** |Z| over order on a scan's points, and at any order between. */
export interface ImpedanceCurve {
  orders: Float64Array;
  magnitudes: Float64Array;
  magnitude: (h: number) => number;
}

/**
 * Parallel (maxima) and series (minima) resonances of |Z|: a point beyond both neighbours, equal to the
 * right one allowed, refined between them to |Δh| < 1e-6. Q = h0/(h2 − h1) from |Z|max/√2 or |Z|min·√2 on
 * either side; null where the range ends first, or |Z| passes the extremum's own value again before.
 */
export function findResonances(curve: ImpedanceCurve): Resonance[] {
  const { orders, magnitudes: z, magnitude } = curve;
  const found: Resonance[] = [];
  for (let i = 1; i + 1 < orders.length; i++) {
    const peak = z[i]! > z[i - 1]! && z[i]! >= z[i + 1]!;
    const dip = z[i]! < z[i - 1]! && z[i]! <= z[i + 1]!;
    if (!peak && !dip) continue;
    const sign = peak ? -1 : 1;
    const order = minimum((h) => sign * magnitude(h), orders[i - 1]!, orders[i + 1]!, orders[i]!);
    const ohm = magnitude(order);
    const q = qualityOf(curve, order, ohm, peak);
    found.push({ order, kind: peak ? 'parallel' : 'series', ohm, q });
  }
  return found;
}

function qualityOf(curve: ImpedanceCurve, order: number, ohm: number, peak: boolean): number | null {
  const below = halfPower(curve, order, ohm, peak, -1);
  const above = halfPower(curve, order, ohm, peak, 1);
  return below === null || above === null ? null : order / (above - below);
}

/** Order at which |Z| first reaches the half-power value on one side, walking the scan's points. */
function halfPower(
  curve: ImpedanceCurve,
  order: number,
  ohm: number,
  peak: boolean,
  side: -1 | 1,
): number | null {
  const { orders, magnitudes, magnitude } = curve;
  const level = peak ? ohm / Math.SQRT2 : ohm * Math.SQRT2;
  let inner = order;
  let innerGap = ohm - level;
  for (let j = firstBeyond(orders, order, side); j >= 0 && j < orders.length; j += side) {
    const z = magnitudes[j]!;
    if (peak ? z <= level : z >= level)
      return crossing((h) => magnitude(h) - level, inner, innerGap, orders[j]!, z - level);
    if (peak ? z > ohm : z < ohm) return null;
    inner = orders[j]!;
    innerGap = z - level;
  }
  return null;
}

function firstBeyond(orders: Float64Array, order: number, side: -1 | 1): number {
  if (side > 0)
    return orders.findIndex((h) => h > order) === -1 ? orders.length : orders.findIndex((h) => h > order);
  let j = orders.length - 1;
  while (j >= 0 && orders[j]! >= order) j -= 1;
  return j;
}
