import type { EliminationPlan } from './EliminationPlan.ts';

/**
 * Real matrix of m × m blocks on a plan's symmetric pattern, factored in place as block LU with partial
 * pivoting inside each diagonal block (none across blocks): Newton's Jacobian, m = 6 for the real and
 * imaginary parts of three phases. Used a few times per case, so loops and no unrolling.
 *
 *   A_ak ← A_ak·P_k⁻¹,  A_ab ← A_ab − A_ak·A_kb  for all rows a and columns b below column k.
 *
 * A block is m·m numbers row by row. Right-hand sides: m numbers a node in node order.
 */
export class RealBlockLu {
  readonly blockSize: number;
  readonly plan: EliminationPlan;
  private readonly values: Float64Array; // n diagonal blocks, then per slot lower and upper block
  private readonly pivotRow: Int32Array; // row exchanges of each diagonal block

  constructor(plan: EliminationPlan, blockSize = 6) {
    this.plan = plan;
    this.blockSize = blockSize;
    this.values = new Float64Array(blockSize * blockSize * (plan.nodeCount + 2 * plan.slotCount));
    this.pivotRow = new Int32Array(blockSize * plan.nodeCount);
  }

  clear(): void {
    this.values.fill(0);
  }

  /** A[i·m + r, j·m + c] += value, (i, j) a pair of the pattern or i = j. */
  add(i: number, r: number, j: number, c: number, value: number): void {
    const at = this.blockAt(i, j) + r * this.blockSize + c;
    this.values[at] = this.values[at]! + value;
  }

  /** Factors in place; "singular" when a pivot vanished or a number is not finite. */
  factor(): 'factored' | 'singular' {
    const { plan } = this;
    let t = 0;
    for (let k = 0; k < plan.nodeCount; k++) {
      if (!this.pivotBlock(k)) return 'singular';
      const end = plan.columnStart[k + 1]!;
      for (let s = plan.columnStart[k]!; s < end; s++) this.divideLower(k, this.slotAt(s));
      for (let b = plan.columnStart[k]!; b < end; b++) {
        this.subtractProduct(
          this.diagonalAt(plan.updateTarget[t++]!),
          this.slotAt(b),
          this.slotAt(b) + this.area,
        );
        for (let a = b + 1; a < end; a++) {
          const target = this.slotAt(plan.updateTarget[t++]!);
          this.subtractProduct(target, this.slotAt(a), this.slotAt(b) + this.area);
          this.subtractProduct(target + this.area, this.slotAt(b), this.slotAt(a) + this.area);
        }
      }
    }
    return 'factored';
  }

  /** x ← A⁻¹·x. */
  solve(x: Float64Array): void {
    const { nodeCount, columnStart, rowPosition, order } = this.plan;
    const m = this.blockSize;
    for (let k = 0; k < nodeCount; k++)
      for (let s = columnStart[k]!; s < columnStart[k + 1]!; s++)
        this.subtractFrom(x, m * order[rowPosition[s]!]!, this.slotAt(s), m * order[k]!);
    for (let k = nodeCount - 1; k >= 0; k--) {
      for (let s = columnStart[k]!; s < columnStart[k + 1]!; s++)
        this.subtractFrom(x, m * order[k]!, this.slotAt(s) + this.area, m * order[rowPosition[s]!]!);
      this.solvePivot(k, x, m * order[k]!);
    }
  }

  private get area(): number {
    return this.blockSize * this.blockSize;
  }

  private diagonalAt(position: number): number {
    return this.area * position;
  }

  private slotAt(slot: number): number {
    return this.area * (this.plan.nodeCount + 2 * slot);
  }

  private blockAt(i: number, j: number): number {
    if (i === j) return this.diagonalAt(this.plan.diagonalSlot(i));
    return this.slotAt(this.plan.offDiagonalSlot(i, j)) + (this.plan.isTransposed(i, j) ? this.area : 0);
  }

