import type { EliminationPlan } from './EliminationPlan.ts';
import type { FactorOutcome } from './FactorOutcome.ts';
import type { EntrySource } from './PivotedLu.ts';

/** What every matrix on a plan can do: be cleared, stamped, factored in place, solved. */
export interface KernelMatrix extends EntrySource {
  readonly blockSize: 1 | 3; // unknowns a node
  readonly plan: EliminationPlan;
  readonly values: Float64Array;
  diagonalOffset(node: number): number;
  offDiagonalOffset(i: number, j: number): number;
  clear(): void;
  setEntry(row: number, column: number, re: number, im: number): void;
  factor(): FactorOutcome;
  solve(x: Float64Array, count?: number): void;
  lastSolve(x: Float64Array, offset?: number): void;
}
