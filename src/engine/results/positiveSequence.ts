import { Complex } from 'complex.js';
import type { ComplexArray } from '../types.ts';

const a = new Complex(-0.5, Math.sqrt(3) / 2);

/** V⁺ = (V_L1 + a·V_L2 + a²·V_L3)/3 of three phases standing at `at`, a = 1∠120°. */
export function positiveSequence(phasors: ComplexArray, at: number): Complex {
  const phase = (k: number): Complex => new Complex(phasors.re[at + k] ?? 0, phasors.im[at + k] ?? 0);
  return phase(0)
    .add(phase(1).mul(a))
    .add(phase(2).mul(a.mul(a)))
    .div(3);
}
