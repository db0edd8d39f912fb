import { isBaseCase } from '../cases.ts';
import { type FieldOwner, fieldOf } from '../fields/fieldsOf.ts';
import { elementById } from '../lookup.ts';
import { busName, fullNameOf, nameOf } from '../names.ts';
import type { Bus, CaseChange, Edit, Study, StudyCase, StudyElement } from '../types.ts';
import { makeEdit, mapById, type Patch, patched, sameData, withField } from './edit.ts';
import { originPath, putOrigins } from './origins.ts';

export interface UpdateOptions {
  /** Write the change into this case only; the base case, or no case, writes the part itself. */
  caseId?: string;
}

const identity = ['id', 'kind'] as const;

/** Origins that speak of a value nobody has given; undefined is none. */
const guesses: ReadonlySet<string | undefined> = new Set(['typical', 'assumed']);

/**
 * Sets fields of a part; undefined or null removes one. With `caseId` of a case that is not the plain base,
 * the case's change is written: a value equal to the base study's takes the change away again. An edited
 * value is no longer the typical or assumed one, so that mark falls off.
 */
export function updateElement(study: Study, id: string, patch: Patch, options: UpdateOptions = {}): Edit {
  const element = elementById(study, id);
  const caseId = options.caseId;
  const inCase =
    caseId !== undefined && !isBaseCase(study, caseId)
      ? study.cases?.find((item) => item.id === caseId)
      : undefined;
  const words = element
    ? `${patchWords(element.kind, fullNameOf(element), patch)}${inCase ? ` in case ${nameOf(inCase)}` : ''}`
    : `change ${id}`;
  const label = `${element?.kind ?? 'element'}.${Object.keys(patch).length === 1 ? `set${capital(Object.keys(patch)[0] ?? '')}` : 'set'}`;
  return makeEdit(label, words, (current) => {
    if (inCase) return updateInCase(current, inCase.id, id, patch);
    const elements = mapById(current.elements, id, (item) => patched<StudyElement>(item, patch, identity));
    if (elements === current.elements) return current;
    return withoutGuessMarks({ ...current, elements }, 'elements', id, patch);
  });
}

function withoutGuessMarks(study: Study, list: 'elements' | 'buses', id: string, patch: Patch): Study {
  const stale = Object.keys(patch)
    .map((key) => originPath(list, id, key))
    .filter((path) => guesses.has(study.origins?.[path]?.origin));
  return putOrigins(study, Object.fromEntries(stale.map((path) => [path, null])));
}

function updateInCase(study: Study, caseId: string, id: string, patch: Patch): Study {
  const element = elementById(study, id);
  if (!element || !study.cases) return study;
  const cases = mapById(study.cases, caseId, (item) => caseWith(item, element, patch));
  return cases === study.cases ? study : { ...study, cases };
}

/** The case with its changes of one part gathered in one record, values equal to the base dropped. */
function caseWith(item: StudyCase, element: StudyElement, patch: Patch): StudyCase {
  const base = new Map<string, unknown>(Object.entries(element));
  const before = item.changes.filter((change) => change.element === element.id);
  const set = new Map<string, unknown>(before.flatMap((change) => Object.entries(change.set)));
  for (const [key, value] of Object.entries(patch)) {
    if (key === 'id' || key === 'kind') continue;
    const wanted = value ?? null;
    const own = base.get(key) ?? null;
    if (sameData(wanted, own) || (key === 'on' && wanted === true && own === null)) set.delete(key);
    else set.set(key, wanted);
  }
  const change: CaseChange = { element: element.id, set: Object.fromEntries(set) };
  const first = item.changes.findIndex((other) => other.element === element.id);
  const others = item.changes.filter((other) => other.element !== element.id);
  const changes = set.size === 0 ? others : others.toSpliced(first < 0 ? others.length : first, 0, change);
  return sameData(changes, item.changes) ? item : { ...item, changes };
}

/** Takes a case's changes of one part away: all of them, or one field. */
export function resetInCase(study: Study, caseId: string, id: string, field?: string): Edit {
  const item = study.cases?.find((other) => other.id === caseId);
  const element = elementById(study, id);
  const what =
    field === undefined || !element ? '' : `the ${fieldOf(element.kind, field)?.label ?? field} of `;
  const words = `put ${what}${element ? fullNameOf(element) : id} back to the base study in case ${item ? nameOf(item) : caseId}`;
  return makeEdit('case.reset', words, (current) => {
    const cases = current.cases && mapById(current.cases, caseId, (other) => caseWithout(other, id, field));
    return !cases || cases === current.cases ? current : { ...current, cases };
  });
}

function caseWithout(item: StudyCase, id: string, field: string | undefined): StudyCase {
  const changes = item.changes.flatMap((change) => {
    if (change.element !== id) return [change];
    const set = Object.fromEntries(
      Object.entries(change.set).filter(([key]) => field !== undefined && key !== field),
    );
    return Object.keys(set).length === 0 ? [] : [{ ...change, set }];
  });
  return sameData(changes, item.changes) ? item : { ...item, changes };
}

/** Sets fields of a busbar; undefined or null removes one. */
export function updateBus(study: Study, id: string, patch: Patch): Edit {
  const words = patchWords('bus', busName(study, id), patch);
  return makeEdit('bus.set', words, (current) => {
    const buses = mapById(current.buses, id, (bus) => patched<Bus>(bus, patch, ['id']));
    return buses === current.buses ? current : withoutGuessMarks({ ...current, buses }, 'buses', id, patch);
  });
}

const ownLists = ['format', 'version', 'buses', 'elements'] as const;

/** Sets fields of the study itself (title, criteria, limits, tariff, proposals …), not its parts. */
export function updateStudy(_study: Study, patch: Patch): Edit {
  const keys = Object.keys(patch);
  const label = keys.length === 1 ? `study.set${capital(keys[0] ?? '')}` : 'study.set';
  return makeEdit(label, patchWords('study', 'the study', patch), (current) =>
    patched(current, patch, ownLists),
  );
}

/** Sets fields of the criteria or of the limit choice; an emptied record disappears. */
export function updateGroup(_study: Study, group: 'criteria' | 'limits', patch: Patch): Edit {
  return makeEdit(
    `${group}.set`,
    patchWords(group, group === 'criteria' ? 'the criteria' : 'the limit sets', patch),
    (current) => {
      const before = current[group] ?? {};
      const after = patched(before, patch);
      return after === before
        ? current
        : withField(current, group, Object.keys(after).length === 0 ? undefined : after);
    },
  );
}

function patchWords(owner: FieldOwner, name: string, patch: Patch): string {
  const keys = Object.keys(patch);
  const key = keys[0];
  if (keys.length !== 1 || key === undefined) return `change ${name}`;
  if (key === 'on') return patch.on === false ? `take ${name} out of service` : `put ${name} in service`;
  if (key === 'name') return `rename ${name}`;
  return `set the ${fieldOf(owner, key)?.label ?? key} of ${name}`;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
