import type { FieldOwner } from '../fields/fieldsOf.ts';
import type { Finding } from '../types.ts';
import { kindOf } from './elementIssues.ts';
import { findingOf, isRecord, type PathStep, warningIssue } from './issue.ts';
import { unknownKeys } from './shapeIssues.ts';

interface Sighting {
  owner: string;
  key: string;
  value: unknown;
  path: PathStep[];
  count: number;
}

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

/** One warning for each unknown field of each kind of record, at its first place. The data are kept. */
export function unknownFieldWarnings(study: Record<string, unknown>): Finding[] {
  const sightings = new Map<string, Sighting>();
  const look = (owner: FieldOwner, record: unknown, path: PathStep[], extras: readonly string[]) => {
    if (!isRecord(record)) return;
    for (const key of unknownKeys(owner, record, extras)) {
      const name = `${owner} ${key}`;
      const seen = sightings.get(name);
      if (seen) seen.count += 1;
      else sightings.set(name, { owner, key, value: record[key], path: [...path, key], count: 1 });
    }
  };
  const each = (name: string, visit: (record: unknown, path: PathStep[]) => void) => {
    const list = study[name];
    if (!Array.isArray(list)) return;
    for (const [index, record] of list.entries()) visit(record, [name, index]);
  };
  look('study', study, [], studyExtras);
  look('limits', study.limits, ['limits'], []);
  look('criteria', study.criteria, ['criteria'], []);
  each('buses', (record, path) => look('bus', record, path, ['id']));
  each('spectra', (record, path) => look('spectrum', record, path, ['id', 'orders']));
  each('cases', (record, path) => look('case', record, path, ['id', 'changes']));
  each('scans', (record, path) => look('scan', record, path, ['bus']));
  each('elements', (record, path) => {
    const kind = kindOf(record);
    if (kind) look(kind, record, path, ['id', 'kind']);
  });
  return [...sightings.values()].map(({ owner, key, value, path, count }) => {
    const places = count > 1 ? `, in ${count} places` : '';
    return findingOf(
      warningIssue(
        'unknown-field',
        [],
        value,
        `the field "${key}" of ${owner} is not known here${places}; it is kept and takes no part`,
      ),
      '',
      path,
    );
  });
}
