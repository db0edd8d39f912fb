import { applySet } from '../cases.ts';
import type { Finding, StudyElement } from '../types.ts';
import { elementIssues, listed, type Surroundings } from './elementIssues.ts';
import { errorIssue, findingOf, type Issue, isRecord, valueText } from './issue.ts';
import { wordsFor } from './recordWords.ts';
import { shapeIssues } from './shapeIssues.ts';

type Change = { index: number; set: Record<string, unknown> };

/**
 * A case's own fields, and every part as it stands once the case's changes are applied. A part the base study
 * already refuses is left out. What is wrong is blamed on the last change that sets a field taking part, and
 * its path ends in .set.field.
 */
export function caseFindings(
  record: unknown,
  caseIndex: number,
  base: ReadonlyMap<string, { element: StudyElement; sound: boolean }>,
  surroundings: Surroundings,
): Finding[] {
  const where = wordsFor('case', record, caseIndex);
  const at = ['cases', caseIndex];
  const own = isRecord(record)
    ? caseIssues(record)
    : [errorIssue('type', [], record, `a case is ${valueText(record)}; allowed is a record of fields`)];
  const findings = own.map((issue) => findingOf(issue, where, at));
  if (!isRecord(record) || !Array.isArray(record.changes)) return findings;

  const byElement = new Map<string, Change[]>();
  record.changes.forEach((change: unknown, index) => {
    const issues = changeIssues(change, base);
    findings.push(...issues.map((issue) => findingOf(issue, where, [...at, 'changes', index])));
    if (issues.length > 0 || !isRecord(change)) return;
    const element = change.element as string;
    byElement.set(element, [
      ...(byElement.get(element) ?? []),
      { index, set: change.set as Record<string, unknown> },
    ]);
  });
  for (const [id, changes] of byElement) {
    const part = base.get(id);
    if (!part?.sound) continue;
    const applied = changes.reduce((element, change) => applySet(element, change.set), part.element);
    const before = new Set(elementIssues(part.element, surroundings).map(signature));
    const words = `${where}, ${wordsFor('part', part.element, 0)}`;
    for (const issue of elementIssues(applied, surroundings)) {
      if (before.has(signature(issue))) continue;
      findings.push(blame(issue, changes, words, [...at, 'changes']));
    }
  }
  return findings;
}

function signature(issue: Issue): string {
  return `${issue.code} ${issue.text}`;
}

function caseIssues(record: Record<string, unknown>): Issue[] {
  const issues = shapeIssues('case', record, true);
  if (record.changes !== undefined && !Array.isArray(record.changes)) {
    issues.push(
      errorIssue(
        'type',
        ['changes'],
        record.changes,
        `the changes are ${valueText(record.changes)}; allowed is a list`,
      ),
    );
  }
  return issues;
}

function changeIssues(change: unknown, base: ReadonlyMap<string, { element: StudyElement }>): Issue[] {
  if (!isRecord(change))
    return [
      errorIssue(
        'type',
        [],
        change,
        `a change is ${valueText(change)}; allowed is a record with element and set`,
      ),
    ];
  const { element: id, set } = change;
  if (typeof id !== 'string')
    return [
      errorIssue(
        id === undefined ? 'missing' : 'type',
        ['element'],
        id,
        `the changed part is ${valueText(id)}; allowed is the id of a part`,
      ),
    ];
  const part = base.get(id);
  if (!part)
    return [
      errorIssue(
        'dangling-id',
        ['element'],
        id,
        `the study has no part "${id}"; allowed are ${listed(base.keys())}`,
      ),
    ];
  if (!isRecord(set))
    return [
      errorIssue(
        set === undefined ? 'missing' : 'type',
        ['set'],
        set,
        `set is ${valueText(set)}; allowed is a record of fields`,
      ),
    ];
  return (['id', 'kind'] as const)
    .filter((key) => Object.hasOwn(set, key) && set[key] !== part.element[key])
    .map((key) =>
      errorIssue('rule', ['set', key], set[key], `a case cannot change the ${key} of a part; leave it out`),
    );
}

function blame(
  issue: Issue,
  changes: readonly Change[],
  where: string,
  at: readonly (string | number)[],
): Finding {
  const involved = issue.keys ?? issue.path.slice(0, 1).map(String);
  const guilty =
    changes.findLast((change) => involved.some((key) => Object.hasOwn(change.set, key))) ?? changes.at(-1);
  if (!guilty) return findingOf(issue, where, at);
  const head = String(issue.path[0]);
  const key = Object.hasOwn(guilty.set, head)
    ? head
    : involved.find((name) => Object.hasOwn(guilty.set, name));
  const path = key === undefined ? [] : key === head ? issue.path : [key];
  const value =
    key === undefined
      ? guilty.set
      : key === head && issue.value !== undefined
        ? issue.value
        : guilty.set[key];
  return findingOf({ ...issue, path, value }, where, [...at, guilty.index, 'set']);
}
