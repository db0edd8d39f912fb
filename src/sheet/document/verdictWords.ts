import type { Verdict } from '../../checks/index.ts';
import { signed, significant } from './formatNumber.ts';

/** A value with its unit on one line, or the word for none. */
export function withUnit(value: number | null, unit: string, none = 'not computed'): string {
  if (value === null || !Number.isFinite(value)) return none;
  const text = significant(value, 3);
  return unit === '' || unit === '1' ? text : `${text}\u00a0${unit}`;
}

/** A margin with two decimals, with more where a limit is missed by less. */
export function marginText({ margin }: Verdict): string {
  if (margin === null || !Number.isFinite(margin)) return '';
  const hidden = margin < 0 && Math.abs(margin) < 0.005;
  return hidden ? `−${significant(Math.abs(margin), 1)}` : signed(margin, 2);
}

/** Whether the verdict may decide: judged and no screening rule. */
export const decides = (verdict: Verdict): boolean => !verdict.screening && verdict.margin !== null;

/** Smallest margin first, ties by key and case. */
export function byMargin(a: Verdict, b: Verdict): number {
  const difference = (a.margin ?? Number.POSITIVE_INFINITY) - (b.margin ?? Number.POSITIVE_INFINITY);
  if (Number.isFinite(difference) && difference !== 0) return difference;
  if (a.margin === null && b.margin !== null) return 1;
  if (a.margin !== null && b.margin === null) return -1;
  const [left, right] = [`${a.key}|${a.caseId}`, `${b.key}|${b.caseId}`];
  return left < right ? -1 : left > right ? 1 : 0;
}

/** "1 verdict", "3 verdicts". */
export const counted = (count: number, word: string, plural = `${word}s`): string =>
  `${count} ${count === 1 ? word : plural}`;
