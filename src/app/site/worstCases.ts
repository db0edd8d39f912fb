import { byMargin, type WorstCase } from '../../charts/index.ts';
import type { Verdict } from '../../checks/index.ts';
import type { WorstResult } from '../../sizing/index.ts';
import type { AllVerdicts } from '../../store/index.ts';

/** The case in which each check ends worst, by the verdict's key; nothing while not every case is judged. */
export function worstCases(
  all: AllVerdicts | null,
  revision: number,
  caseId: string,
  caseName: (id: string) => string,
): ReadonlyMap<string, WorstCase> {
  if (!all?.complete || all.revision !== revision || Object.keys(all.byCase).length < 2) return new Map();
  const worst = new Map<string, Verdict>();
  // The case on screen goes first, so that a tie speaks of it.
  const cases = Object.values(all.byCase).sort(
    (a, b) => Number(b[0]?.caseId === caseId) - Number(a[0]?.caseId === caseId),
  );
  for (const verdict of cases.flat()) {
    const known = worst.get(verdict.key);
    if (!known || worseThan(verdict, known)) worst.set(verdict.key, verdict);
  }
  return new Map(
    [...worst].map(([key, verdict]) => [
      key,
      {
        caseName: caseName(verdict.caseId),
        value: verdict.value,
        verdict: verdict.verdict,
        here: verdict.caseId === caseId,
      },
    ]),
  );
}

/** The same over states and tolerances, once they are searched. */
export function worstSearched(result: WorstResult, caseId: string): ReadonlyMap<string, WorstCase> {
  return new Map(
    result.verdicts
      .filter(({ screening }) => !screening)
      .map(({ key, value, verdict, governing }) => [
        key,
        {
          caseName: governing.stateName,
          point: governing.point,
          value,
          verdict,
          here: governing.stateId === caseId && governing.rated,
        },
      ]),
  );
}

function worseThan(a: Verdict, b: Verdict): boolean {
  return byMargin({ ...a, key: '' }, { ...b, key: '' }) < 0;
}
