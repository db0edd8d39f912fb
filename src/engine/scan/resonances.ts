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
  const extrema = refinedExtrema(curve);
  const walk = walkOf(curve, extrema);
  return extrema.map(({ order, ohm, peak }) => {
    const kind = peak ? 'parallel' : 'series';
    return { order, kind, ohm, q: qualityOf(curve, walk, { order, ohm, peak }) };
  });
}

interface Extremum {
  order: number;
  ohm: number;
  peak: boolean;
}

function refinedExtrema({ orders, magnitudes: z, magnitude }: ImpedanceCurve): Extremum[] {
  const found: Extremum[] = [];
  for (let i = 1; i + 1 < orders.length; i++) {
    const peak = z[i]! > z[i - 1]! && z[i]! >= z[i + 1]!;
    const dip = z[i]! < z[i - 1]! && z[i]! <= z[i + 1]!;
    if (!peak && !dip) continue;
    const sign = peak ? -1 : 1;
    const order = minimum((h) => sign * magnitude(h), orders[i - 1]!, orders[i + 1]!, orders[i]!);
    found.push({ order, ohm: magnitude(order), peak });
  }
  return found;
}

interface CurvePoint {
  h: number;
  z: number;
}

/** The scan's points and the refined extrema, rising in order: a narrow dip lies between two points. */
function walkOf({ orders, magnitudes }: ImpedanceCurve, extrema: readonly Extremum[]): CurvePoint[] {
  const points = Array.from(orders, (h, i) => ({ h, z: magnitudes[i]! }));
  return [...points, ...extrema.map(({ order, ohm }) => ({ h: order, z: ohm }))].sort((a, b) => a.h - b.h);
}

function qualityOf(curve: ImpedanceCurve, walk: readonly CurvePoint[], extremum: Extremum): number | null {
  const { order } = extremum;
  const below = halfPower(curve, walk.filter(({ h }) => h < order).reverse(), extremum);
  const above = halfPower(
    curve,
    walk.filter(({ h }) => h > order),
    extremum,
  );
  return below === null || above === null ? null : order / (above - below);
}

/** Beside an extremum, intervals wider than this in order are looked at in parts. */
const widestStep = 0.05;
const fineIntervals = 3;
const mostParts = 8;

/** Order at which |Z| first reaches the half-power value, walking away from the extremum. */
function halfPower(
  { magnitude }: ImpedanceCurve,
  outward: readonly CurvePoint[],
  { order, ohm, peak }: Extremum,
): number | null {
  const level = peak ? ohm / Math.SQRT2 : ohm * Math.SQRT2;
  let inner: CurvePoint = { h: order, z: ohm };
  for (const [interval, end] of outward.entries()) {
    const start = inner.h;
    const wide = Math.ceil(Math.abs(end.h - start) / widestStep);
    const parts = interval < fineIntervals ? Math.max(1, Math.min(mostParts, wide)) : 1;
    for (let part = 1; part <= parts; part++) {
      const h = start + ((end.h - start) * part) / parts;
      const point = part === parts ? end : { h, z: magnitude(h) };
      if (peak ? point.z <= level : point.z >= level)
        return crossing((at) => magnitude(at) - level, inner.h, inner.z - level, point.h, point.z - level);
      if (peak ? point.z > ohm : point.z < ohm) return null;
      inner = point;
    }
  }
  return null;
}
