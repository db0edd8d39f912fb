import type { KernelMatrix } from './KernelMatrix.ts';

/**
 * The stamping and solving surface that BlockLdl and BlockLu share, so that one list of stamps fills
 * either. Offsets belong to the class: ask each matrix for its own. Conventions are BlockLdl's. Numbers
 * come in typed arrays: as arguments of a call that is not inlined each would be boxed, per part and order.
 */
export interface BlockMatrix extends KernelMatrix {
  readonly blockSize: 3;
  addDiagonalBlock(node: number, re9: ArrayLike<number>, im9: ArrayLike<number>): void;
  addOffDiagonalBlock(i: number, j: number, re9: ArrayLike<number>, im9: ArrayLike<number>): void;
  /** Diagonal block += self on the diagonal, mutual off it; `entries` = self re, im, mutual re, im. */
  addBalancedDiagonal(offset: number, entries: Float64Array): void;
  /** Off-diagonal block += the circulant with first row `row` = c₀ re, im, c₁ re, im, c₂ re, im. */
  addCirculantOffDiagonal(offset: number, turned: boolean, row: Float64Array): void;
}
