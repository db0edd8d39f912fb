import type { BlockMatrix } from './BlockMatrix.ts';
import { blockLuFactor, blockLuSolve, luPivotBackward, luPivotForward } from './blockLuFactor.ts';
import type { EliminationPlan } from './EliminationPlan.ts';
import type { FactorOutcome } from './FactorOutcome.ts';
import { updateOffsets } from './updateOffsets.ts';

/**
 * Nodal matrix of a three-phase network that is not reciprocal (at the fundamental a motor conducts in
 * the negative sequence alone, which is not symmetric in phase coordinates), factored as L·D·U on the
 * plan of the symmetric pattern, in place, without pivoting. About twice the work of BlockLdl.
 *
 * `values`: n diagonal blocks of 9 complex row by row at `diagonalOffset(node)`; then per slot two blocks:
 * at `offDiagonalOffset(i, j)` the one of the lower triangle as in BlockLdl, 18 numbers on the transpose
 * of the one opposite. For a reciprocal part both are equal, so every stamp of BlockLdl serves here too;
 * only `addDiagonalBlock` may bring a block that is not symmetric.
 */
export class BlockLu implements BlockMatrix {
  readonly blockSize = 3;
  readonly symmetric = false;
  readonly plan: EliminationPlan;
  readonly values: Float64Array;
  private readonly outcome: FactorOutcome = { status: 'singular', growth: 0, worstNode: 0 };
  private readonly target: Int32Array;

  constructor(plan: EliminationPlan) {
    this.plan = plan;
    this.values = new Float64Array(18 * plan.nodeCount + 36 * plan.slotCount);
    this.target = updateOffsets(plan, 18, 18 * plan.nodeCount, 36);
  }

  diagonalOffset(node: number): number {
    return 18 * this.plan.diagonalSlot(node);
  }

  offDiagonalOffset(i: number, j: number): number {
    return 18 * this.plan.nodeCount + 36 * this.plan.offDiagonalSlot(i, j);
  }

  clear(): void {
    this.values.fill(0);
  }

  /** A_ii += block, 3 × 3 row by row, not necessarily symmetric. */
  addDiagonalBlock(node: number, re9: ArrayLike<number>, im9: ArrayLike<number>): void {
    const offset = this.diagonalOffset(node);
    for (let e = 0; e < 9; e++) this.addAt(offset + 2 * e, re9[e]!, im9[e]!);
  }

  /** A_ij += block and A_ji += blockᵀ. */
  addOffDiagonalBlock(i: number, j: number, re9: ArrayLike<number>, im9: ArrayLike<number>): void {
    const offset = this.offDiagonalOffset(i, j);
    const turned = this.plan.isTransposed(i, j);
    for (let e = 0; e < 9; e++) {
      const place = turned ? (e % 3) * 3 + ((e / 3) | 0) : e;
      this.addTwice(offset + 2 * place, re9[e]!, im9[e]!);
    }
  }

  addBalancedDiagonal(offset: number, entries: Float64Array): void {
    for (let e = 0; e < 9; e++) {
      const part = e % 4 === 0 ? 0 : 2;
      this.addAt(offset + 2 * e, entries[part]!, entries[part + 1]!);
    }
  }

  /** As BlockLdl.addCirculantOffDiagonal, for A_ij and A_ji = A_ijᵀ. */
  addCirculantOffDiagonal(offset: number, turned: boolean, row: Float64Array): void {
    for (let r = 0; r < 3; r++)
      for (let shift = 0; shift < 3; shift++) {
        const c = (r + shift) % 3;
        const e = turned ? 3 * c + r : 3 * r + c;
        this.addTwice(offset + 2 * e, row[2 * shift]!, row[2 * shift + 1]!);
      }
  }

  /** A = L·D·U in place; see FactorOutcome. The outcome object is reused. */
  factor(): FactorOutcome {
    blockLuFactor(this.values, this.target, this.plan, this.outcome);
    return this.outcome;
  }

  /** x ← A⁻¹·x for `count` right-hand sides, laid out as in BlockLdl. */
  solve(x: Float64Array, count = 1): void {
    for (let c = 0; c < count; c++) blockLuSolve(this.values, this.plan, x, 6 * this.plan.nodeCount * c);
  }

  /** x ← Z_kk·x for the last node k of the plan, x three complex at `offset`. */
  lastSolve(x: Float64Array, offset = 0): void {
    const d = 18 * (this.plan.nodeCount - 1);
    luPivotForward(this.values, d, x, offset);
    luPivotBackward(this.values, d, x, offset);
  }

  /** A[row, column] of a pair in the pattern := re + j·im; rows and columns as in forEachEntry. */
  setEntry(row: number, column: number, re: number, im: number): void {
    const i = (row / 3) | 0;
    const j = (column / 3) | 0;
    const turned = i !== j && this.plan.isTransposed(i, j);
    const e = turned ? (column % 3) * 3 + (row % 3) : (row % 3) * 3 + (column % 3);
    const block = i === j ? this.diagonalOffset(i) : this.offDiagonalOffset(i, j) + (turned ? 18 : 0);
    this.values[block + 2 * e] = re;
    this.values[block + 2 * e + 1] = im;
  }

  /** Visits every entry as stamped; rows and columns count 3·node + phase. */
  forEachEntry(visit: (row: number, column: number, re: number, im: number) => void): void {
    const { nodeCount, order, columnStart, rowPosition } = this.plan;
    const v = this.values;
    for (let k = 0; k < nodeCount; k++) {
      const node = 3 * order[k]!;
      for (let e = 0; e < 9; e++) {
        const at = 18 * k + 2 * e;
        visit(node + ((e / 3) | 0), node + (e % 3), v[at]!, v[at + 1]!);
      }
      for (let s = columnStart[k]!; s < columnStart[k + 1]!; s++) {
        const other = 3 * order[rowPosition[s]!]!;
        for (let e = 0; e < 9; e++) {
          const at = 18 * nodeCount + 36 * s + 2 * e;
          visit(other + ((e / 3) | 0), node + (e % 3), v[at]!, v[at + 1]!);
          visit(node + (e % 3), other + ((e / 3) | 0), v[at + 18]!, v[at + 19]!);
        }
      }
    }
  }

  private addAt(at: number, re: number, im: number): void {
    const v = this.values;
    v[at] = v[at]! + re;
    v[at + 1] = v[at + 1]! + im;
  }

  private addTwice(at: number, re: number, im: number): void {
    this.addAt(at, re, im);
    this.addAt(at + 18, re, im);
  }
}
