/**
 * How a factorisation without pivoting went. `growth` is the largest ‖·‖_F of a block of L: near 1 for
 * passive networks (times the voltage ratio across a transformer), large when a pivot nearly cancelled.
 * `worstNode` is the node whose elimination caused it. "singular": a pivot vanished or a value is not
 * finite; the factor must not be used. Kernels reuse one outcome object: read it before the next factor.
 */
export interface FactorOutcome {
  status: 'factored' | 'singular';
  growth: number;
  worstNode: number;
}
