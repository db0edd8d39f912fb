import type { Verdict } from '../../checks/index.ts';
import type { CaseSolution } from '../../engine/index.ts';
import {
  busName,
  casesOf,
  elementName,
  type ResolvedCase,
  type Study,
  studyInCase,
} from '../../study/index.ts';
import type { SheetCase, SheetInput } from './input.ts';
import { sitePower } from './sitePower.ts';

/** One case with its study, its name and what was computed for it. */
export interface CaseView extends ResolvedCase {
  /** The study as it stands in this case. */
  studyHere: Study;
  computed?: SheetCase;
}

/** The input ordered as the study is, with the names every section needs. */
export interface SheetView {
  input: SheetInput;
  study: Study;
  cases: CaseView[];
  /** The case of drawing, waveforms and phasors. */
  shown: CaseView;
  /** Whether that case was chosen by the sheet as the one with the largest demand. */
  shownIsBusiest: boolean;
  /** All verdicts in the order of cases, then key. */
  verdicts: Verdict[];
}

/** The solution of a case, where it has one that converged. */
export function solvedIn(view: CaseView): CaseSolution | undefined {
  const solution = view.computed?.solution;
  return solution?.converged ? solution : undefined;
}

/** The solution of a case with every bank and filter out of service, where it converged. */
export function solvedWithout(view: CaseView): CaseSolution | undefined {
  return view.computed?.without?.converged ? view.computed.without : undefined;
}

const byText = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);

function demandKW(view: CaseView): number {
  const solution = solvedIn(view);
  return (solution && sitePower(view.studyHere, solution)?.kW) ?? Number.NEGATIVE_INFINITY;
}

/** Throws RangeError for a computed case the study does not have. */
export function viewOf(input: SheetInput): SheetView {
  const { study } = input;
  const listed = casesOf(study);
  for (const { caseId } of input.cases) {
    if (!listed.some(({ id }) => id === caseId)) throw new RangeError(`the study has no case "${caseId}"`);
  }
  const cases = listed.map((item): CaseView => {
    const computed = input.cases.find(({ caseId }) => caseId === item.id);
    return { ...item, studyHere: studyInCase(study, item.id), ...(computed ? { computed } : {}) };
  });
  const busiest = [...cases].sort((a, b) => demandKW(b) - demandKW(a) || byText(a.id, b.id))[0];
  const chosen = cases.find(({ id }) => id === input.shownCaseId);
  const shown = chosen ?? busiest;
  if (!shown) throw new RangeError('a study has at least one case');
  const verdicts = cases.flatMap(({ computed }) =>
    [...(computed?.verdicts ?? [])].sort((a, b) => byText(a.key, b.key)),
  );
  return { input, study, cases, shown, shownIsBusiest: shown === busiest, verdicts };
}

/** Name of the busbar or part a verdict speaks of. */
export function subjectName(study: Study, verdict: Verdict): string {
  return verdict.subject.kind === 'bus'
    ? busName(study, verdict.subject.id)
    : elementName(study, verdict.subject.id);
}

/** Name of a case by id; the id where the study has no such case. */
export function caseName(view: SheetView, caseId: string): string {
  return view.cases.find(({ id }) => id === caseId)?.name ?? caseId;
}
