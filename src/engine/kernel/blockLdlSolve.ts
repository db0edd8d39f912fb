import type { EliminationPlan } from './EliminationPlan.ts';

/**
 * x ← A⁻¹·x with the factor left by blockLdlFactor: L·y = x, z = D⁻¹·y, Lᵀ·x = z.
 * x: interleaved complex, 6 numbers a node in the caller's node order, from offset `o`.
 */
export function blockLdlSolve(v: Float64Array, plan: EliminationPlan, x: Float64Array, o: number): void {
  const { nodeCount: n, columnStart, rowPosition, order } = plan;
  const base = 12 * n;
  for (let k = 0; k < n; k++) {
    const q = o + 6 * order[k]!;
    forwardPivot(v, 12 * k, x, q);
    for (let s = columnStart[k]!; s < columnStart[k + 1]!; s++)
      forwardBlock(v, base + 18 * s, x, q, o + 6 * order[rowPosition[s]!]!);
    scalePivot(v, 12 * k, x, q);
  }
  for (let k = n - 1; k >= 0; k--) {
    const q = o + 6 * order[k]!;
    for (let s = columnStart[k]!; s < columnStart[k + 1]!; s++)
      backwardBlock(v, base + 18 * s, x, q, o + 6 * order[rowPosition[s]!]!);
    backwardPivot(v, 12 * k, x, q);
  }
}

/** x ← l⁻¹·x of one diagonal block. */
export function forwardPivot(v: Float64Array, d: number, x: Float64Array, q: number): void {
  const a0 = x[q]!;
  const b0 = x[q + 1]!;
  const a1 = x[q + 2]! - (v[d + 2]! * a0 - v[d + 3]! * b0);
  const b1 = x[q + 3]! - (v[d + 2]! * b0 + v[d + 3]! * a0);
  x[q + 2] = a1;
  x[q + 3] = b1;
  x[q + 4] = x[q + 4]! - (v[d + 4]! * a0 - v[d + 5]! * b0) - (v[d + 8]! * a1 - v[d + 9]! * b1);
  x[q + 5] = x[q + 5]! - (v[d + 4]! * b0 + v[d + 5]! * a0) - (v[d + 8]! * b1 + v[d + 9]! * a1);
}

/** x ← d⁻¹·x of one diagonal block. */
export function scalePivot(v: Float64Array, d: number, x: Float64Array, q: number): void {
  const a0 = x[q]!;
  const b0 = x[q + 1]!;
  const a1 = x[q + 2]!;
  const b1 = x[q + 3]!;
  const a2 = x[q + 4]!;
  const b2 = x[q + 5]!;
  x[q] = v[d]! * a0 - v[d + 1]! * b0;
  x[q + 1] = v[d]! * b0 + v[d + 1]! * a0;
  x[q + 2] = v[d + 6]! * a1 - v[d + 7]! * b1;
  x[q + 3] = v[d + 6]! * b1 + v[d + 7]! * a1;
  x[q + 4] = v[d + 10]! * a2 - v[d + 11]! * b2;
  x[q + 5] = v[d + 10]! * b2 + v[d + 11]! * a2;
}

/** x ← l⁻ᵀ·x of one diagonal block. */
export function backwardPivot(v: Float64Array, d: number, x: Float64Array, q: number): void {
  const a2 = x[q + 4]!;
  const b2 = x[q + 5]!;
  const a1 = x[q + 2]! - (v[d + 8]! * a2 - v[d + 9]! * b2);
  const b1 = x[q + 3]! - (v[d + 8]! * b2 + v[d + 9]! * a2);
  x[q + 2] = a1;
  x[q + 3] = b1;
  x[q] = x[q]! - (v[d + 2]! * a1 - v[d + 3]! * b1) - (v[d + 4]! * a2 - v[d + 5]! * b2);
  x[q + 1] = x[q + 1]! - (v[d + 2]! * b1 + v[d + 3]! * a1) - (v[d + 4]! * b2 + v[d + 5]! * a2);
}

/** x_r ← x_r − L·x_k. */
function forwardBlock(v: Float64Array, p: number, x: Float64Array, k: number, r: number): void {
  const a0 = x[k]!;
  const b0 = x[k + 1]!;
  const a1 = x[k + 2]!;
  const b1 = x[k + 3]!;
  const a2 = x[k + 4]!;
  const b2 = x[k + 5]!;
  for (const end = r + 6; r < end; r += 2, p += 6) {
    x[r] =
      x[r]! -
      (v[p]! * a0 - v[p + 1]! * b0) -
      (v[p + 2]! * a1 - v[p + 3]! * b1) -
      (v[p + 4]! * a2 - v[p + 5]! * b2);
    x[r + 1] =
      x[r + 1]! -
      (v[p]! * b0 + v[p + 1]! * a0) -
      (v[p + 2]! * b1 + v[p + 3]! * a1) -
      (v[p + 4]! * b2 + v[p + 5]! * a2);
  }
}

/** x_k ← x_k − Lᵀ·x_r. */
function backwardBlock(v: Float64Array, p: number, x: Float64Array, k: number, r: number): void {
  const a0 = x[r]!;
  const b0 = x[r + 1]!;
  const a1 = x[r + 2]!;
  const b1 = x[r + 3]!;
  const a2 = x[r + 4]!;
  const b2 = x[r + 5]!;
  for (const end = k + 6; k < end; k += 2, p += 2) {
    x[k] =
      x[k]! -
      (v[p]! * a0 - v[p + 1]! * b0) -
      (v[p + 6]! * a1 - v[p + 7]! * b1) -
      (v[p + 12]! * a2 - v[p + 13]! * b2);
    x[k + 1] =
      x[k + 1]! -
      (v[p]! * b0 + v[p + 1]! * a0) -
      (v[p + 6]! * b1 + v[p + 7]! * a1) -
      (v[p + 12]! * b2 + v[p + 13]! * a2);
  }
}
