import type { KernelMatrix } from './KernelMatrix.ts';

/**
 * The stamping and solving surface that BlockLdl and BlockLu share, so that one list of stamps fills
 * either. Offsets belong to the class: ask each matrix for its own. Conventions are BlockLdl's.
 */
export interface BlockMatrix extends KernelMatrix {
  readonly blockSize: 3;
  addDiagonalBlock(node: number, re9: ArrayLike<number>, im9: ArrayLike<number>): void;
  addOffDiagonalBlock(i: number, j: number, re9: ArrayLike<number>, im9: ArrayLike<number>): void;
  addBalancedDiagonal(
    offset: number,
    selfRe: number,
    selfIm: number,
    mutualRe: number,
    mutualIm: number,
  ): void;
  addBalancedOffDiagonal(
    offset: number,
    selfRe: number,
    selfIm: number,
    mutualRe: number,
    mutualIm: number,
  ): void;
  addCirculantOffDiagonal(
    offset: number,
    turned: boolean,
    re0: number,
    im0: number,
    re1: number,
    im1: number,
    re2: number,
    im2: number,
  ): void;
}
