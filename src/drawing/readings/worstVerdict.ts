import type { Verdict, VerdictWord } from '../../checks/index.ts';

const RANK: VerdictWord[] = ['fail', 'watch', 'unknown', 'pass'];

export const verdictWords: Record<VerdictWord, string> = {
  fail: 'fails',
  watch: 'watch',
  unknown: 'no verdict',
  pass: 'passes',
};

/** The gravest verdict of each subject, keyed "element:id" or "bus:id". Screening rules never mark a part. */
export function worstVerdicts(verdicts: readonly Verdict[]): Map<string, VerdictWord> {
  const worst = new Map<string, VerdictWord>();
  for (const { subject, verdict, screening } of verdicts) {
    if (screening) continue;
    const key = `${subject.kind}:${subject.id}`;
    const standing = worst.get(key);
    if (!standing || RANK.indexOf(verdict) < RANK.indexOf(standing)) worst.set(key, verdict);
  }
  return worst;
}
