import type { Working } from '../checks/index.ts';
import { figure } from '../checks/index.ts';

export interface KvarInput {
  kW: number;
  /** cos φ1 before, 0 < pf1 ≤ 1, lagging. */
  pf1: number;
  /** cos φ2 wanted, 0 < pf2 ≤ 1, lagging. */
  pf2: number;
}

export interface KvarResult {
  /** Negative where the load already exceeds the target: the surplus. */
  kvar: number;
  tanPhi1: number;
  tanPhi2: number;
  working: Working[];
}

/** tan φ = √(1/cos²φ − 1). RangeError outside 0 < pf ≤ 1. */
export function tanPhi(pf: number): number {
  if (!(pf > 0 && pf <= 1)) throw new RangeError(`power factor ${pf}: above 0 and at most 1 is allowed`);
  return Math.sqrt(1 / pf ** 2 - 1);
}

/**
 * Q = P·(tan φ1 − tan φ2): kvar that brings P kW from cos φ1 to cos φ2, both lagging, at constant kW.
 * (At constant kVA the answer differs: the kW then change too.)
 */
export function kvarForTarget({ kW, pf1, pf2 }: KvarInput): KvarResult {
  if (!(kW >= 0) || !Number.isFinite(kW)) throw new RangeError(`${kW} kW: zero or more is allowed`);
  const tanPhi1 = tanPhi(pf1);
  const tanPhi2 = tanPhi(pf2);
  const kvar = kW * (tanPhi1 - tanPhi2);
  const working: Working[] = [
    {
      equation: 'tan φ = √(1/cos² φ − 1)',
      numbers: `tan φ1 = ${figure(tanPhi1)}, tan φ2 = ${figure(tanPhi2)}`,
    },
    {
      equation: 'Q = P · (tan φ1 − tan φ2)',
      numbers: `${figure(kW)} kW · (${figure(tanPhi1)} − ${figure(tanPhi2)}) = ${figure(kvar)} kvar`,
    },
  ];
  return { kvar, tanPhi1, tanPhi2, working };
}
