import type { PhasorSpectrum } from '../phasor/phasorSpectrum.ts';

/** Which orders a waveform is made of. */
export type WaveContent = 'fundamental' | 'all' | { upTo: number };

/** The highest order a content asks for, of those a solution holds. */
export function highestOrder(content: WaveContent, maxOrder: number): number {
  if (content === 'fundamental') return 1;
  if (content === 'all') return maxOrder;
  return Math.max(1, Math.min(maxOrder, Math.floor(content.upTo)));
}

/** Samples a period that draw the highest order smoothly. */
export function samplesPerPeriod(highest: number): number {
  return Math.max(240, highest * 12);
}

/**
 * One period of v(t) = √2·Σ_h Re(V_h·e^{jhωt}), h = 1…highest, of one phase (0…2), at t = n·T/samples for
 * n = 0…samples (both ends, so that periods join). rms phasors in, instantaneous values out. Throws
 * RangeError below two samples an order, where the sum would alias.
 */
export function waveform(
  spectrum: PhasorSpectrum,
  phase: number,
  highest: number,
  samples: number,
): Float64Array {
  if (samples < 2 * highest) {
    throw new RangeError(`${samples} samples for order ${highest}: allowed is at least ${2 * highest}`);
  }
  const cosine = new Float64Array(samples);
  const sine = new Float64Array(samples);
  for (let n = 0; n < samples; n++) {
    cosine[n] = Math.SQRT2 * Math.cos((2 * Math.PI * n) / samples);
    sine[n] = Math.SQRT2 * Math.sin((2 * Math.PI * n) / samples);
  }
  const values = new Float64Array(samples + 1);
  for (let h = 1; h <= highest; h++) {
    const re = spectrum.re[(h - 1) * 3 + phase] ?? 0;
    const im = spectrum.im[(h - 1) * 3 + phase] ?? 0;
    if (re === 0 && im === 0) continue;
    for (let n = 0; n < samples; n++) {
      const k = (h * n) % samples;
      values[n] = (values[n] ?? 0) + re * (cosine[k] ?? 0) - im * (sine[k] ?? 0);
    }
  }
  values[samples] = values[0] ?? 0;
  return values;
}

/** The instantaneous value at a share 0…1 of the period, exact. */
export function instantaneous(
  spectrum: PhasorSpectrum,
  phase: number,
  highest: number,
  turn: number,
): number {
  let sum = 0;
  for (let h = 1; h <= highest; h++) {
    const angle = 2 * Math.PI * h * turn;
    const re = spectrum.re[(h - 1) * 3 + phase] ?? 0;
    const im = spectrum.im[(h - 1) * 3 + phase] ?? 0;
    sum += re * Math.cos(angle) - im * Math.sin(angle);
  }
  return Math.SQRT2 * sum;
}

/** Largest |value|, 0 for none. */
export function peakValue(values: Float64Array): number {
  let peak = 0;
  for (const value of values) peak = Math.max(peak, Math.abs(value));
  return peak;
}

/** Crest factor peak/rms of one phase over orders 1…highest; null where there is no current or voltage. */
export function crestFactor(spectrum: PhasorSpectrum, phase: number, highest: number): number | null {
  let square = 0;
  for (let h = 1; h <= highest; h++) {
    square += (spectrum.re[(h - 1) * 3 + phase] ?? 0) ** 2 + (spectrum.im[(h - 1) * 3 + phase] ?? 0) ** 2;
  }
  if (!(square > 1e-18)) return null;
  return peakValue(waveform(spectrum, phase, highest, samplesPerPeriod(highest))) / Math.sqrt(square);
}
