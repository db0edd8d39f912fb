import type { Role } from '../network/Network.ts';

/** Zero, positive and negative sequence. */
export type SequenceNumber = 0 | 1 | 2;

/**
 * Solves Y(h)·V = I of one network, order by order. Vectors are interleaved complex, six numbers a node
 * (L1, L2, L3). A sequence solver answers for the one sequence it was prepared for.
 */
export interface OrderSolver {
  /** Evaluates the parts at order h, stamps and factors. */
  prepare(h: number, role: Role): void;
  /** Amperes injected at the nodes, in place, into volts. */
  solve(x: Float64Array): void;
}

/** Largest ‖L‖ of a factor without pivoting that is trusted; beyond, the pivoted LU takes over. */
export const trustedGrowth = 1e6;

/** The network has no solution at this order: its admittance matrix is singular. */
export class SingularNetworkError extends Error {
  constructor(readonly order: number) {
    super(`the network has no solution at order ${order}: its admittances cancel exactly`);
  }
}
