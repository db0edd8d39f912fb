import type { ComplexArray } from '../../engine/index.ts';

/** One rms phasor. */
export interface Phasor {
  re: number;
  im: number;
}

export type ThreePhasors = readonly [Phasor, Phasor, Phasor];

/** rms phasors of three phases by order: index (h − 1)·3 + k, h = 1…maxOrder, k = L1, L2, L3. */
export interface PhasorSpectrum {
  re: ArrayLike<number>;
  im: ArrayLike<number>;
}

/** The phasors of one busbar or terminal, by its place in a solution's arrays; a view, not a copy. */
export function phasorSpectrum(array: ComplexArray, place: number, maxOrder: number): PhasorSpectrum {
  const start = place * maxOrder * 3;
  const end = start + maxOrder * 3;
  if (!(place >= 0 && end <= array.re.length)) {
    throw new RangeError(`place ${place}: the arrays hold ${array.re.length / (maxOrder * 3)} places`);
  }
  return { re: array.re.subarray(start, end), im: array.im.subarray(start, end) };
}

/** The three phasors of one order; an order the spectrum does not hold is null. */
export function phasorsAt(spectrum: PhasorSpectrum, order: number): ThreePhasors | null {
  const start = (order - 1) * 3;
  if (!Number.isInteger(order) || order < 1 || start + 3 > spectrum.re.length) return null;
  const at = (k: number): Phasor => ({
    re: spectrum.re[start + k] ?? Number.NaN,
    im: spectrum.im[start + k] ?? Number.NaN,
  });
  const three: ThreePhasors = [at(0), at(1), at(2)];
  return three.every((one) => Number.isFinite(one.re) && Number.isFinite(one.im)) ? three : null;
}

/** The spectrum with every phasor turned by half a turn: the current out of a part instead of into it. */
export function reversedSpectrum(spectrum: PhasorSpectrum): PhasorSpectrum {
  return {
    re: Float64Array.from(spectrum.re, (value) => -value),
    im: Float64Array.from(spectrum.im, (value) => -value),
  };
}

export function magnitude(phasor: Phasor): number {
  return Math.hypot(phasor.re, phasor.im);
}

/** Angle in degrees, (−180, 180]. */
export function angleDeg(phasor: Phasor): number {
  const angle = (Math.atan2(phasor.im, phasor.re) * 180) / Math.PI;
  return angle <= -180 ? angle + 360 : angle;
}
