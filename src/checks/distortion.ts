import type { Bus } from '../study/index.ts';
import type { SolvedCase } from './SolvedCase.ts';

/** A busbar's harmonic voltages in per cent of U_1, each order in the phase where it is largest. */
export interface BusSpectrum {
  /** Index h − 1; entry 0 (h = 1) is unused. */
  percent: number[];
  phase: number[];
}

const spectra = new WeakMap<SolvedCase, Map<string, BusSpectrum | null>>();

/** U_h/U_1 per order, worst phase; null where U_1 is below 1e-6 of nominal. Remembered per solved case. */
export function busSpectrum(solved: SolvedCase, bus: Bus): BusSpectrum | null {
  const known = spectra.get(solved) ?? new Map<string, BusSpectrum | null>();
  spectra.set(solved, known);
  const found = known.get(bus.id);
  if (found !== undefined) return found;
  const spectrum = measure(solved, bus);
  known.set(bus.id, spectrum);
  return spectrum;
}

function measure(solved: SolvedCase, bus: Bus): BusSpectrum | null {
  const index = solved.bus(bus.id);
  const floor = (1e-6 * bus.nominalV) / Math.sqrt(3);
  // Plain arrays: many short typed arrays cost the collector more than the sums they hold.
  const percent = new Array<number>(solved.maxOrder).fill(0);
  const phase = new Array<number>(solved.maxOrder).fill(0);
  let carried = false;
  for (let k = 0; k < 3; k++) {
    const fundamental = solved.volts(index, 1, k);
    if (fundamental < floor) continue;
    carried = true;
    for (let h = 2; h <= solved.maxOrder; h++) {
      const share = (solved.volts(index, h, k) / fundamental) * 100;
      if (share <= (percent[h - 1] ?? 0)) continue;
      percent[h - 1] = share;
      phase[h - 1] = k;
    }
  }
  return carried ? { percent, phase } : null;
}

/** U_h in per cent of U_1 of the phase where it is largest; null where U_1 is below 1e-6 of nominal. */
export function orderPercent(solved: SolvedCase, bus: Bus, h: number): number | null {
  return busSpectrum(solved, bus)?.percent[h - 1] ?? null;
}

export interface Thd {
  percent: number;
  phase: number;
  harmonicV: number;
  fundamentalV: number;
}

/** THD(U) = √(Σ_{h=2}^{toOrder} U_h²)/U_1 in per cent, worst phase; null where U_1 is below 1e-6 of nominal. */
export function thdPercent(solved: SolvedCase, bus: Bus, toOrder: number): Thd | null {
  const index = solved.bus(bus.id);
  const floor = (1e-6 * bus.nominalV) / Math.sqrt(3);
  const last = Math.min(toOrder, solved.maxOrder);
  let worst: Thd | null = null;
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
  const spectrum = busSpectrum(solved, bus);
  const orders: number[] = [];
  if (!spectrum) return orders;
  for (let h = 2; h <= solved.maxOrder; h++) {
    if (solved.anglesUnknown(h) && (spectrum.percent[h - 1] ?? 0) > 1e-6) orders.push(h);
  }
  return orders;
}

/** The sentences said wherever magnitudes were added for want of angles; none where none were. */
export function angleRemarks(solved: SolvedCase, orders: readonly number[]): string[] {
  if (solved.solution.summation === 'alpha') {
    return ['Sources are added by the IEC 61000-3-6 summation law, as the study chooses.'];
  }
  if (orders.length === 0) return [];
  const shown = orders.slice(0, 8).join(', ');
  const more = orders.length > 8 ? ' and higher' : '';
  return [
    `Angles between sources are unknown at ${orders.length === 1 ? 'order' : 'orders'} ${shown}${more}; they are added by magnitude (the safe side).`,
  ];
}
