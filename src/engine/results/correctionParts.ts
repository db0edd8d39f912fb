import type { Study } from '../../study/index.ts';

/** Ids of every bank and filter of the study, in service or not: what "without correction" takes out. */
export function correctionParts(study: Study): Set<string> {
  return new Set(
    study.elements.filter(({ kind }) => kind === 'bank' || kind === 'filter').map(({ id }) => id),
  );
}
