import { busSubject, partSubject, type Subject } from '../../drawing/index.ts';
import type { Study } from '../../study/index.ts';

/**
 * The part or busbar a finding's JSON path leads to, e.g. "$.elements[3].ukPercent" to "element:t1"; null
 * where it speaks of the study as a whole.
 */
export function findingSubject(study: Study, path: string): Subject | null {
  const [, list, at] = /^\$\.(elements|buses)\[(\d+)\]/.exec(path) ?? [];
  if (list === undefined) return null;
  const item = study[list === 'buses' ? 'buses' : 'elements'][Number(at)];
  if (!item) return null;
  return list === 'buses' ? busSubject(item.id) : partSubject(item.id);
}
