import { elementKinds, type FieldOwner } from '../fields/fieldsOf.ts';
import type { StudyElement } from '../types.ts';
import { elementRules } from './elementRules.ts';
import { errorIssue, type Issue, isRecord, valueText } from './issue.ts';
import { shapeIssues } from './shapeIssues.ts';

/** What a part is checked against besides itself. */
export interface Surroundings {
  busIds: ReadonlySet<string>;
  spectrumIds: ReadonlySet<string>;
  maxOrder: number;
}

export function kindOf(record: unknown): FieldOwner | undefined {
  const kind = isRecord(record) ? record.kind : undefined;
  return elementKinds.find((known) => known === kind);
}

/** Everything wrong with one part: its kind, its fields, the rules between them, what it refers to. */
export function elementIssues(record: unknown, surroundings: Surroundings): Issue[] {
  if (!isRecord(record))
    return [errorIssue('type', [], record, `a part is ${valueText(record)}; allowed is a record of fields`)];
  const kind = kindOf(record);
  if (!kind) {
    const code = record.kind === undefined ? 'missing' : 'unknown-kind';
    return [
      errorIssue(
        code,
        ['kind'],
        record.kind,
        `the kind is ${valueText(record.kind)}; allowed are ${elementKinds.join(', ')}`,
      ),
    ];
  }
  const shape = shapeIssues(kind, record, true);
  if (shape.length > 0) return shape;
  const element = record as unknown as StudyElement;
  return [...elementRules(element, surroundings.maxOrder), ...referenceIssues(element, surroundings)];
}

function referenceIssues(element: StudyElement, { busIds, spectrumIds }: Surroundings): Issue[] {
  const ends =
    'from' in element
      ? (['from', 'to'] as const).map((key) => [key, element[key]] as const)
      : [['bus', element.bus] as const];
  const issues = ends
    .filter(([, id]) => !busIds.has(id))
    .map(([key, id]) =>
      errorIssue('dangling-id', [key], id, `the study has no busbar "${id}"; allowed are ${listed(busIds)}`),
    );
  if (
    element.kind === 'converter' &&
    typeof element.spectrum === 'string' &&
    !spectrumIds.has(element.spectrum)
  ) {
    issues.push(
      errorIssue(
        'dangling-id',
        ['spectrum'],
        element.spectrum,
        `there is no spectrum "${element.spectrum}"; allowed are ${listed(spectrumIds)}, or rows`,
      ),
    );
  }
  return issues;
}

const longestList = 12;

/** Ids in words, cut after a dozen. */
export function listed(ids: Iterable<string>): string {
  const all = [...ids];
  if (all.length === 0) return 'none yet';
  const shown = all.slice(0, longestList).join(', ');
  return all.length > longestList ? `${shown} and ${all.length - longestList} more` : shown;
}
