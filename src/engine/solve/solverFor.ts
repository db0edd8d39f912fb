import type { Network } from '../network/Network.ts';
import type { OrderSolver } from './OrderSolver.ts';
import { PhaseSolver } from './PhaseSolver.ts';
import { SequenceSolver } from './SequenceSolver.ts';

const solvers = new WeakMap<Network, Partial<Record<'phase' | 'sequence', OrderSolver>>>();

/**
 * The solver of a network, kept with it: decoupled sequence networks where everything in service is
 * balanced, phase coordinates otherwise or when asked for.
 */
export function solverFor(network: Network, coordinates: 'auto' | 'phase' = 'auto'): OrderSolver {
  const kept = solvers.get(network) ?? {};
  solvers.set(network, kept);
  if (coordinates === 'auto' && network.balanced) {
    kept.sequence ??= new SequenceSolver(network);
    return kept.sequence;
  }
  kept.phase ??= new PhaseSolver(network);
  return kept.phase;
}
