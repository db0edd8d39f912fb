import {
  defaultOf,
  type Edit,
  elementById,
  errorsAfter,
  type Field,
  type Finding,
  isBaseCase,
  nameOf,
  type Study,
  type StudyCase,
  type StudyElement,
  sameData,
  studyInCase,
} from '../../study/index.ts';

/** The open case where it is a real variant: not the plain base, and among the study's cases. */
export function variantCase(study: Study, caseId: string): StudyCase | undefined {
  return isBaseCase(study, caseId) ? undefined : study.cases?.find((item) => item.id === caseId);
}

/** The part as the slip shows it: in the case where its changes are being written, else in the base study. */
export function shownElement(study: Study, id: string, caseId: string | undefined): StudyElement | undefined {
  return elementById(caseId === undefined ? study : studyInCase(study, caseId), id);
}

/** Whether a case has changes of its own for the part. */
export function hasChanges(item: StudyCase, id: string): boolean {
  return item.changes.some((change) => change.element === id && Object.keys(change.set).length > 0);
}

/** A field of a record whose keys are only known at run time. */
export function fieldValue(record: object, key: string): unknown {
  return new Map<string, unknown>(Object.entries(record)).get(key);
}

/** The value a field falls back to where it is absent. */
export function fallbackOf(field: Field, owner: object, nominalV: number | undefined): unknown {
  return defaultOf(field, { owner: { ...owner }, nominalV });
}

/** What to store for a chosen value: nothing where it is the default, so that the file stays short. */
export function storedValue(value: unknown, fallback: unknown): unknown {
  return sameData(value, fallback) ? undefined : value;
}

/** The first reason an edit cannot be made, as a sentence for the field, or null where it can. */
export function refusalOf(study: Study, edit: Edit, where: string): string | null {
  const error = errorsAfter(study, edit)[0];
  if (!error) return null;
  const own = error.message.startsWith(where)
    ? error.message.slice(error.message.indexOf(': ') + 2)
    : error.message;
  return own.charAt(0).toUpperCase() + own.slice(1);
}

/** Findings about one field of the record at a path such as "$.elements[3]". */
export function findingsAt(findings: readonly Finding[], path: string, key: string | null): Finding[] {
  return findings.filter((finding) => {
    if (key === null) return finding.path === path;
    const rest = finding.path.startsWith(`${path}.`) ? finding.path.slice(path.length + 1) : '';
    return rest === key || rest.startsWith(`${key}[`) || rest.startsWith(`${key}.`);
  });
}

/** "in Night", as a short tail of labels. */
export function caseTail(item: StudyCase): string {
  return `in ${nameOf(item)}`;
}
