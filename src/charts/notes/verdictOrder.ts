import type { Verdict, VerdictWord } from '../../checks/index.ts';

export type VerdictGrouping = 'margin' | 'part' | 'check';

export interface VerdictGroup {
  /** Heading; empty when verdicts are sorted by margin alone. */
  title: string;
  verdicts: Verdict[];
}

const RANK: Record<VerdictWord, number> = { fail: 0, watch: 1, unknown: 2, pass: 3 };

/** Fails, then watch, then no verdict, then passes; each by margin, the smallest first; ties by key. */
export function byMargin(a: Verdict, b: Verdict): number {
  const rank = RANK[a.verdict] - RANK[b.verdict];
  if (rank !== 0) return rank;
  const margin = (a.margin ?? Number.POSITIVE_INFINITY) - (b.margin ?? Number.POSITIVE_INFINITY);
  if (margin < 0 || margin > 0) return margin;
  return a.key < b.key ? -1 : a.key > b.key ? 1 : 0;
}

/** Verdicts of the chosen words, sorted by margin and, if wanted, gathered by part or by check. */
export function groupedVerdicts(
  verdicts: readonly Verdict[],
  words: ReadonlySet<VerdictWord>,
  grouping: VerdictGrouping,
  nameOf: (verdict: Verdict) => string,
): VerdictGroup[] {
  const sorted = verdicts.filter((verdict) => words.has(verdict.verdict)).sort(byMargin);
  if (grouping === 'margin') return sorted.length > 0 ? [{ title: '', verdicts: sorted }] : [];
  const groups = new Map<string, Verdict[]>();
  for (const verdict of sorted) {
    const title = grouping === 'part' ? nameOf(verdict) : verdict.title;
    groups.set(title, [...(groups.get(title) ?? []), verdict]);
  }
  return [...groups.entries()].map(([title, members]) => ({ title, verdicts: members }));
}

/** How many verdicts there are of each word. */
export function verdictCounts(verdicts: readonly Verdict[]): Record<VerdictWord, number> {
  const counts: Record<VerdictWord, number> = { fail: 0, watch: 0, unknown: 0, pass: 0 };
  for (const verdict of verdicts) counts[verdict.verdict]++;
  return counts;
}
