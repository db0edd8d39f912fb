import type { Role } from '../network/Network.ts';

/** Zero, positive and negative sequence. */
export type SequenceNumber = 0 | 1 | 2;

/** What gave the factor in use; see the kernel's guarded solver. */
export type FactorMethod = 'direct' | 'refined' | 'rerooted' | 'pivoted';

/**
 * Solves Y(h)·V = I of one network, order by order. Vectors are interleaved complex, six numbers a node
 * (L1, L2, L3). A sequence solver answers for the one sequence it was prepared for.
 */
export interface OrderSolver {
  /** How the order prepared last was factored. */
  readonly method: FactorMethod;
  /**
   * Evaluates the parts at order h, stamps and factors. `sequence` names the one a sequence solver answers
   * for; absent, it is that of a balanced set at integer h. SingularNetworkError where Y(h) has no inverse.
   */
  prepare(h: number, role: Role, sequence?: SequenceNumber): void;
  /** Amperes injected at the nodes, in place, into volts. */
  solve(x: Float64Array): void;
}

/** The network has no solution at this order: its admittance matrix is singular. */
export class SingularNetworkError extends Error {
  constructor(readonly order: number) {
    super(`the network has no solution at order ${order}: its admittances cancel exactly or are not finite`);
  }
}
