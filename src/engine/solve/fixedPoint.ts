import type { Network } from '../network/Network.ts';
import { demandCurrents } from './demandCurrents.ts';
import type { OrderSolver } from './OrderSolver.ts';
import { injectionsOf } from './sourceCurrents.ts';

export interface FixedPointOutcome {
  converged: boolean;
  rounds: number;
}

const tolerance = 1e-12;
const acceptable = 1e-10;
const roundLimit = 100;

/**
 * V ← Y⁻¹·(I_sources − I_demand(V)) with the one factorisation, from the voltages standing in `v`, until
 * max|ΔV|/(nominalV/√3) < 1e-12, or it no longer decreases and is below 1e-10; at most 100 rounds.
 * `own` holds the sources' Norton currents and receives the demands' currents at the last `v`.
 */
export function iterateDemands(
  network: Network,
  solver: OrderSolver,
  v: Float64Array,
  own: Float64Array,
): FixedPointOutcome {
  const next = new Float64Array(v.length);
  let before = Number.POSITIVE_INFINITY;
  for (let round = 1; round <= roundLimit; round++) {
    demandCurrents(network, v, own);
    injectionsOf(network, own, next);
    solver.solve(next);
    const change = largestChange(network, v, next);
    if (!Number.isFinite(change)) return { converged: false, rounds: round };
    v.set(next);
    if (change < tolerance || (change >= before && change < acceptable)) {
      demandCurrents(network, v, own);
      return { converged: true, rounds: round };
    }
    before = change;
  }
  return { converged: false, rounds: roundLimit };
}

/** max|ΔV|/(nominalV/√3) over nodes and phases. */
export function largestChange(network: Network, from: Float64Array, to: Float64Array): number {
  let largest = 0;
  for (let node = 0; node < network.nodeCount; node++) {
    const base = phaseVolts(network, node);
    for (let c = 6 * node; c < 6 * node + 6; c += 2) {
      const change = Math.hypot(to[c]! - from[c]!, to[c + 1]! - from[c + 1]!) / base;
      if (!(change <= largest)) largest = change;
    }
  }
  return largest;
}

/** Nominal phase-to-neutral volts of a node. */
export function phaseVolts({ buses, busOfNode }: Network, node: number): number {
  return (buses[busOfNode[node]!]?.nominalV ?? Number.NaN) / Math.sqrt(3);
}
