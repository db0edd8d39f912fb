import type { Bank, Bus } from '../study/index.ts';
import { busById } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { kvarOn } from './correctionBranch.ts';
import { voltageSetFor } from './limits/choice.ts';
import { iec61000x2x4 } from './limits/iec61000-2-4.ts';
import { limitsByOrder } from './limits/limitsByOrder.ts';
import type { LimitSet } from './limits/types.ts';
import type { SolvedCase } from './SolvedCase.ts';

/** Positive- and negative-sequence content meets positive-sequence peaks, zero-sequence content the zero ones. */
export type Content = 'positive' | 'zero';

/**
 * Content of a busbar's voltage at an order, volts phase-to-neutral: "positive" is √(V1² + V2²), from the
 * line voltages Σ U_ij²/9; "zero" is |V0| = √(3·Σ V_k² − Σ U_ij²)/3. Both hold for magnitudes alone.
 */
export function contentVolts(solved: SolvedCase, bus: number, h: number, content: Content): number {
  let phases = 0;
  let lines = 0;
  for (let k = 0; k < 3; k++) {
    phases += solved.volts(bus, h, k) ** 2;
    lines += solved.lineVolts(bus, h, k) ** 2;
  }
  return content === 'positive' ? Math.sqrt(lines) / 3 : Math.sqrt(Math.max(0, 3 * phases - lines)) / 3;
}

/** Measures presence where the chosen set holds no harmonic limits: an order does not vanish with its limit. */
const fallback: LimitSet = iec61000x2x4[1] as LimitSet;

/**
 * Orders that count at a busbar whatever hangs there: without the correction U_h ≥ 0.1 × its limit (the share
 * settable). Ascending. A branch must be tuned below these; a trace that only its current tells does not bind.
 */
export function significantOrders(context: CheckContext, bus: Bus, content: Content): number[] {
  const solved = context.without() ?? context.solved;
  const choice = voltageSetFor(context.study, context.pccBuses.has(bus.id));
  if (!solved.energised(bus.id)) return [];
  const measure = limitsByOrder('set' in choice && choice.set.voltage ? choice.set : fallback, bus.nominalV);
  const index = solved.bus(bus.id);
  const fundamental = contentVolts(solved, index, 1, 'positive');
  if (fundamental <= 0) return [];
  const orders: number[] = [];
  for (let h = 2; h <= solved.maxOrder; h++) {
    const limit = measure[h - 2];
    const percent = (contentVolts(solved, index, h, content) / fundamental) * 100;
    if (limit && percent >= context.presence.voltageShareOfLimit * limit.value) orders.push(h);
  }
  return orders;
}

function presentByCurrent(context: CheckContext, bank: Bank, content: Content): number[] {
  const { solved } = context;
  const terminal = solved.terminal(bank.id, bank.bus);
  const ratedA = (kvarOn(bank) * 1000) / (Math.sqrt(3) * bank.ratedV);
  if (terminal === undefined || ratedA <= 0) return [];
  const orders: number[] = [];
  for (let h = 2; h <= solved.maxOrder; h++) {
    const zero = solved.neutralAmperes(terminal, h) / 3;
    const squares = [0, 1, 2].reduce((sum, k) => sum + solved.amperes(terminal, h, k) ** 2, 0) / 3;
    const amperes = content === 'zero' ? zero : Math.sqrt(Math.max(0, squares - zero ** 2));
    if (amperes >= context.presence.currentShareOfRated * ratedA) orders.push(h);
  }
  return orders;
}

/**
 * Orders present at a busbar or bank: without the correction U_h ≥ 0.1 × its limit, or — for a bank —
 * I_h ≥ 0.5 % of its I_N (both shares settable in the context). Ascending.
 */
export function presentOrders(context: CheckContext, busId: string, content: Content, bank?: Bank): number[] {
  const bus = busById(context.study, busId);
  if (!bus) throw new RangeError(`the study has no busbar "${busId}"`);
  const found = new Set(significantOrders(context, bus, content));
  if (bank) for (const h of presentByCurrent(context, bank, content)) found.add(h);
  return [...found].sort((a, b) => a - b);
}
