import { bisector } from 'd3';
import type { ImpedanceScan } from '../../engine/index.ts';

/** |Z| over order, ascending, with the refined resonances put between the scan's own points. */
export interface ImpedanceCurve {
  points: readonly CurvePoint[];
}

export interface CurvePoint {
  order: number;
  ohm: number;
  /** A refined resonance: never left out of the drawing. */
  turning: boolean;
}

/**
 * |Z(h)| of a scan as a curve. The scan's resonances are added as points, so that a sharp peak is drawn
 * to its true height and the handle can reach it. Points without a positive finite |Z| are left out: a
 * logarithmic landscape has no place for them.
 */
export function impedanceCurve(scan: ImpedanceScan, frequencyHz: number): ImpedanceCurve {
  const points: CurvePoint[] = [];
  for (let i = 0; i < scan.frequencyHz.length; i++) {
    const ohm = Math.hypot(scan.re[i] ?? Number.NaN, scan.im[i] ?? Number.NaN);
    points.push({ order: (scan.frequencyHz[i] ?? Number.NaN) / frequencyHz, ohm, turning: false });
  }
  for (const resonance of scan.resonances)
    points.push({ order: resonance.order, ohm: resonance.ohm, turning: true });
  const drawable = points.filter((p) => p.order > 0 && Number.isFinite(p.order) && isDrawable(p.ohm));
  return { points: drawable.sort((a, b) => a.order - b.order) };
}

function isDrawable(ohm: number): boolean {
  return Number.isFinite(ohm) && ohm > 0;
}

const byOrder = bisector((point: CurvePoint) => point.order);

/** |Z| at an order by straight lines on the log–log landscape; null outside the curve. */
export function ohmAt(curve: ImpedanceCurve, order: number): number | null {
  const right = byOrder.left(curve.points, order);
  const after = curve.points[right];
  if (after && after.order === order) return after.ohm;
  const before = curve.points[right - 1];
  if (!before || !after) return null;
  const share = Math.log(order / before.order) / Math.log(after.order / before.order);
  return before.ohm * (after.ohm / before.ohm) ** share;
}

/** Z = re + j·im at a frequency, interpolated between neighbouring scan points; null outside the scan. */
export function impedanceAt(scan: ImpedanceScan, hz: number): { re: number; im: number } | null {
  const f = scan.frequencyHz;
  const right = bisector((value: number) => value).left(f, hz);
  const f1 = f[right];
  if (f1 === undefined) return null;
  const left = f1 === hz ? right : right - 1;
  const f0 = f[left];
  if (f0 === undefined) return null;
  const share = f1 === f0 ? 0 : (hz - f0) / (f1 - f0);
  const re = between(scan.re, left, right, share);
  const im = between(scan.im, left, right, share);
  return Number.isFinite(re) && Number.isFinite(im) ? { re, im } : null;
}

function between(values: Float64Array, left: number, right: number, share: number): number {
  const a = values[left] ?? Number.NaN;
  const b = values[right] ?? Number.NaN;
  return a + (b - a) * share;
}

/** Smallest and largest |Z| of several curves between two orders; null when there is nothing to show. */
export function ohmExtent(
  curves: readonly ImpedanceCurve[],
  low: number,
  high: number,
): { min: number; max: number } | null {
  let min = Number.POSITIVE_INFINITY;
  let max = 0;
  for (const curve of curves) {
    for (const point of curve.points) {
      if (point.order < low || point.order > high) continue;
      min = Math.min(min, point.ohm);
      max = Math.max(max, point.ohm);
    }
  }
  return max > 0 ? { min, max } : null;
}
