import type { Network } from '../network/Network.ts';
import { labelOf } from '../network/networkWarnings.ts';
import { continueFromNoLoad } from './continueFromNoLoad.ts';
import { iterateDemands } from './fixedPoint.ts';
import type { OrderSolver } from './OrderSolver.ts';
import { emfCurrent, injectionsOf } from './sourceCurrents.ts';

export interface Fundamental {
  /** Node voltages, six numbers a node, volts phase-to-neutral. */
  v: Float64Array;
  /** Source and demand currents INTO the shunt parts, six numbers a part: −Y·E, or the constant power's. */
  own: Float64Array;
  iterations: number;
  /** Why there is no solution; the voltages are then worthless. */
  error: string | null;
}

/**
 * Node voltages at h = 1: sources as Norton equivalents, constant-power parts by fixed point from the
 * network's voltages without them; where that gives up, Newton continued from no load, so that the answer
 * is always the upper voltage. Leaves the solver prepared at the fundamental.
 */
export function solveFundamental(network: Network, solver: OrderSolver): Fundamental {
  const v = new Float64Array(6 * network.nodeCount);
  const own = new Float64Array(6 * network.shunts.length);
  solver.prepare(1, 'fundamental');
  network.shunts.forEach((part, k) => {
    if (part.emf && part.node >= 0)
      emfCurrent(network, part, 1, part.emf.volts, part.emf.angleRad, own, 6 * k);
  });
  injectionsOf(network, own, v);
  solver.solve(v);
  if (!network.shunts.some(({ demand, node }) => demand && node >= 0))
    return { v, own, iterations: 0, error: null };
  const noLoad = v.slice();
  const { converged, rounds } = iterateDemands(network, solver, v, own);
  if (converged) return { v, own, iterations: rounds, error: null };
  const continued = continueFromNoLoad(network, noLoad, own);
  const iterations = rounds + continued.steps;
  if (continued.converged) return { v: continued.v, own, iterations, error: null };
  return {
    v,
    own,
    iterations,
    error: collapseMessage(network, continued.share, continued.worstNode, continued.v),
  };
}

function collapseMessage(network: Network, share: number, node: number, v: Float64Array): string {
  const bus = network.buses[network.busOfNode[node] ?? -1];
  const lowest = Math.min(
    ...[0, 2, 4].map((c) => Math.hypot(v[6 * node + c] ?? 0, v[6 * node + c + 1] ?? 0)),
  );
  const percent = (100 * lowest * Math.sqrt(3)) / (bus?.nominalV ?? Number.NaN);
  return (
    `demand exceeds what the network can carry: no voltage holds beyond about ${(100 * share).toFixed(1)} % of it; ` +
    `worst at bus ${bus ? labelOf(bus) : '?'}, down to ${percent.toFixed(0)} % of nominal there`
  );
}
