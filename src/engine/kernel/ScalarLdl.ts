import type { EliminationPlan } from './EliminationPlan.ts';
import type { FactorOutcome } from './FactorOutcome.ts';
import { longestColumn, updateOffsets } from './updateOffsets.ts';

/**
 * Nodal matrix of one sequence network (one complex unknown a node, complex symmetric), factored as
 * L·D·Lᵀ in place without pivoting. The sequence counterpart of BlockLdl, same order of work.
 *
 * `values`: n diagonal numbers at `diagonalOffset(node)`, then the slots at `offDiagonalOffset(i, j)`,
 * interleaved re, im; one slot stands for A_ij = A_ji. After `factor` the diagonal holds 1/D.
 * Siemens; right-hand sides x[2·node + (0 re, 1 im)], stride 2·nodeCount, amperes in, volts out.
 */
export class ScalarLdl {
  readonly blockSize = 1;
  readonly symmetric = true;
  readonly plan: EliminationPlan;
  readonly values: Float64Array;
  private readonly outcome: FactorOutcome = { status: 'singular', growth: 0, worstNode: 0 };
  private readonly target: Int32Array;
  private readonly workspace: Float64Array;

  constructor(plan: EliminationPlan) {
    this.plan = plan;
    this.values = new Float64Array(2 * (plan.nodeCount + plan.slotCount));
    this.target = updateOffsets(plan, 2, 2 * plan.nodeCount, 2);
    this.workspace = new Float64Array(2 * longestColumn(plan));
  }

  diagonalOffset(node: number): number {
    return 2 * this.plan.diagonalSlot(node);
  }

  offDiagonalOffset(i: number, j: number): number {
    return 2 * (this.plan.nodeCount + this.plan.offDiagonalSlot(i, j));
  }

  clear(): void {
    this.values.fill(0);
  }

  /** Entry at an offset of `values` += re + j·im. */
  addAt(offset: number, re: number, im: number): void {
    const v = this.values;
    v[offset] = v[offset]! + re;
    v[offset + 1] = v[offset + 1]! + im;
  }

  addDiagonal(node: number, re: number, im: number): void {
    this.addAt(this.diagonalOffset(node), re, im);
  }

  /** A_ij = A_ji += re + j·im. */
  addOffDiagonal(i: number, j: number, re: number, im: number): void {
    this.addAt(this.offDiagonalOffset(i, j), re, im);
  }

  /** A = L·D·Lᵀ in place; see FactorOutcome. The outcome object is reused. */
  factor(): FactorOutcome {
    scalarLdlFactor(this.values, this.workspace, this.target, this.plan, this.outcome);
    return this.outcome;
  }

  /** x ← A⁻¹·x for `count` right-hand sides. */
  solve(x: Float64Array, count = 1): void {
    for (let c = 0; c < count; c++) scalarLdlSolve(this.values, this.plan, x, 2 * this.plan.nodeCount * c);
  }

  /** x ← Z_kk·x for the last node of the plan, x one complex at `offset`. */
  lastSolve(x: Float64Array, offset = 0): void {
    const d = 2 * (this.plan.nodeCount - 1);
    const re = x[offset]!;
    const im = x[offset + 1]!;
    x[offset] = this.values[d]! * re - this.values[d + 1]! * im;
    x[offset + 1] = this.values[d]! * im + this.values[d + 1]! * re;
  }

  /** Z_kk of the last node, re and im into `out`, ohms. */
  lastInverseDiagonal(out: Float64Array): Float64Array {
    out[0] = this.values[2 * this.plan.nodeCount - 2]!;
    out[1] = this.values[2 * this.plan.nodeCount - 1]!;
    return out;
  }

  /** A[row, column] = A[column, row] := re + j·im, a pair in the pattern; rows and columns as in forEachEntry. */
  setEntry(row: number, column: number, re: number, im: number): void {
    const at = row === column ? this.diagonalOffset(row) : this.offDiagonalOffset(row, column);
    this.values[at] = re;
    this.values[at + 1] = im;
  }

