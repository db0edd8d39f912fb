import type { Verdict, VerdictWord } from '../../checks/index.ts';

export type VerdictGrouping = 'margin' | 'part' | 'check' | 'case';

/** What a verdict's groups are headed by. */
export interface VerdictNames {
  subject(verdict: Verdict): string;
  case(verdict: Verdict): string;
}

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

/** Verdicts of the chosen words, sorted by margin and, if wanted, gathered by part, by check or by case. */
export function groupedVerdicts(
  verdicts: readonly Verdict[],
  words: ReadonlySet<VerdictWord>,
  grouping: VerdictGrouping,
  names: VerdictNames,
): VerdictGroup[] {
  const sorted = verdicts.filter((verdict) => words.has(verdict.verdict)).sort(byMargin);
  if (grouping === 'margin') return sorted.length > 0 ? [{ title: '', verdicts: sorted }] : [];
  const groups = new Map<string, Verdict[]>();
  for (const verdict of sorted) {
    const title = titleOf(verdict, grouping, names);
    groups.set(title, [...(groups.get(title) ?? []), verdict]);
  }
  return [...groups.entries()].map(([title, members]) => ({ title, verdicts: members }));
}

function titleOf(verdict: Verdict, grouping: VerdictGrouping, names: VerdictNames): string {
  if (grouping === 'part') return names.subject(verdict);
  return grouping === 'case' ? names.case(verdict) : verdict.title;
}

/** How many verdicts there are of each word. */
export function verdictCounts(verdicts: readonly Verdict[]): Record<VerdictWord, number> {
  const counts: Record<VerdictWord, number> = { fail: 0, watch: 0, unknown: 0, pass: 0 };
  for (const verdict of verdicts) counts[verdict.verdict]++;
  return counts;
}
