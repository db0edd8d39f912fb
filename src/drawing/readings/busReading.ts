import type { CaseSolution } from '../../engine/index.ts';
import type { Bus } from '../../study/index.ts';
import { liveOhm, livePercent, liveVolts } from './liveNumber.ts';
import { type ReadingMode, readOrder, subscript } from './ReadingMode.ts';
import { busOf, isDeenergised, lineVoltageAt, phasorsAt, voltageRms, voltageShare } from './solutionView.ts';

export interface BusReading {
  /** Volts, or the share of an order; '' while there is no solution. */
  text: string;
  /** A second figure for the tooltip and screen readers. */
  more: string;
  deenergised: boolean;
  /** Unit vectors' lengths of L1 L2 L3: 1 is nominal at the fundamental, the largest one at an order. */
  phasors: [number, number][] | null;
}

/** Driving-point impedance at the rail's handle, ohm per phase, bus by bus. */
export interface ImpedanceProbe {
  order: number;
  buses: readonly string[];
  with: { re: ArrayLike<number>; im: ArrayLike<number> };
}

function impedanceAt(bus: string, probe: ImpedanceProbe | null): string {
  const at = probe?.buses.indexOf(bus) ?? -1;
  const re = probe?.with.re[at];
  const im = probe?.with.im[at];
  return re === undefined || im === undefined || !Number.isFinite(re + im) ? '' : liveOhm(Math.hypot(re, im));
}

const NONE: BusReading = { text: '', more: '', deenergised: false, phasors: null };

export function busReading(
  bus: Bus,
  solution: CaseSolution | null,
  mode: ReadingMode,
  handle: number,
  probe: ImpedanceProbe | null = null,
): BusReading {
  if (!solution?.converged) return NONE;
  const at = busOf(solution, bus.id);
  if (at === undefined) return NONE;
  if (isDeenergised(solution, bus.id)) return { ...NONE, text: 'no voltage', deenergised: true };
  const h = mode === 'order' ? readOrder(handle, solution.maxOrder) : 1;
  const phasors = phasorsAt(solution, at, h);
  const largest = Math.max(...phasors.map(([re, im]) => Math.hypot(re, im)));
  const unit = h === 1 ? bus.nominalV / Math.sqrt(3) : largest;
  const scaled = unit > 0 ? phasors.map(([re, im]): [number, number] => [re / unit, im / unit]) : null;
  const rms = voltageRms(solution, at);
  const thd = rms.thd === null ? '' : `THD(U) ${livePercent(rms.thd)}`;
  if (h > 1) {
    const share = voltageShare(solution, at, h);
    const text = share === null ? liveVolts(lineVoltageAt(solution, at, h)) : livePercent(share);
    const ohm = impedanceAt(bus.id, probe);
    const order = `U${subscript(h)} ${text}`;
    return { text: ohm ? `${order} · ${ohm}` : order, more: thd, deenergised: false, phasors: scaled };
  }
  if (mode === 'rms') {
    const text = [liveVolts(rms.rms), thd.replace('(U)', '')].filter(Boolean).join(' · ');
    return { text, more: '', deenergised: false, phasors: scaled };
  }
  return { text: liveVolts(lineVoltageAt(solution, at, 1)), more: thd, deenergised: false, phasors: scaled };
}
