import type { Patch } from '../edits/edit.ts';
import { updateElement } from '../edits/updates.ts';
import { busName, fullNameOf } from '../names.ts';
import type { Bus, Edit, Finding, FindingSubject, Study, StudyElement } from '../types.ts';

/** One operating state of a study as the families of findings look at it. */
export interface State {
  base: Study;
  /** The study as it stands in the case. */
  here: Study;
  /** null for the base study itself. */
  caseId: string | null;
}

/** A mend that can be made by the programme: one edit of the study as it then stands. */
export interface Repair {
  /** What undo says: "set the rated voltage of Bank C1 to 440 V". */
  words: string;
  /** Equal mends of several cases are made once. */
  scope: string;
  make(study: Study): Edit;
}

/** What a family has to say, before cases are gathered and paths are found. */
export interface Said {
  code: string;
  severity: Finding['severity'];
  subject: FindingSubject | null;
  field: string | null;
  /** Path steps of a finding about the study itself, e.g. ["criteria", "demandCurrentA"]. */
  path?: readonly (string | number)[];
  value: unknown;
  /** The part in words; '' where the sentence names it. */
  where: string;
  /** A clause without a full stop. */
  text: string;
  /** A clause without a full stop. */
  mend: string;
  repair?: Repair | undefined;
}

type Words = Pick<Said, 'code' | 'severity' | 'text' | 'mend' | 'repair'>;

/** Something about a field of a part, or about the part where the field is null. */
export function saidOfPart(element: StudyElement, field: string | null, words: Words): Said {
  const value = field === null ? element.id : new Map<string, unknown>(Object.entries(element)).get(field);
  return { subject: { kind: 'element', id: element.id }, field, value, where: fullNameOf(element), ...words };
}

export function saidOfBus(study: Study, bus: Bus, field: string | null, words: Words): Said {
  const where = `busbar ${busName(study, bus.id)}`;
  return { subject: { kind: 'bus', id: bus.id }, field, value: bus.id, where, ...words };
}

export function saidOfStudy(path: readonly (string | number)[], words: Words & { value?: unknown }): Said {
  return { subject: null, field: null, path, value: words.value, where: '', ...words };
}

/**
 * Sets fields of a part where the state took them from: in the case where the case's own changes set one of
 * them, else in the base study.
 */
export function setFields({ base, caseId }: State, id: string, patch: Patch, words: string): Repair {
  const changes = base.cases?.find((item) => item.id === caseId)?.changes ?? [];
  const own = changes.some(
    (change) => change.element === id && Object.keys(patch).some((key) => Object.hasOwn(change.set, key)),
  );
  const options = own && caseId !== null ? { caseId } : {};
  const scope = `${own ? caseId : ''} ${id} ${JSON.stringify(patch)}`;
  return { words, scope, make: (study) => updateElement(study, id, patch, options) };
}
