import type { CaseChange, CaseRole, Study, StudyCase, StudyElement } from './types.ts';

/** A case with its defaults filled. */
export interface ResolvedCase extends StudyCase {
  name: string;
  role: CaseRole;
  hoursPerDay: number;
}

const caseLists = new WeakMap<Study, readonly ResolvedCase[]>();
const appliedCases = new WeakMap<Study, Map<string, Study>>();

/** The study's cases with role, name and hours filled; a study without any has one, id "base". */
export function casesOf(study: Study): readonly ResolvedCase[] {
  const known = caseLists.get(study);
  if (known) return known;
  const listed =
    study.cases && study.cases.length > 0 ? study.cases : [{ id: 'base', name: 'Base', changes: [] }];
  const cases = listed.map((item: StudyCase) => ({
    ...item,
    name: item.name?.trim() || item.id,
    role: item.role ?? 'load',
    hoursPerDay: item.hoursPerDay ?? 24,
  }));
  caseLists.set(study, cases);
  return cases;
}

/** A part after a case's `set`: whole top-level fields replaced, null removes, id and kind stay. */
export function applySet(element: StudyElement, set: CaseChange['set']): StudyElement {
  const entries = new Map<string, unknown>(Object.entries(element));
  for (const [key, value] of Object.entries(set)) {
    if (key === 'id' || key === 'kind') continue;
    if (value === null) entries.delete(key);
    else entries.set(key, value);
  }
  return Object.fromEntries(entries) as unknown as StudyElement;
}

/**
 * The study as it stands in one case: a new study whose changed parts are replaced; the others keep their
 * identity. Pure and remembered per study, so the same case gives the same object. Throws RangeError for a
 * case the study does not have.
 */
export function studyInCase(study: Study, caseId: string): Study {
  const known = appliedCases.get(study)?.get(caseId);
  if (known) return known;
  const found = casesOf(study).find((item) => item.id === caseId);
  if (!found) {
    throw new RangeError(
      `no case "${caseId}"; the study has ${casesOf(study)
        .map((item) => item.id)
        .join(', ')}`,
    );
  }
  const changed = new Map<string, StudyElement>();
  const base = new Map(study.elements.map((element) => [element.id, element]));
  for (const change of found.changes) {
    const element = changed.get(change.element) ?? base.get(change.element);
    if (element && Object.keys(change.set).length > 0)
      changed.set(change.element, applySet(element, change.set));
  }
  const result =
    changed.size === 0
      ? study
      : { ...study, elements: study.elements.map((element) => changed.get(element.id) ?? element) };
  const remembered = appliedCases.get(study) ?? new Map<string, Study>();
  remembered.set(caseId, result);
  appliedCases.set(study, remembered);
  return result;
}

/** Whether edits made while this case is open belong to the base study: it is the plain "base" case. */
export function isBaseCase(study: Study, caseId: string): boolean {
  const listed = study.cases?.find((item) => item.id === caseId);
  return caseId === 'base' && (listed === undefined || listed.changes.length === 0);
}

/** Names the base study as a state beside the cases, also where no case is in it. No case has such an id. */
export const baseStateId = '\u0000base';

/**
 * The study with its base state as a further case, so that it can be solved and judged like one. It comes
 * last: what is asked of the first case alone stays there.
 */
export function withBaseState(study: Study): Study {
  const known = basedStudies.get(study);
  if (known) return known;
  const cases =
    study.cases && study.cases.length > 0 ? study.cases : [{ id: 'base', name: 'Base', changes: [] }];
  const based = { ...study, cases: [...cases, { id: baseStateId, name: 'Base study', changes: [] }] };
  basedStudies.set(study, based);
  return based;
}

const basedStudies = new WeakMap<Study, Study>();
