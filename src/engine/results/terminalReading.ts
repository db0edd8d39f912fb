import type { CaseSolution, TerminalReading } from '../types.ts';
import { distortion } from './busReading.ts';
import { positiveSequence } from './positiveSequence.ts';

type Three = [number, number, number];

/** Below this many amperes there is no current to speak of. */
const leastAmperes = 1e-6;

/**
 * What a meter at the terminal reads, powers into the element. kW, kvar: phase sums at the fundamental.
 * kVA: Se = 3·Ve·Ie of IEEE 1459-2010 (from memory), three- or four-wire as the terminal is. True power
 * factor P/Se with P over all orders (the fundamental's alone under the summation law); displacement power
 * factor of the positive sequence. Both signed, null below 1e-6 A. RangeError for an unknown terminal.
 */
export function terminalReading(solution: CaseSolution, terminalIndex: number): TerminalReading {
  const terminal = solution.terminals[terminalIndex];
  if (!terminal || !solution.converged)
    throw new RangeError(
      `terminal ${terminalIndex} is not among the ${solution.converged ? solution.terminals.length : 0} solved`,
    );
  const bus = solution.buses.indexOf(terminal.bus);
  const { rmsA, thdPercent } = currents(solution, terminalIndex);
  const neutralRmsA = neutral(solution, terminalIndex);
  const power = powers(solution, bus, terminalIndex);
  const squares = voltageSquares(solution, bus);
  const amps = rmsA[0] ** 2 + rmsA[1] ** 2 + rmsA[2] ** 2;
  const ve = Math.sqrt(terminal.fourWire ? (3 * squares.phase + squares.line) / 18 : squares.line / 9);
  const ie = Math.sqrt((terminal.fourWire ? amps + neutralRmsA ** 2 : amps) / 3);
  const va = 3 * ve * ie;
  return {
    rmsA,
    neutralRmsA,
    thdPercent,
    kW: power.fundamental / 1e3,
    kvar: power.reactive / 1e3,
    kVA: va / 1e3,
    displacementPF: displacement(solution, bus, terminalIndex),
    truePF:
      ie >= leastAmperes && va > 0
        ? (solution.summation === 'alpha' ? power.fundamental : power.all) / va
        : null,
  };
}

function currents(solution: CaseSolution, t: number): { rmsA: Three; thdPercent: (number | null)[] } {
  const { maxOrder, current } = solution;
  const rmsA: Three = [0, 0, 0];
  const thdPercent: (number | null)[] = [];
  for (let k = 0; k < 3; k++) {
    let first = 0;
    let harmonics = 0;
    for (let h = 1; h <= maxOrder; h++) {
      const at = (t * maxOrder + h - 1) * 3 + k;
      const square = current.re[at]! ** 2 + current.im[at]! ** 2;
      if (h === 1) first = square;
      else harmonics += square;
    }
    rmsA[k] = Math.sqrt(first + harmonics);
    thdPercent.push(distortion(first, harmonics, leastAmperes));
  }
  return { rmsA, thdPercent };
}

function neutral({ maxOrder, neutralCurrent }: CaseSolution, t: number): number {
  let sum = 0;
  for (let at = t * maxOrder; at < (t + 1) * maxOrder; at++) sum += neutralCurrent[at]! ** 2;
  return Math.sqrt(sum);
}

/** Σ of squares over phases and orders: phase-to-neutral and line-to-line volts. */
function voltageSquares(solution: CaseSolution, bus: number): { phase: number; line: number } {
  const { maxOrder, voltage, lineVoltage } = solution;
  let phase = 0;
  let line = 0;
  for (let at = bus * maxOrder * 3; at < (bus + 1) * maxOrder * 3; at++) {
    phase += voltage.re[at]! ** 2 + voltage.im[at]! ** 2;
    line += lineVoltage[at]! ** 2;
  }
  return { phase, line };
}

/** Watts and vars: P and Q of the fundamental, P over all orders. */
function powers(
  { maxOrder, voltage: v, current: i }: CaseSolution,
  bus: number,
  t: number,
): { fundamental: number; reactive: number; all: number } {
  const sum = { fundamental: 0, reactive: 0, all: 0 };
  for (let c = 0; c < 3 * maxOrder; c++) {
    const a = bus * maxOrder * 3 + c;
    const b = t * maxOrder * 3 + c;
    const watts = v.re[a]! * i.re[b]! + v.im[a]! * i.im[b]!;
    sum.all += watts;
    if (c >= 3) continue;
    sum.fundamental += watts;
    sum.reactive += v.im[a]! * i.re[b]! - v.re[a]! * i.im[b]!;
  }
  return sum;
}

/** Re(V⁺·conj(I⁺))/|V⁺·I⁺| at the fundamental. */
function displacement({ maxOrder, voltage, current }: CaseSolution, bus: number, t: number): number | null {
  const v = positiveSequence(voltage, bus * maxOrder * 3);
  const i = positiveSequence(current, t * maxOrder * 3);
  const size = v.abs() * i.abs();
  return i.abs() >= leastAmperes && size > 0 ? v.mul(i.conjugate()).re / size : null;
}
