/**
 * Symbolic factor of a symmetric pattern on busbars: A = L·D·Lᵀ in a fixed elimination order.
 *
 * Positions count 0 … n − 1 in elimination order, nodes as the caller numbered them. Every block below
 * the diagonal of L, fill included, has an off-diagonal slot; slots of one column are contiguous and
 * their rows ascend. The diagonal slot of a node is its position. A slot holds the block whose row is
 * the later eliminated node; `isTransposed(i, j)` says that this is A_ji and not A_ij.
 */
export interface EliminationPlan {
  nodeCount: number; //        n
  slotCount: number; //        off-diagonal blocks of L, fill included
  order: Int32Array; //        node at each position (size n)
  position: Int32Array; //     position of each node (size n)
  columnStart: Int32Array; //  first slot of each column (size n + 1)
  rowPosition: Int32Array; //  row of each slot, as a position (size slotCount)
  /**
   * Targets of the outer-product updates, column by column: for rows r₀ < r₁ < … of a column and each b,
   * the diagonal position r_b, then the slots of (r_a, r_b) for a = b + 1, b + 2, …
   */
  updateTarget: Int32Array;
  diagonalSlot(node: number): number;
  /** Slot of the pair in either order; RangeError when the pattern has no such pair. */
  offDiagonalSlot(i: number, j: number): number;
  /** Whether the slot of (i, j) holds A_ji, because i is eliminated before j. */
  isTransposed(i: number, j: number): boolean;
}
