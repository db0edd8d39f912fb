import type { FieldOwner } from '../fields/fieldsOf.ts';
import type { Finding } from '../types.ts';
import { kindOf } from './elementIssues.ts';
import { findingOf, isRecord, type PathStep, warningIssue } from './issue.ts';
import { unknownKeys } from './shapeIssues.ts';

type Owned = Record<string, unknown>;

const studyExtras = [
  'format',
  'version',
  'spectra',
  'buses',
  'elements',
  'cases',
  'scans',
  'origins',
  'view',
];

/** Unknown fields seen so far, each once by the kind of its record. */
class Sightings {
  private readonly seen = new Map<
    string,
    { owner: FieldOwner; value: unknown; path: PathStep[]; count: number }
  >();

  look(owner: FieldOwner, record: unknown, path: PathStep[], extras: readonly string[] = []): void {
    if (!isRecord(record)) return;
    for (const key of unknownKeys(owner, record, extras)) {
      const known = this.seen.get(`${owner} ${key}`);
      if (known) known.count += 1;
      else this.seen.set(`${owner} ${key}`, { owner, value: record[key], path: [...path, key], count: 1 });
    }
  }

  lookWithin(
    holder: Owned,
    list: string,
    owner: FieldOwner,
    path: PathStep[],
    extras?: readonly string[],
  ): void {
    const records = holder[list];
    if (!Array.isArray(records)) return;
    for (const [index, record] of records.entries()) this.look(owner, record, [...path, list, index], extras);
  }

  warnings(): Finding[] {
    return [...this.seen.values()].map(({ owner, value, path, count }) => {
      const kind = owner === 'harmonicRow' ? 'harmonic row' : owner;
      const places = count > 1 ? `, in ${count} places` : '';
      const text = `the field "${path.at(-1)}" (${kind}) is not known here${places}; it is kept and takes no part`;
      return findingOf(warningIssue('unknown-field', [], value, text), '', path);
    });
  }
}

/** One warning for each unknown field of each kind of record, at its first place. The data are kept. */
export function unknownFieldWarnings(study: Owned): Finding[] {
  const sightings = new Sightings();
  sightings.look('study', study, [], studyExtras);
  sightings.look('limits', study.limits, ['limits']);
  sightings.look('criteria', study.criteria, ['criteria']);
  sightings.lookWithin(study, 'buses', 'bus', [], ['id']);
  sightings.lookWithin(study, 'spectra', 'spectrum', [], ['id', 'orders']);
  sightings.lookWithin(study, 'cases', 'case', [], ['id', 'changes']);
  sightings.lookWithin(study, 'scans', 'scan', [], ['bus']);
  for (const [index, spectrum] of recordsOf(study.spectra)) {
    sightings.lookWithin(spectrum, 'orders', 'harmonicRow', ['spectra', index]);
  }
  const kinds = new Map<unknown, FieldOwner>();
  for (const [index, element] of recordsOf(study.elements)) {
    const kind = kindOf(element);
    if (!kind) continue;
    kinds.set(element.id, kind);
    lookAtElement(sightings, kind, element, ['elements', index]);
  }
  lookAtChanges(sightings, study, kinds);
  return sightings.warnings();
}

function lookAtElement(sightings: Sightings, kind: FieldOwner, element: Owned, path: PathStep[]): void {
  sightings.look(kind, element, path, ['id', 'kind']);
  sightings.look('controller', element.controller, [...path, 'controller']);
  sightings.lookWithin(element, 'steps', 'step', path);
  sightings.lookWithin(element, 'spectrum', 'harmonicRow', path);
  sightings.lookWithin(element, 'background', 'harmonicRow', path);
}

/** What a case sets is looked at like the element itself: a misspelt field there would change nothing. */
function lookAtChanges(sightings: Sightings, study: Owned, kinds: ReadonlyMap<unknown, FieldOwner>): void {
  for (const [caseIndex, { changes }] of recordsOf(study.cases)) {
    for (const [index, { element, set }] of recordsOf(changes)) {
      const kind = kinds.get(element);
      if (!kind || !isRecord(set)) continue;
      lookAtElement(sightings, kind, set, ['cases', caseIndex, 'changes', index, 'set']);
    }
  }
}

function recordsOf(list: unknown): [number, Owned][] {
  if (!Array.isArray(list)) return [];
  return list.flatMap((record: unknown, index): [number, Owned][] =>
    isRecord(record) ? [[index, record]] : [],
  );
}
