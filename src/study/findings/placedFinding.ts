import { casesOf } from '../cases.ts';
import { joinEdits } from '../edits/edit.ts';
import { nameOf } from '../names.ts';
import type { Edit, SiteFinding, Study } from '../types.ts';
import { findingOf, type PathStep } from '../validate/issue.ts';
import type { Repair, Said } from './Said.ts';

/** What a family said as a finding with its path, its sentence and, where there is one, the edit that mends it. */
export function placedFinding(
  study: Study,
  said: Said,
  cases: readonly string[],
  repairs: readonly Repair[],
): SiteFinding {
  const { code, severity, value, text, subject } = said;
  const names = cases.map((id) => nameOf(casesOf(study).find((item) => item.id === id) ?? { id }));
  const where = [said.where, names.length > 0 ? `in ${names.join(', ')}` : ''].filter(Boolean).join(', ');
  const path = said.path ?? subjectPath(study, said);
  const finding = findingOf({ code, severity, path: [], value, text }, where, path);
  const repair = repairEdit(code, repairs);
  return {
    ...finding,
    // What the study as a whole lacks is told apart by its value, what a field has by its cases.
    key: [code, finding.path, ...(said.path ? [String(value)] : cases)].join('|'),
    mend: sentence(said.mend),
    subject,
    field: said.field,
    cases,
    ...(repair ? { repair } : {}),
  };
}

function subjectPath(study: Study, { subject, field }: Said): PathStep[] {
  if (!subject) return [];
  const [list, records] = subject.kind === 'bus' ? ['buses', study.buses] : ['elements', study.elements];
  const index = (records as readonly { id: string }[]).findIndex(({ id }) => id === subject.id);
  return [list as string, index, ...(field === null ? [] : [field])];
}

function repairEdit(code: string, repairs: readonly Repair[]): Edit | undefined {
  const [first] = repairs;
  if (!first) return undefined;
  return joinEdits(
    `mend.${code}`,
    first.words,
    repairs.map(({ make }) => make),
  );
}

function sentence(clause: string): string {
  return `${clause.charAt(0).toUpperCase()}${clause.slice(1)}.`;
}