  /** Visits every entry as stamped, both triangles; rows and columns are nodes. */
  forEachEntry(visit: (row: number, column: number, re: number, im: number) => void): void {
    const { nodeCount, order, columnStart, rowPosition } = this.plan;
    const v = this.values;
    for (let k = 0; k < nodeCount; k++) {
      visit(order[k]!, order[k]!, v[2 * k]!, v[2 * k + 1]!);
      for (let s = columnStart[k]!; s < columnStart[k + 1]!; s++) {
        const other = order[rowPosition[s]!]!;
        const at = 2 * (nodeCount + s);
        visit(other, order[k]!, v[at]!, v[at + 1]!);
        visit(order[k]!, other, v[at]!, v[at + 1]!);
      }
    }
  }
}

/** Per column: W = A_ak, L = W/D, A_ab ← A_ab − W_a·L_b. Letters as in blockLdlFactor. */
function scalarLdlFactor(
  v: Float64Array,
  W: Float64Array,
  target: Int32Array,
  plan: EliminationPlan,
  outcome: FactorOutcome,
): void {
  const n = plan.nodeCount;
  const start = plan.columnStart;
  let worst = 0;
  let worstColumn = 0;
  let finite = 0;
  let t = 0;
  for (let k = 0; k < n; k++) {
    const first = 2 * (n + start[k]!);
    const end = 2 * (n + start[k + 1]!);
    const re = v[2 * k]!;
    const im = v[2 * k + 1]!;
    const scale = 1 / (re * re + im * im);
    const x = re * scale;
    const y = -im * scale;
    v[2 * k] = x;
    v[2 * k + 1] = y;
    let size = 0;
    for (let p = first, w = 0; p < end; p += 2, w += 2) {
      const a = v[p]!;
      const b = v[p + 1]!;
      W[w] = a;
      W[w + 1] = b;
      v[p] = a * x - b * y;
      v[p + 1] = a * y + b * x;
      size = Math.max(size, a * a + b * b);
    }
    size *= scale; // |L|² = |W|²/|D|²
    finite += 0 * (scale + size);
    if ((size > worst || finite !== 0) && worst < Number.POSITIVE_INFINITY) {
      worst = finite === 0 ? size : Number.POSITIVE_INFINITY;
      worstColumn = k;
    }
    for (let p = first, w = 0; p < end; p += 2, w += 2) {
      const lr = v[p]!;
      const li = v[p + 1]!;
      for (let a = w; a < end - first; a += 2) {
        const q = target[t++]!;
        v[q] = v[q]! - (W[a]! * lr - W[a + 1]! * li);
        v[q + 1] = v[q + 1]! - (W[a]! * li + W[a + 1]! * lr);
      }
    }
  }
  outcome.status = finite === 0 ? 'factored' : 'singular';
  outcome.growth = Math.sqrt(worst);
  outcome.worstNode = plan.order[worstColumn] ?? 0;
}

/** L·y = x, z = D⁻¹·y, Lᵀ·x = z, x from offset o. */
function scalarLdlSolve(v: Float64Array, plan: EliminationPlan, x: Float64Array, o: number): void {
  const { nodeCount: n, columnStart, rowPosition, order } = plan;
  for (let k = 0; k < n; k++) {
    const q = o + 2 * order[k]!;
    const a = x[q]!;
    const b = x[q + 1]!;
    for (let s = columnStart[k]!; s < columnStart[k + 1]!; s++) {
      const r = o + 2 * order[rowPosition[s]!]!;
      const p = 2 * (n + s);
      x[r] = x[r]! - (v[p]! * a - v[p + 1]! * b);
      x[r + 1] = x[r + 1]! - (v[p]! * b + v[p + 1]! * a);
    }
    x[q] = v[2 * k]! * a - v[2 * k + 1]! * b;
    x[q + 1] = v[2 * k]! * b + v[2 * k + 1]! * a;
  }
  for (let k = n - 1; k >= 0; k--) {
    const q = o + 2 * order[k]!;
    let re = x[q]!;
    let im = x[q + 1]!;
    for (let s = columnStart[k]!; s < columnStart[k + 1]!; s++) {
      const r = o + 2 * order[rowPosition[s]!]!;
      const p = 2 * (n + s);
      re -= v[p]! * x[r]! - v[p + 1]! * x[r + 1]!;
      im -= v[p]! * x[r + 1]! + v[p + 1]! * x[r]!;
    }
    x[q] = re;
    x[q + 1] = im;
  }
}
