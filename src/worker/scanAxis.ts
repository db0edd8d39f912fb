import type { ImpedanceScan, Resonance } from '../engine/index.ts';
import type { Study } from '../study/index.ts';

const points = 1200;
const lowestOrder = 0.5;
/** Distances from a peak at which its curve is sampled, in half-power half-widths. */
const peakOffsets = [0, 0.1, 0.25, 0.45, 0.7, 1, 1.4, 2, 3, 5];
/** Q taken where the half-power points are out of reach: such a peak is broad. */
const broadQ = 5;

/** Orders the rail spans: from half the fundamental to the study's highest order, at least to the second. */
export function railSpan(study: Study): { from: number; to: number } {
  return { from: lowestOrder, to: Math.max(study.maxOrder ?? 50, 2) };
}

/** The rail's frequencies in Hz: log-spaced, with every integer order among them exactly, ascending. */
export function scanAxis(study: Study): Float64Array {
  return logAxis(study, points);
}

function logAxis(study: Study, count: number): Float64Array {
  const { from, to } = railSpan(study);
  const orders: number[] = [];
  for (let i = 0; i < count; i += 1) orders.push(from * (to / from) ** (i / (count - 1)));
  orders[count - 1] = to;
  for (let h = 1; h <= to; h += 1) orders.push(h);
  return toFrequencies(orders, study.frequencyHz);
}

/** Points of a band: fewer than of a curve, as it is scanned again and again. */
const bandPoints = 240;

/** The rail's span for a band, log-spaced with every integer order, ascending, in Hz. */
export function railAxis(study: Study): Float64Array {
  return logAxis(study, bandPoints);
}

/** Frequencies in Hz around the given resonances that draw each peak and dip to its tip, ascending. */
export function peakAxis(study: Study, resonances: readonly Resonance[]): Float64Array {
  const { from, to } = railSpan(study);
  const orders = resonances.flatMap(({ order, q }) => {
    const halfWidth = order / (2 * Math.max(q ?? broadQ, broadQ));
    return peakOffsets.flatMap((offset) => [order - offset * halfWidth, order + offset * halfWidth]);
  });
  return toFrequencies(
    orders.filter((order) => order >= from && order <= to),
    study.frequencyHz,
  );
}

function toFrequencies(orders: number[], frequencyHz: number): Float64Array {
  const ascending = Float64Array.from(orders, (order) => order * frequencyHz).sort();
  return ascending.filter((f, i) => i === 0 || f > (ascending[i - 1] as number) * (1 + 1e-12));
}

/** One scan from two of the same busbar on different axes, in ascending frequency; resonances of the first. */
export function mergeScans(coarse: ImpedanceScan, fine: ImpedanceScan): ImpedanceScan {
  const total = coarse.frequencyHz.length + fine.frequencyHz.length;
  const merged = {
    frequencyHz: new Float64Array(total),
    re: new Float64Array(total),
    im: new Float64Array(total),
  };
  let [i, j, n] = [0, 0, 0];
  while (i < coarse.frequencyHz.length || j < fine.frequencyHz.length) {
    const a = coarse.frequencyHz[i] ?? Number.POSITIVE_INFINITY;
    const b = fine.frequencyHz[j] ?? Number.POSITIVE_INFINITY;
    const [scan, at] = a <= b ? [coarse, i] : [fine, j];
    merged.frequencyHz[n] = scan.frequencyHz[at] as number;
    merged.re[n] = scan.re[at] as number;
    merged.im[n] = scan.im[at] as number;
    if (a <= b) i += 1;
    if (b <= a) j += 1;
    n += 1;
  }
  return {
    ...coarse,
    frequencyHz: merged.frequencyHz.slice(0, n),
    re: merged.re.slice(0, n),
    im: merged.im.slice(0, n),
  };
}
