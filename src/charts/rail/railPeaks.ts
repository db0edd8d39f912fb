import type { ImpedanceScan, Resonance } from '../../engine/index.ts';
import { impedanceAt } from './impedanceCurve.ts';

/** A resonance of the impedance seen, with what the correction makes of it. */
export interface RailPeak {
  order: number;
  kind: Resonance['kind'];
  ohm: number;
  q: number | null;
  /** |Z with| / |Z without| at the resonance; null without a reference there. */
  amplification: number | null;
}

/** The resonances of the scan with the correction, ascending, each against the scan without it. */
export function railPeaks(
  withCorrection: ImpedanceScan,
  without: ImpedanceScan,
  frequencyHz: number,
): RailPeak[] {
  return [...withCorrection.resonances]
    .sort((a, b) => a.order - b.order)
    .map((resonance) => {
      const reference = impedanceAt(without, resonance.order * frequencyHz);
      const ohm = reference ? Math.hypot(reference.re, reference.im) : 0;
      return { ...resonance, amplification: ohm > 0 ? resonance.ohm / ohm : null };
    });
}

const SAME_ORDER = 1e-4;

/** The peak reached by stepping from an order forwards (+1) or backwards (−1), round the ends; null if none. */
export function steppedPeak(peaks: readonly RailPeak[], order: number, direction: 1 | -1): RailPeak | null {
  if (direction === 1) return peaks.find((peak) => peak.order > order + SAME_ORDER) ?? peaks[0] ?? null;
  const before = peaks.filter((peak) => peak.order < order - SAME_ORDER);
  return before.at(-1) ?? peaks.at(-1) ?? null;
}
