import type { CaseSolution } from '../engine/index.ts';
import type { Study } from '../study/index.ts';
import { busById } from '../study/index.ts';
import { orderPercent } from './distortion.ts';
import { voltageSetFor } from './limits/choice.ts';
import { voltageLimit } from './limits/voltageLimit.ts';
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
 * judge, beside the limit of the set that judges this busbar. Empty for a case without a solution.
 */
export function orderTable(study: Study, solution: CaseSolution, busId: string): OrderRow[] {
  const bus = busById(study, busId);
  if (!bus) throw new RangeError(`the study has no busbar "${busId}"`);
  if (!solution.converged) return [];
  return orderRows(study, new SolvedCase(solution), busId, pccBusesOf(study).has(busId));
}

/** orderTable for a case already prepared. */
export function orderRows(study: Study, solved: SolvedCase, busId: string, isPcc: boolean): OrderRow[] {
  const bus = busById(study, busId);
  if (!bus) throw new RangeError(`the study has no busbar "${busId}"`);
  const choice = voltageSetFor(study, isPcc);
  const rows: OrderRow[] = [];
  for (let h = 2; h <= solved.maxOrder; h++) {
    const limit = 'set' in choice ? voltageLimit(choice.set, h, bus.nominalV) : null;
    rows.push({
      h,
      percent: orderPercent(solved, bus, h)?.percent ?? null,
      limit: limit?.value ?? null,
      source: limit?.source ?? null,
    });
  }
  return rows;
}
