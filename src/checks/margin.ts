import type { VerdictWord } from './types.ts';

/** Below this margin a met limit is worth watching. */
export const WATCH_MARGIN = 0.1;

/** An upper limit is kept by staying below it, a lower one by staying above. */
export type Sense = 'upper' | 'lower';

/**
 * margin = (limit − value)/(limit − reference), sign turned for lower limits: positive is good,
 * 0 at the limit, negative fails. reference is 0 for one-sided limits, 1.00 U_n for voltage bands,
 * 1.0 for power factors; all in the value's unit. RangeError where limit equals reference.
 */
export function margin(value: number, limit: number, reference = 0, sense: Sense = 'upper'): number {
  const room = Math.abs(limit - reference);
  if (!(room > 0))
    throw new RangeError(`limit ${limit} equals its reference ${reference}: no margin can be formed`);
  return (sense === 'upper' ? limit - value : value - limit) / room;
}

/** fail below 0, watch below `watchBelow` (0.10), else pass; a screening rule only ever says watch or pass. */
export function verdictWord(
  marginValue: number,
  screening = false,
  watchBelow: number = WATCH_MARGIN,
): VerdictWord {
  if (screening) return marginValue < 0 ? 'watch' : 'pass';
  if (marginValue < 0) return 'fail';
  return marginValue < watchBelow ? 'watch' : 'pass';
}
