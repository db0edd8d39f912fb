import { fieldOf } from './fields/fieldsOf.ts';
import { busById, elementById } from './lookup.ts';
import type { Bus, DataOrigin, Study, StudyElement } from './types.ts';

/** A value that is not the site's own: typical of its kind, or assumed. */
export interface Assumption {
  /** Key in `study.origins`. */
  path: string;
  /** The part or busbar it belongs to; null for the study as a whole. */
  owner: StudyElement | Bus | null;
  /** Key of the field. */
  key: string;
  /** Trade words of the field: "load loss P_k". */
  label: string;
  /** The value as the study holds it; undefined where nothing stands there. */
  value: unknown;
  unit: string;
  origin: DataOrigin & { origin: 'typical' | 'assumed' };
}

/**
 * Everything a study takes as typical or assumed, read from its origins: parts in their order, then busbars,
 * then the study itself. An origin of something that is gone is left out.
 */
export function assumptionsOf(study: Study): Assumption[] {
  const found = Object.entries(study.origins ?? {}).flatMap(([path, origin]) => {
    if (origin.origin !== 'typical' && origin.origin !== 'assumed') return [];
    const assumption = assumptionAt(study, path, { ...origin, origin: origin.origin });
    return assumption ? [assumption] : [];
  });
  const place = new Map([...study.elements, ...study.buses].map((owner, index) => [owner, index] as const));
  const rank = ({ owner }: Assumption): number => (owner && place.get(owner)) ?? place.size;
  return found.toSorted((a, b) => rank(a) - rank(b));
}

function assumptionAt(study: Study, path: string, origin: Assumption['origin']): Assumption | null {
  const [, list, id = '', key = ''] = /^(elements|buses)\.(.+)\.([^.]+)$/.exec(path) ?? [];
  if (list === undefined) {
    const field = fieldOf('study', path);
    const value = new Map<string, unknown>(Object.entries(study)).get(path);
    return { path, owner: null, key: path, label: field?.label ?? path, value, unit: '', origin };
  }
  const owner = list === 'elements' ? elementById(study, id) : busById(study, id);
  if (!owner) return null;
  const field = fieldOf('kind' in owner ? owner.kind : 'bus', key);
  const value = new Map<string, unknown>(Object.entries(owner)).get(key);
  return {
    path,
    owner,
    key,
    label: field?.label ?? key,
    value,
    unit: field && 'unit' in field ? field.unit : '',
    origin,
  };
}
