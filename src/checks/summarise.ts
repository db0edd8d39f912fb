import type { Verdict, VerdictWord } from './types.ts';

const rank: Record<VerdictWord, number> = { fail: 0, watch: 1, unknown: 2, pass: 3 };

/** Fails first, then watch, unknown, pass; inside each the smallest margin first, ties by key and case. */
export function sortByMargin(verdicts: readonly Verdict[]): Verdict[] {
  const byText = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);
  return [...verdicts].sort(
    (a, b) =>
      rank[a.verdict] - rank[b.verdict] ||
      (a.margin ?? 0) - (b.margin ?? 0) ||
      byText(a.key, b.key) ||
      byText(a.caseId, b.caseId),
  );
}

/** How many verdicts of each word. */
export function summarise(verdicts: readonly Verdict[]): Record<VerdictWord, number> {
  const count: Record<VerdictWord, number> = { fail: 0, watch: 0, pass: 0, unknown: 0 };
  for (const { verdict } of verdicts) count[verdict] += 1;
  return count;
}

/** Checks that a map of margins draws as contours, not as its worst margin. */
const contours: ReadonlySet<string> = new Set(['target-pf', 'delivered-kvar']);

/**
 * The smallest margin among verdicts that may decide. Screening rows and unknowns stay out, and so do
 * target-pf and delivered-kvar: more correction always mends those, so they bound a choice, not rank it.
 */
export function worstMargin(verdicts: readonly Verdict[]): Verdict | undefined {
  return sortByMargin(
    verdicts.filter(({ check, screening, margin }) => !screening && margin !== null && !contours.has(check)),
  ).sort((a, b) => (a.margin ?? 0) - (b.margin ?? 0))[0];
}
