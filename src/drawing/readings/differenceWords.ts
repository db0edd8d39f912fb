import type { CaseDifference } from '../../study/index.ts';

/** "steps, in this case: 3 × 80 kvar, all in → 3 × 80 kvar, 2 of 3 in", a line for each difference. */
export function differenceWords(differences: readonly CaseDifference[]): string[] {
  return differences.map(
    ({ label, baseWords, caseWords }) => `${label}, base → this case: ${baseWords} → ${caseWords}`,
  );
}
