import { type EliminationPlan, planElimination } from '../kernel/index.ts';
import type { Network } from '../network/Network.ts';

const kept = new Map<string, EliminationPlan>();
const keptLimit = 64;

/**
 * Elimination plan of a network's topology, `lastNode` eliminated last. Kept by pattern, so value edits,
 * cases and frequencies of one topology share it; the oldest of many is forgotten.
 */
export function planFor(network: Network, lastNode?: number): EliminationPlan {
  const key = `${network.nodeCount};${lastNode ?? ''};${network.edges.join()}`;
  const known = kept.get(key);
  if (known) return known;
  const plan = planElimination(network.nodeCount, network.edges, lastNode);
  const oldest = kept.keys().next().value;
  if (kept.size >= keptLimit && oldest !== undefined) kept.delete(oldest);
  kept.set(key, plan);
  return plan;
}
