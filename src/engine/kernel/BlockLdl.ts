import type { BlockMatrix } from './BlockMatrix.ts';
import { blockLdlFactor } from './blockLdlFactor.ts';
import { backwardPivot, blockLdlSolve, forwardPivot, scalePivot } from './blockLdlSolve.ts';
import type { EliminationPlan } from './EliminationPlan.ts';
import type { FactorOutcome } from './FactorOutcome.ts';
import { longestColumn, updateOffsets } from './updateOffsets.ts';

/** Packed place of entry (row, column) of a symmetric 3 × 3 block, 00 10 20 11 21 22, row · 3 + column. */
const PACKED = [0, 1, 2, 1, 3, 4, 2, 4, 5] as const;

/**
 * Nodal matrix of a reciprocal three-phase network, complex symmetric, factored as L·D·Lᵀ in place.
 *
 * Order of work per frequency: `clear`, stamp, `factor`, then `solve` or `lastSolve` as often as wanted.
 * Nothing is allocated after construction. Siemens; right-hand sides are amperes interleaved as
 * x[6·node + 2·phase + (0 re, 1 im)], one after the other with stride 6·nodeCount, and become volts.
 *
 * `values` may be written directly: a diagonal block (6 complex: 00 10 20 11 21 22) starts at
 * `diagonalOffset(node)`, an off-diagonal one (9 complex, row by row) at `offDiagonalOffset(i, j)` and is
 * A_ij, or A_ji when `plan.isTransposed(i, j)`. One off-diagonal block stands for A_ij and A_ji = A_ijᵀ.
 */
export class BlockLdl implements BlockMatrix {
  readonly blockSize = 3;
  readonly symmetric = true;
  readonly plan: EliminationPlan;
  readonly values: Float64Array;
  private readonly outcome: FactorOutcome = { status: 'singular', growth: 0, worstNode: 0 };
  private readonly target: Int32Array;
  private readonly workspace: Float64Array;

  constructor(plan: EliminationPlan) {
    this.plan = plan;
    this.values = new Float64Array(12 * plan.nodeCount + 18 * plan.slotCount);
    this.target = updateOffsets(plan, 12, 12 * plan.nodeCount, 18);
    this.workspace = new Float64Array(18 * longestColumn(plan));
  }

  diagonalOffset(node: number): number {
    return 12 * this.plan.diagonalSlot(node);
  }

  offDiagonalOffset(i: number, j: number): number {
    return 12 * this.plan.nodeCount + 18 * this.plan.offDiagonalSlot(i, j);
  }

  clear(): void {
    this.values.fill(0);
  }

  /** A_ii += block, 3 × 3 row by row; the lower triangle is read. */
  addDiagonalBlock(node: number, re9: ArrayLike<number>, im9: ArrayLike<number>): void {
    const offset = this.diagonalOffset(node);
    for (let e = 0; e < 9; e++)
      if (e % 3 <= ((e / 3) | 0)) this.addAt(offset + 2 * PACKED[e]!, re9[e]!, im9[e]!);
  }

  /** A_ij += block and A_ji += blockᵀ. */
  addOffDiagonalBlock(i: number, j: number, re9: ArrayLike<number>, im9: ArrayLike<number>): void {
    const offset = this.offDiagonalOffset(i, j);
    const turned = this.plan.isTransposed(i, j);
    for (let e = 0; e < 9; e++) {
      const place = turned ? (e % 3) * 3 + ((e / 3) | 0) : e;
      this.addAt(offset + 2 * place, re9[e]!, im9[e]!);
    }
  }

  /** Diagonal block at an offset += self on the diagonal, mutual off it: a balanced, reciprocal part. */
  addBalancedDiagonal(offset: number, entries: Float64Array): void {
    const v = this.values;
    const selfRe = entries[0]!;
    const selfIm = entries[1]!;
    const mutualRe = entries[2]!;
    const mutualIm = entries[3]!;
    v[offset] = v[offset]! + selfRe;
    v[offset + 1] = v[offset + 1]! + selfIm;
    v[offset + 2] = v[offset + 2]! + mutualRe;
    v[offset + 3] = v[offset + 3]! + mutualIm;
    v[offset + 4] = v[offset + 4]! + mutualRe;
    v[offset + 5] = v[offset + 5]! + mutualIm;
    v[offset + 6] = v[offset + 6]! + selfRe;
    v[offset + 7] = v[offset + 7]! + selfIm;
    v[offset + 8] = v[offset + 8]! + mutualRe;
    v[offset + 9] = v[offset + 9]! + mutualIm;
    v[offset + 10] = v[offset + 10]! + selfRe;
    v[offset + 11] = v[offset + 11]! + selfIm;
  }

