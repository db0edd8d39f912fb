import { casesOf, type Study } from '../../study/index.ts';
import { scanImpedance } from '../scan/scanImpedance.ts';
import { solveCase } from '../solve/solveCase.ts';
import type { CaseSolution, ResultsCase, ResultsCheck, ResultsFile } from '../types.ts';
import { caseResult } from './caseResult.ts';

/**
 * The results file of a study: every case with its buses, terminals and scans, and the checks that
 * `checksOf` gives for a solved case. Warnings stand once each. A case that fails carries its error; the
 * others still answer.
 */
export function solveStudy(study: Study, checksOf?: (solution: CaseSolution) => ResultsCheck[]): ResultsFile {
  const warnings = new Set<string>();
  const cases = casesOf(study).map(({ id }): ResultsCase => {
    const solution = solveCase(study, id);
    for (const warning of solution.warnings) warnings.add(warning);
    const scans = (study.scans ?? []).map((request) => scanImpedance(study, id, request));
    return caseResult(solution, scans, solution.converged && checksOf ? checksOf(solution) : []);
  });
  return { format: 'varwright-results', version: 1, cases, warnings: [...warnings] };
}
