import { Complex } from 'complex.js';
import type { CaseSolution, ComplexArray } from '../types.ts';

/**
 * Phase-to-neutral voltage of a bus at integer order h, phase 0 … 2 (L1 … L3): rms volts, cosine
 * reference. Under the summation law orders above 1 are magnitudes. RangeError outside the solution.
 */
export function voltagePhasor(solution: CaseSolution, busIndex: number, h: number, phase: number): Complex {
  return phasorAt(solution, solution.voltage, busIndex, h, phase);
}

/** Current INTO the element at a terminal, rms amperes; otherwise as voltagePhasor. */
export function currentPhasor(
  solution: CaseSolution,
  terminalIndex: number,
  h: number,
  phase: number,
): Complex {
  return phasorAt(solution, solution.current, terminalIndex, h, phase);
}

function phasorAt(
  { maxOrder }: CaseSolution,
  array: ComplexArray,
  row: number,
  h: number,
  phase: number,
): Complex {
  if (!(Number.isInteger(h) && h >= 1 && h <= maxOrder))
    throw new RangeError(`order ${h} is outside 1 … ${maxOrder}`);
  if (phase !== 0 && phase !== 1 && phase !== 2) throw new RangeError(`phase ${phase} is outside 0 … 2`);
  const at = (row * maxOrder + h - 1) * 3 + phase;
  const re = array.re[at];
  const im = array.im[at];
  if (re === undefined || im === undefined) throw new RangeError(`no row ${row} in the solution`);
  return new Complex(re, im);
}
