import { judgeCase, toResultsCheck, type Verdict } from '../checks/index.ts';
import { type ResultsFile, solveCase, solveStudy } from '../engine/index.ts';
import { casesOf, type Study } from '../study/index.ts';

export interface SolvedStudy {
  results: ResultsFile;
  /** By case id; a case without a solution has none. */
  verdicts: Map<string, Verdict[]>;
}

/** The results file of a study, and the verdicts behind its checks in full. */
export function solveAll(study: Study): SolvedStudy {
  const verdicts = new Map<string, Verdict[]>();
  const otherCases = casesOf(study).map(({ id }) => solveCase(study, id));
  const results = solveStudy(study, (solution) => {
    const judged = judgeCase(study, solution, { otherCases });
    verdicts.set(solution.caseId, judged);
    return judged.map(toResultsCheck);
  });
  return { results, verdicts };
}
