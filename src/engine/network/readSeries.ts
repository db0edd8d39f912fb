import type { Resolved, ResolvedElement } from '../../study/index.ts';
import { cableLaw } from '../models/cable.ts';
import { couplerLaw } from '../models/coupler.ts';
import { branchLaw } from '../models/freeRLC.ts';
import type { PartLaw } from '../models/PartLaw.ts';
import { reactorLaw } from '../models/reactor.ts';
import { transformerLaw } from '../models/transformer.ts';
import { windingOf } from '../models/vectorGroup.ts';

export type ResolvedSeries = Extract<
  ResolvedElement,
  { kind: 'transformer' | 'cable' | 'reactor' | 'coupler' | 'branch' }
>;

/** Admittance law of a series part; `omega` = 2π·fn. */
export function seriesLaw(part: ResolvedSeries, omega: number): PartLaw {
  switch (part.kind) {
    case 'transformer':
      return transformerLaw({ ...part, z0OverZ1: zeroRatio(part) });
    case 'cable':
      return cableLaw(part, omega);
    case 'reactor':
      return reactorLaw(part, omega);
    case 'coupler':
      return couplerLaw(part);
    case 'branch':
      return branchLaw(part, omega);
  }
}

/** Hours of a series part: a transformer's clock number, else 0. */
export function clockOf(part: ResolvedSeries): number {
  return part.kind === 'transformer' ? windingOf(part.vectorGroup).clock : 0;
}

/** Whether IEEE 1459's four-wire formulas apply at [from, to]. */
export function fourWireEnds(part: ResolvedSeries): [boolean, boolean] {
  if (part.kind !== 'transformer') return [true, true];
  const group = part.vectorGroup.replace(/\d+$/, '');
  return [group === 'YNyn' || group === 'YNd', group.endsWith('n')];
}

function zeroRatio(part: Resolved<'transformer'>): number {
  if (part.z0OverZ1 !== undefined) return part.z0OverZ1;
  if (/^Yyn\d/.test(part.vectorGroup))
    throw new RangeError(`transformer "${part.id}" (Yyn) needs z0OverZ1: it depends on the core`);
  return 1;
}
