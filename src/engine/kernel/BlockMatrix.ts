import type { EliminationPlan } from './EliminationPlan.ts';
import type { FactorOutcome } from './FactorOutcome.ts';
import type { EntrySource } from './PivotedLu.ts';

/**
 * The stamping and solving surface that BlockLdl and BlockLu share, so that one list of stamps fills
 * either. Offsets belong to the class: ask each matrix for its own. Conventions are BlockLdl's.
 */
export interface BlockMatrix extends EntrySource {
  readonly blockSize: 3;
  readonly plan: EliminationPlan;
  readonly values: Float64Array;
  diagonalOffset(node: number): number;
  offDiagonalOffset(i: number, j: number): number;
  clear(): void;
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
  factor(): FactorOutcome;
  solve(x: Float64Array, count?: number): void;
  lastSolve(x: Float64Array, offset?: number): void;
}
