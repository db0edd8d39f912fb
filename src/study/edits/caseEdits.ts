import { casesOf } from '../cases.ts';
import type { Edit, Study, StudyCase } from '../types.ts';
import { counterOf, freshId, makeEdit, mapById, type Patch, patched, withField } from './edit.ts';

export interface AddCaseEdit extends Edit {
  caseId: string;
}

/** The written list of cases: a study without one gets its base case first. */
function writtenCases(study: Study): StudyCase[] {
  return study.cases && study.cases.length > 0 ? study.cases : [{ id: 'base', name: 'Base', changes: [] }];
}

/** Adds an operating state; without changes it is the base study under another name. */
export function addCase(study: Study, values: Partial<Omit<StudyCase, 'id'>> = {}): AddCaseEdit {
  return insertCase(study, { ...values, changes: values.changes ?? [] }, 'case.add', 'add');
}

/** Adds a copy of a case, with its changes. Throws RangeError for a case the study does not have. */
export function duplicateCase(study: Study, id: string): AddCaseEdit {
  const original = casesOf(study).find((item) => item.id === id);
  if (!original)
    throw new RangeError(
      `no case "${id}"; the study has ${casesOf(study)
        .map((item) => item.id)
        .join(', ')}`,
    );
  const { id: _id, ...rest } = writtenCases(study).find((item) => item.id === id) ?? original;
  return insertCase(study, { ...rest, name: `${original.name}, copy` }, 'case.duplicate', 'duplicate');
}

function insertCase(study: Study, values: Omit<StudyCase, 'id'>, label: string, verb: string): AddCaseEdit {
  const id = freshId(writtenCases(study), 'case');
  const added: StudyCase = { id, name: `Case ${counterOf(id)}`, ...values };
  const edit = makeEdit(label, `${verb} case ${added.name ?? id}`, (current) => {
    const cases = writtenCases(current);
    return cases.some((item) => item.id === id) ? current : { ...current, cases: [...cases, added] };
  });
  return { ...edit, caseId: id };
}

/** Sets a case's name, role or hours; undefined or null removes one. */
export function updateCase(study: Study, id: string, patch: Patch): Edit {
  const name = casesOf(study).find((item) => item.id === id)?.name ?? id;
  const words = 'name' in patch ? `rename case ${name}` : `change case ${name}`;
  return makeEdit('case.set', words, (current) => {
    const before = writtenCases(current);
    const cases = mapById(before, id, (item) => patched(item, patch, ['id', 'changes']));
    return cases === before ? current : { ...current, cases };
  });
}

/** Removes a case. The last one cannot go: a study always has a base. */
export function removeCase(study: Study, id: string): Edit {
  const name = casesOf(study).find((item) => item.id === id)?.name ?? id;
  return makeEdit('case.remove', `remove case ${name}`, (current) => {
    const cases = current.cases?.filter((item) => item.id !== id) ?? [];
    if (!current.cases || cases.length === current.cases.length || cases.length === 0) return current;
    const next = { ...current, cases };
    if (current.view?.caseId !== id) return next;
    const { caseId: _caseId, ...view } = current.view;
    return withField(next, 'view', view);
  });
}

/** Moves a case up (negative) or down in the list; it stops at both ends. */
export function moveCase(study: Study, id: string, by: number): Edit {
  const name = casesOf(study).find((item) => item.id === id)?.name ?? id;
  return makeEdit('case.move', `move case ${name} ${by < 0 ? 'up' : 'down'}`, (current) => {
    const before = current.cases ?? [];
    const at = before.findIndex((item) => item.id === id);
    const moved = before[at];
    const to = Math.max(0, Math.min(before.length - 1, at + by));
    if (!moved || to === at) return current;
    return { ...current, cases: before.toSpliced(at, 1).toSpliced(to, 0, moved) };
  });
}

/** Takes every change of a case away, so that it is the base study again. */
export function resetCase(study: Study, id: string): Edit {
  const name = casesOf(study).find((item) => item.id === id)?.name ?? id;
  return makeEdit('case.resetAll', `put case ${name} back to the base study`, (current) => {
    const cases =
      current.cases &&
      mapById(current.cases, id, (item) => (item.changes.length === 0 ? item : { ...item, changes: [] }));
    return !cases || cases === current.cases ? current : { ...current, cases };
  });
}
