import { figure } from '../figure.ts';
import type { LimitSet } from './types.ts';
import { type Limit, voltageLimit } from './voltageLimit.ts';

/** The limit of one order, with its figure as text. */
export interface OrderLimit extends Limit {
  h: number;
  text: string;
}

const remembered = new WeakMap<LimitSet, Map<number, (OrderLimit | null)[]>>();

/** voltageLimit of every order 2…100 at a nominal voltage, index h − 2; remembered per set and voltage. */
export function limitsByOrder(set: LimitSet, nominalV: number): readonly (OrderLimit | null)[] {
  const known = remembered.get(set) ?? new Map<number, (OrderLimit | null)[]>();
  remembered.set(set, known);
  const found = known.get(nominalV);
  if (found) return found;
  const limits = Array.from({ length: 99 }, (_, index) => {
    const limit = voltageLimit(set, index + 2, nominalV);
    return limit ? { ...limit, h: index + 2, text: figure(limit.value, 3) } : null;
  });
  known.set(nominalV, limits);
  return limits;
}
