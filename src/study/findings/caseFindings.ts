import { caseDifferences, isSameState } from '../caseDifferences.ts';
import { casesOf, studyInCase } from '../cases.ts';
import { makeEdit, mapById } from '../edits/edit.ts';
import { fieldOf } from '../fields/fieldsOf.ts';
import { elementById } from '../lookup.ts';
import { fullNameOf, nameOf } from '../names.ts';
import type { CaseChange, Edit, Study, StudyCase } from '../types.ts';
import { type Said, saidOfStudy } from './Said.ts';

/** Cases that change nothing, name parts that are gone, or set what their parts do not have. */
export function caseListFindings(study: Study): Said[] {
  return (study.cases ?? []).flatMap((item, index) => [
    ...lostParts(study, item, index),
    ...unknownFields(study, item, index),
    ...idleChanges(study, item, index),
    ...sameState(study, item, index),
  ]);
}

/** The case's changes passed through `keep`, which may return fewer fields; empty ones go. */
function changesEdit(
  id: string,
  words: string,
  keep: (change: CaseChange, study: Study) => CaseChange['set'],
): Edit {
  return makeEdit('case.tidy', words, (current) => {
    if (!current.cases) return current;
    const cases = mapById(current.cases, id, (item) => ({
      ...item,
      changes: item.changes
        .map((change) => ({ ...change, set: keep(change, current) }))
        .filter(({ set }) => Object.keys(set).length > 0),
    }));
    return { ...current, cases };
  });
}

function lostParts(study: Study, item: StudyCase, index: number): Said[] {
  const lost = item.changes
    .filter(({ element }) => !elementById(study, element))
    .map(({ element }) => element);
  if (lost.length === 0) return [];
  const words = `take the changes of missing parts out of case ${nameOf(item)}`;
  return [
    ofCase(item, index, {
      code: 'case-without-part',
      severity: 'error',
      text: `it changes ${lost.map((id) => `"${id}"`).join(', ')}, which the study no longer has`,
      mend: words,
      repair: {
        words,
        scope: words,
        make: () =>
          changesEdit(item.id, words, ({ element, set }, current) =>
            elementById(current, element) ? set : {},
          ),
      },
    }),
  ];
}

const known = (study: Study, { element }: CaseChange, key: string): boolean => {
  const part = elementById(study, element);
  return !part || key === 'on' || key === 'id' || key === 'kind' || fieldOf(part.kind, key) !== undefined;
};

function unknownFields(study: Study, item: StudyCase, index: number): Said[] {
  const odd = item.changes.flatMap((change) =>
    Object.keys(change.set).flatMap((key) => {
      const part = elementById(study, change.element);
      return part && !known(study, change, key) ? [`"${key}" of ${fullNameOf(part)}`] : [];
    }),
  );
  if (odd.length === 0) return [];
  const words = `take out what case ${nameOf(item)} sets without effect`;
  return [
    ofCase(item, index, {
      code: 'case-unknown-field',
      severity: 'warning',
      text: `it sets ${odd.join(', ')}, which such a part does not have; it changes nothing`,
      mend: words,
      repair: {
        words,
        scope: words,
        make: () =>
          changesEdit(item.id, words, (change, current) =>
            Object.fromEntries(Object.entries(change.set).filter(([key]) => known(current, change, key))),
          ),
      },
    }),
  ];
}

/** Changes that repeat the base study's own values: they hide later edits of the base study from the case. */
function idleChanges(study: Study, item: StudyCase, index: number): Said[] {
  const differing = new Set(
    caseDifferences(study, item.id).map(({ element, field }) => `${element.id} ${field}`),
  );
  const idle = item.changes.filter(
    ({ element, set }) =>
      elementById(study, element) && Object.keys(set).every((key) => !differing.has(`${element} ${key}`)),
  );
  if (idle.length === 0) return [];
  const names = idle.map(({ element }) => nameOf(elementById(study, element) ?? { id: element }));
  const words = `take what case ${nameOf(item)} repeats of the base study out of it`;
  const ids = new Set(idle);
  return [
    ofCase(item, index, {
      code: 'case-repeats-base',
      severity: 'note',
      text: `it sets ${[...new Set(names)].join(', ')} to what the base study has; later edits of the base will not reach it`,
      mend: words,
      repair: {
        words,
        scope: words,
        make: () => changesEdit(item.id, words, (change) => (ids.has(change) ? {} : change.set)),
      },
    }),
  ];
}

/** A case in the very state of an earlier one is solved and judged twice. */
function sameState(study: Study, item: StudyCase, index: number): Said[] {
  const here = studyInCase(study, item.id);
  const twin = casesOf(study)
    .slice(0, index)
    .find(({ id }) => isSameState(study, studyInCase(study, id), here));
  if (!twin) return [];
  return [
    ofCase(item, index, {
      code: 'case-twice',
      severity: 'note',
      text: `it is in the same state as case ${nameOf(twin)} and gives the same numbers`,
      mend: 'change a part in this case (its slip writes into the case alone where that is ticked), or remove the case',
    }),
  ];
}

function ofCase(
  item: StudyCase,
  index: number,
  words: Omit<Parameters<typeof saidOfStudy>[1], 'value'>,
): Said {
  return { ...saidOfStudy(['cases', index], { ...words, value: item.id }), where: `case ${nameOf(item)}` };
}
