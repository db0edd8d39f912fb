import type { CaseSolution } from '../engine/index.ts';
import type { Study } from '../study/index.ts';
import { busById } from '../study/index.ts';
import { busSpectrum } from './distortion.ts';
import { voltageSetFor } from './limits/choice.ts';
import { limitsByOrder } from './limits/limitsByOrder.ts';
import { pccBusesOf } from './pcc.ts';
import { SolvedCase } from './SolvedCase.ts';
import type { Source } from './types.ts';

/** One order of a busbar's spectrum beside its limit. */
export interface OrderRow {
  h: number;
  /** U_h in per cent of U_1, worst phase; null where the busbar carries no fundamental. */
  percent: number | null;
  /** Per cent of U_1; null where the limit set is silent. */
  limit: number | null;
  source: Source | null;
}

/**
 * U_h in per cent of U_1 for every order 2…maxOrder at a busbar, worst phase, in the magnitudes the checks
 * judge, beside the limit of the set that judges this busbar. Empty for a case without a solution;
 * RangeError for a busbar the study does not have.
 */
export function orderTable(study: Study, solution: CaseSolution, busId: string): OrderRow[] {
  const bus = busById(study, busId);
  if (!bus) throw new RangeError(`the study has no busbar "${busId}"`);
  if (!solution.converged) return [];
  const solved = new SolvedCase(solution);
  const choice = voltageSetFor(study, pccBusesOf(study).has(busId));
  const limits = 'set' in choice ? limitsByOrder(choice.set, bus.nominalV) : [];
  const spectrum = busSpectrum(solved, bus);
  return Array.from({ length: Math.max(0, solved.maxOrder - 1) }, (_, index) => ({
    h: index + 2,
    percent: spectrum?.percent[index + 1] ?? null,
    limit: limits[index]?.value ?? null,
    source: limits[index]?.source ?? null,
  }));
}
