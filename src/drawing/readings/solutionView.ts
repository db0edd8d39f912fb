import type { CaseSolution } from '../../engine/index.ts';

interface Index {
  terminal: Map<string, number>;
  bus: Map<string, number>;
  deenergised: Set<string>;
}

const indices = new WeakMap<CaseSolution, Index>();

function indexOf(solution: CaseSolution): Index {
  let index = indices.get(solution);
  if (!index) {
    index = {
      terminal: new Map(solution.terminals.map((t, at) => [`${t.element}|${t.bus}`, at])),
      bus: new Map(solution.buses.map((id, at) => [id, at])),
      deenergised: new Set(solution.deenergised),
    };
    indices.set(solution, index);
  }
  return index;
}

export function isDeenergised(solution: CaseSolution, bus: string): boolean {
  return indexOf(solution).deenergised.has(bus);
}

/** Number of the terminal of a part at a busbar, or undefined when the part is out of service. */
export function terminalOf(solution: CaseSolution, element: string, bus: string): number | undefined {
  return indexOf(solution).terminal.get(`${element}|${bus}`);
}

export function busOf(solution: CaseSolution, bus: string): number | undefined {
  return indexOf(solution).bus.get(bus);
}

/** Largest of the three phases' rms current at order h, ampere. */
export function currentAt(solution: CaseSolution, terminal: number, h: number): number {
  const at = (terminal * solution.maxOrder + h - 1) * 3;
  let most = 0;
  for (let k = 0; k < 3; k++) {
    most = Math.max(most, Math.hypot(solution.current.re[at + k] ?? 0, solution.current.im[at + k] ?? 0));
  }
  return most;
}

/** rms over all orders and THD (per unit; null without fundamental), of the phase with the largest rms. */
export function currentRms(solution: CaseSolution, terminal: number): { rms: number; thd: number | null } {
  const { re, im } = solution.current;
  return worstPhase(solution, terminal, (at) => Math.hypot(re[at] ?? 0, im[at] ?? 0), 1e-6);
}

/** rms line-to-line volts over all orders and THD of the phase voltage, worst phase. */
export function voltageRms(solution: CaseSolution, bus: number): { rms: number; thd: number | null } {
  const { re, im } = solution.voltage;
  const pairs = [0, 1, 2].map((k) => {
    let sum = 0;
    for (let h = 1; h <= solution.maxOrder; h++) {
      sum += (solution.lineVoltage[(bus * solution.maxOrder + h - 1) * 3 + k] ?? 0) ** 2;
    }
    return Math.sqrt(sum);
  });
  const { thd } = worstPhase(solution, bus, (at) => Math.hypot(re[at] ?? 0, im[at] ?? 0), 1e-3);
  return { rms: pairs.reduce((sum, pair) => sum + pair, 0) / 3, thd };
}

function worstPhase(solution: CaseSolution, row: number, magnitude: (at: number) => number, least: number) {
  let rms = 0;
  let thd: number | null = null;
  for (let k = 0; k < 3; k++) {
    const fundamental = magnitude(row * solution.maxOrder * 3 + k);
    let rest = 0;
    for (let h = 2; h <= solution.maxOrder; h++) {
      rest += magnitude((row * solution.maxOrder + h - 1) * 3 + k) ** 2;
    }
    rms = Math.max(rms, Math.sqrt(fundamental ** 2 + rest));
    if (fundamental > least) thd = Math.max(thd ?? 0, Math.sqrt(rest) / fundamental);
  }
  return { rms, thd };
}

/** Mean of the three line-to-line voltages at order h, volts. */
export function lineVoltageAt(solution: CaseSolution, bus: number, h: number): number {
  const at = (bus * solution.maxOrder + h - 1) * 3;
  return (
    ((solution.lineVoltage[at] ?? 0) +
      (solution.lineVoltage[at + 1] ?? 0) +
      (solution.lineVoltage[at + 2] ?? 0)) /
    3
  );
}

/** Largest phase voltage at order h over its own phase's fundamental, per unit; null without one. */
export function voltageShare(solution: CaseSolution, bus: number, h: number): number | null {
  const { re, im } = solution.voltage;
  const size = (at: number) => Math.hypot(re[at] ?? 0, im[at] ?? 0);
  let most: number | null = null;
  for (let k = 0; k < 3; k++) {
    const fundamental = size(bus * solution.maxOrder * 3 + k);
    if (fundamental > 1e-3)
      most = Math.max(most ?? 0, size((bus * solution.maxOrder + h - 1) * 3 + k) / fundamental);
  }
  return most;
}

/** Active and apparent power into the part at a terminal at one order: Σ Re(V·I*) and Σ |V|·|I| of the phases. */
export function powerAt(
  solution: CaseSolution,
  terminal: number,
  h: number,
): { watts: number; voltAmperes: number } {
  const { voltage, current, maxOrder } = solution;
  const bus = busOf(solution, solution.terminals[terminal]?.bus ?? '') ?? 0;
  const [v, i] = [(bus * maxOrder + h - 1) * 3, (terminal * maxOrder + h - 1) * 3];
  let [watts, voltAmperes] = [0, 0];
  for (let k = 0; k < 3; k++) {
    const [vr, vi] = [voltage.re[v + k] ?? 0, voltage.im[v + k] ?? 0];
    const [ir, ii] = [current.re[i + k] ?? 0, current.im[i + k] ?? 0];
    watts += vr * ir + vi * ii;
    voltAmperes += Math.hypot(vr, vi) * Math.hypot(ir, ii);
  }
  return { watts, voltAmperes };
}

/** The three phase-to-neutral voltages at order h as [re, im] volts. */
export function phasorsAt(solution: CaseSolution, bus: number, h: number): [number, number][] {
  const at = (bus * solution.maxOrder + h - 1) * 3;
  return [0, 1, 2].map((k) => [solution.voltage.re[at + k] ?? 0, solution.voltage.im[at + k] ?? 0]);
}
