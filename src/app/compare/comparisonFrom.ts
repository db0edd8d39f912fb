import type { ComparedCases } from '../../store/index.ts';
import { baseStateId, caseDifferences, casesOf, type Study } from '../../study/index.ts';

/** What may be compared: every case, and the base study where no case is in its state. */
export function comparableStates(study: Study): { id: string; name: string }[] {
  const cases = casesOf(study).map(({ id, name }) => ({ id, name }));
  const based = cases.some(({ id }) => caseDifferences(study, id).length === 0);
  return based ? cases : [...cases, { id: baseStateId, name: 'Base study' }];
}

/** The case on screen beside the base study; where it is in that state itself, beside the next case. */
export function comparisonFrom(study: Study, caseId: string): ComparedCases {
  const states = comparableStates(study);
  const base = states.find(({ id }) => id === baseStateId || caseDifferences(study, id).length === 0);
  const other = states.find(({ id }) => id !== caseId);
  if (base && base.id !== caseId) return { a: base.id, b: caseId };
  return { a: caseId, b: other?.id ?? caseId };
}
