import type { Bus } from '../study/index.ts';
import type { SolvedCase } from './SolvedCase.ts';

/** U_h in per cent of U_1 of the phase where it is largest; null where U_1 is below 1e-6 of nominal. */
export function orderPercent(
  solved: SolvedCase,
  bus: Bus,
  h: number,
): { percent: number; phase: number } | null {
  const index = solved.bus(bus.id);
  const floor = (1e-6 * bus.nominalV) / Math.sqrt(3);
  let worst: { percent: number; phase: number } | null = null;
  for (let phase = 0; phase < 3; phase++) {
    const fundamental = solved.volts(index, 1, phase);
    if (fundamental < floor) continue;
    const percent = (solved.volts(index, h, phase) / fundamental) * 100;
    if (!worst || percent > worst.percent) worst = { percent, phase };
  }
  return worst;
}

/** THD(U) = √(Σ_{h=2}^{toOrder} U_h²)/U_1 in per cent, worst phase; null where U_1 is below 1e-6 of nominal. */
export function thdPercent(
  solved: SolvedCase,
  bus: Bus,
  toOrder: number,
): { percent: number; phase: number; harmonicV: number; fundamentalV: number } | null {
  const index = solved.bus(bus.id);
  const floor = (1e-6 * bus.nominalV) / Math.sqrt(3);
  const last = Math.min(toOrder, solved.maxOrder);
  let worst: ReturnType<typeof thdPercent> = null;
  for (let phase = 0; phase < 3; phase++) {
    const fundamentalV = solved.volts(index, 1, phase);
    if (fundamentalV < floor) continue;
    let sum = 0;
    for (let h = 2; h <= last; h++) sum += solved.volts(index, h, phase) ** 2;
    const harmonicV = Math.sqrt(sum);
    const percent = (harmonicV / fundamentalV) * 100;
    if (!worst || percent > worst.percent) worst = { percent, phase, harmonicV, fundamentalV };
  }
  return worst;
}

/** Orders at which a busbar carries voltage and source groups of unknown mutual phase were added. */
export function unknownAngleOrders(solved: SolvedCase, bus: Bus): number[] {
  const orders: number[] = [];
  for (let h = 2; h <= solved.maxOrder; h++) {
    if (solved.anglesUnknown(h) && (orderPercent(solved, bus, h)?.percent ?? 0) > 1e-6) orders.push(h);
  }
  return orders;
}

/** The sentence said wherever magnitudes of unknown mutual phase were added; "" where none were. */
export function angleRemark(solved: SolvedCase, orders: readonly number[]): string {
  if (solved.solution.summation === 'alpha') {
    return 'Sources are added by the IEC 61000-3-6 summation law, as the study chooses.';
  }
  if (orders.length === 0) return '';
  const shown = orders.slice(0, 8).join(', ');
  const more = orders.length > 8 ? ' and higher' : '';
  return `Angles between sources are unknown at ${orders.length === 1 ? 'order' : 'orders'} ${shown}${more}; they are added by magnitude (the safe side).`;
}