  /**
   * Off-diagonal block at an offset += the circulant with first row c₀ c₁ c₂ (row r, column c holds
   * c₍c−r₎ mod 3): any part with three equal phases, a transformer's shift included. `turned` as
   * plan.isTransposed(i, j) for the block A_ij.
   */
  addCirculantOffDiagonal(offset: number, turned: boolean, row: Float64Array): void {
    const v = this.values;
    // c₁ stands at 01, 12, 20 and c₂ at 02, 10, 21; transposed the other way round.
    const one = turned ? 4 : 2;
    const two = turned ? 2 : 4;
    const re0 = row[0]!;
    const im0 = row[1]!;
    const re1 = row[one]!;
    const im1 = row[one + 1]!;
    const re2 = row[two]!;
    const im2 = row[two + 1]!;
    v[offset] = v[offset]! + re0;
    v[offset + 1] = v[offset + 1]! + im0;
    v[offset + 2] = v[offset + 2]! + re1;
    v[offset + 3] = v[offset + 3]! + im1;
    v[offset + 4] = v[offset + 4]! + re2;
    v[offset + 5] = v[offset + 5]! + im2;
    v[offset + 6] = v[offset + 6]! + re2;
    v[offset + 7] = v[offset + 7]! + im2;
    v[offset + 8] = v[offset + 8]! + re0;
    v[offset + 9] = v[offset + 9]! + im0;
    v[offset + 10] = v[offset + 10]! + re1;
    v[offset + 11] = v[offset + 11]! + im1;
    v[offset + 12] = v[offset + 12]! + re1;
    v[offset + 13] = v[offset + 13]! + im1;
    v[offset + 14] = v[offset + 14]! + re2;
    v[offset + 15] = v[offset + 15]! + im2;
    v[offset + 16] = v[offset + 16]! + re0;
    v[offset + 17] = v[offset + 17]! + im0;
  }

  /** A = L·D·Lᵀ in place; see FactorOutcome. The outcome object is reused. */
  factor(): FactorOutcome {
    blockLdlFactor(this.values, this.workspace, this.target, this.plan, this.outcome);
    return this.outcome;
  }

  /** x ← A⁻¹·x for `count` right-hand sides. */
  solve(x: Float64Array, count = 1): void {
    for (let c = 0; c < count; c++) blockLdlSolve(this.values, this.plan, x, 6 * this.plan.nodeCount * c);
  }

  /**
   * x ← Z_kk·x for the last node k of the plan, x three complex at `offset`: the voltages there for
   * currents injected there, without a solve of the whole network.
   */
  lastSolve(x: Float64Array, offset = 0): void {
    const d = 12 * (this.plan.nodeCount - 1);
    forwardPivot(this.values, d, x, offset);
    scalePivot(this.values, d, x, offset);
    backwardPivot(this.values, d, x, offset);
  }

  /** Z_kk of the last node k, 3 × 3 row by row interleaved into `out` (18 numbers), ohms. */
  lastInverseDiagonal(out: Float64Array): Float64Array {
    out.fill(0, 0, 18);
    for (let r = 0; r < 3; r++) {
      out[8 * r] = 1;
      this.lastSolve(out, 6 * r); // row r of Z_kkᵀ = Z_kk
    }
    return out;
  }

  /** A[row, column] = A[column, row] := re + j·im, a pair in the pattern; rows and columns as in forEachEntry. */
  setEntry(row: number, column: number, re: number, im: number): void {
    const i = (row / 3) | 0;
    const j = (column / 3) | 0;
    const turned = i !== j && this.plan.isTransposed(i, j);
    const e = turned ? (column % 3) * 3 + (row % 3) : (row % 3) * 3 + (column % 3);
    const at = i === j ? this.diagonalOffset(i) + 2 * PACKED[e]! : this.offDiagonalOffset(i, j) + 2 * e;
    this.values[at] = re;
    this.values[at + 1] = im;
  }

  /** Visits every entry as stamped, both triangles; rows and columns count 3·node + phase. */
  forEachEntry(visit: (row: number, column: number, re: number, im: number) => void): void {
    const { nodeCount, order, columnStart, rowPosition } = this.plan;
    const v = this.values;
    for (let k = 0; k < nodeCount; k++) {
      const node = 3 * order[k]!;
      for (let e = 0; e < 9; e++) {
        const at = 12 * k + 2 * PACKED[e]!;
        visit(node + ((e / 3) | 0), node + (e % 3), v[at]!, v[at + 1]!);
      }
      for (let s = columnStart[k]!; s < columnStart[k + 1]!; s++) {
        const other = 3 * order[rowPosition[s]!]!;
        for (let e = 0; e < 9; e++) {
          const at = 12 * nodeCount + 18 * s + 2 * e;
          visit(other + ((e / 3) | 0), node + (e % 3), v[at]!, v[at + 1]!);
          visit(node + (e % 3), other + ((e / 3) | 0), v[at]!, v[at + 1]!);
        }
      }
    }
  }

  private addAt(at: number, re: number, im: number): void {
    const v = this.values;
    v[at] = v[at]! + re;
    v[at + 1] = v[at + 1]! + im;
  }
}