  /** Π·P = l·u of one diagonal block, rows exchanged for the largest pivot. */
  private pivotBlock(k: number): boolean {
    const { values: v, blockSize: m } = this;
    const d = this.diagonalAt(k);
    for (let p = 0; p < m; p++) {
      let best = p;
      for (let r = p + 1; r < m; r++)
        if (Math.abs(v[d + r * m + p]!) > Math.abs(v[d + best * m + p]!)) best = r;
      const pivot = v[d + best * m + p]!;
      if (!(Math.abs(pivot) > 0 && Math.abs(pivot) < Number.POSITIVE_INFINITY)) return false;
      this.pivotRow[k * m + p] = best;
      for (let c = 0; c < m; c++) exchange(v, d + p * m + c, d + best * m + c);
      for (let r = p + 1; r < m; r++) {
        const factor = v[d + r * m + p]! / pivot;
        v[d + r * m + p] = factor;
        for (let c = p + 1; c < m; c++) v[d + r * m + c] = v[d + r * m + c]! - factor * v[d + p * m + c]!;
      }
    }
    return true;
  }

  /** Lower block ← lower block · P_k⁻¹, P = Πᵀ·l·u: row by row y·u, then l, then the exchanges. */
  private divideLower(k: number, at: number): void {
    const { values: v, blockSize: m } = this;
    const d = this.diagonalAt(k);
    for (let row = at; row < at + this.area; row += m) {
      for (let c = 0; c < m; c++) {
        let sum = v[row + c]!;
        for (let i = 0; i < c; i++) sum -= v[row + i]! * v[d + i * m + c]!;
        v[row + c] = sum / v[d + c * m + c]!;
      }
      for (let c = m - 1; c >= 0; c--) {
        let sum = v[row + c]!;
        for (let i = c + 1; i < m; i++) sum -= v[row + i]! * v[d + i * m + c]!;
        v[row + c] = sum;
      }
      for (let c = m - 1; c >= 0; c--) exchange(v, row + c, row + this.pivotRow[k * m + c]!);
    }
  }

  /** Block at q ← block at q − (block at a)·(block at b). */
  private subtractProduct(q: number, a: number, b: number): void {
    const { values: v, blockSize: m } = this;
    for (let r = 0; r < m; r++)
      for (let i = 0; i < m; i++) {
        const factor = v[a + r * m + i]!;
        for (let c = 0; c < m; c++) v[q + r * m + c] = v[q + r * m + c]! - factor * v[b + i * m + c]!;
      }
  }

  /** x at q ← x at q − block · x at s. */
  private subtractFrom(x: Float64Array, q: number, block: number, s: number): void {
    const { values: v, blockSize: m } = this;
    for (let r = 0; r < m; r++) {
      let sum = x[q + r]!;
      for (let c = 0; c < m; c++) sum -= v[block + r * m + c]! * x[s + c]!;
      x[q + r] = sum;
    }
  }

  /** x ← P_k⁻¹·x. */
  private solvePivot(k: number, x: Float64Array, q: number): void {
    const { values: v, blockSize: m } = this;
    const d = this.diagonalAt(k);
    for (let p = 0; p < m; p++) exchange(x, q + p, q + this.pivotRow[k * m + p]!);
    for (let r = 0; r < m; r++)
      for (let c = 0; c < r; c++) x[q + r] = x[q + r]! - v[d + r * m + c]! * x[q + c]!;
    for (let r = m - 1; r >= 0; r--) {
      for (let c = r + 1; c < m; c++) x[q + r] = x[q + r]! - v[d + r * m + c]! * x[q + c]!;
      x[q + r] = x[q + r]! / v[d + r * m + r]!;
    }
  }
}

function exchange(x: Float64Array, i: number, j: number): void {
  const keep = x[i]!;
  x[i] = x[j]!;
  x[j] = keep;
}
