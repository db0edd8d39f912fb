/** The limit of one order, in the spectrum's own per cent. */
export interface OrderLimit {
  h: number;
  limit: number;
}

/** One order of a spectrum: the worst phase. */
export interface SpectrumBar {
  h: number;
  /** Per cent of the base (each phase's own fundamental unless a base is given). */
  percent: number;
  /** rms volts or amperes of that phase. */
  value: number;
  limit: number | null;
  /** Above its limit. */
  fails: boolean;
}

const NO_FUNDAMENTAL = 1e-6;
/** A value at its limit passes; rounding must not turn it. */
const ROUNDING = 1e-9;

/**
 * Bars for h = 2…maxOrder from rms magnitudes, index (h − 1)·3 + k. Percent is the worst phase against its
 * own fundamental, or against `base` (the demand current of a TDD). null where no phase has a fundamental to
 * refer to: a percentage of nothing is not drawn as 0.
 */
export function spectrumBars(
  magnitudes: ArrayLike<number>,
  maxOrder: number,
  limits: readonly OrderLimit[],
  base?: number,
): SpectrumBar[] | null {
  const references = [0, 1, 2].map((k) => base ?? magnitudes[k] ?? 0);
  if (!references.some((reference) => reference > NO_FUNDAMENTAL)) return null;
  const limitOf = new Map(limits.map((one) => [one.h, one.limit]));
  const bars: SpectrumBar[] = [];
  for (let h = 2; h <= maxOrder; h++) {
    const worst = worstPhase(magnitudes, h, references);
    const limit = limitOf.get(h) ?? null;
    bars.push({ h, ...worst, limit, fails: limit !== null && worst.percent > limit * (1 + ROUNDING) });
  }
  return bars;
}

function worstPhase(
  magnitudes: ArrayLike<number>,
  h: number,
  references: readonly number[],
): { percent: number; value: number } {
  let worst = { percent: 0, value: 0 };
  for (let k = 0; k < 3; k++) {
    const reference = references[k] ?? 0;
    const value = magnitudes[(h - 1) * 3 + k] ?? 0;
    if (!(reference > NO_FUNDAMENTAL)) continue;
    const percent = (value / reference) * 100;
    if (percent > worst.percent) worst = { percent, value };
  }
  return worst;
}

const TELLING_SHARE = 0.04;

/**
 * The last order worth showing in a narrow picture: 25, or as far as an order fails or reaches 4 % of the
 * largest bar.
 */
export function lastShownOrder(bars: readonly SpectrumBar[], maxOrder: number): number {
  const largest = Math.max(0, ...bars.map((bar) => bar.percent));
  const telling = bars
    .filter((bar) => bar.fails || bar.percent > largest * TELLING_SHARE)
    .map((bar) => bar.h);
  return Math.min(maxOrder, Math.max(25, ...telling));
}
