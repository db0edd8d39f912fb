import type { EliminationPlan } from './EliminationPlan.ts';
import type { FactorOutcome } from './FactorOutcome.ts';

/**
 * A = L·D·U without pivoting, in place, 3 × 3 complex blocks on a symmetric pattern.
 *
 * With the pivot block P = l·d·u, l unit lower and u unit upper triangular:
 *   L_a = A_ak·u⁻¹·d⁻¹,  V_a = A_kaᵀ·l⁻ᵀ (the block of U, transposed),
 *   A_ab ← A_ab − L_a·V_bᵀ  for all rows a and columns b below.
 * v  values: n diagonal blocks of 9 complex row by row, then per slot the lower block and the transposed
 *    upper one. On return the diagonal holds 1/d with l below and u above, the slots hold L and V.
 */
export function blockLuFactor(
  v: Float64Array,
  target: Int32Array,
  plan: EliminationPlan,
  outcome: FactorOutcome,
): void {
  const n = plan.nodeCount;
  const start = plan.columnStart;
  const base = 18 * n;
  let worst = 0;
  let worstColumn = 0;
  let finite = 0;
  let t = 0;
  for (let k = 0; k < n; k++) {
    const first = base + 36 * start[k]!;
    const end = base + 36 * start[k + 1]!;
    finite += 0 * luPivot(v, 18 * k);
    let size = 0;
    for (let p = first; p < end; p += 36) {
      size = Math.max(size, lowerBlock(v, 18 * k, p));
      upperBlock(v, 18 * k, p + 18);
    }
    finite += 0 * size;
    if ((size > worst || finite !== 0) && worst < Number.POSITIVE_INFINITY) {
      worst = finite === 0 ? size : Number.POSITIVE_INFINITY;
      worstColumn = k;
    }
    for (let b = first; b < end; b += 36) {
      subtractProduct(v, target[t++]!, b, b + 18);
      for (let a = b + 36; a < end; a += 36) {
        const q = target[t++]!;
        subtractProduct(v, q, a, b + 18);
        subtractProduct(v, q + 18, a + 18, b);
      }
    }
  }
  outcome.status = finite === 0 ? 'factored' : 'singular';
  outcome.growth = Math.sqrt(worst);
  outcome.worstNode = plan.order[worstColumn] ?? 0;
}

/** P = l·d·u in place, 1/d kept. Returns a sum that is finite exactly when every pivot is. */
function luPivot(v: Float64Array, d: number): number {
  let check = 0;
  for (let m = 0; m < 3; m++) {
    const diagonal = d + 8 * m;
    const re = v[diagonal]!;
    const im = v[diagonal + 1]!;
    const scale = 1 / (re * re + im * im);
    check += scale;
    const x = re * scale;
    const y = -im * scale;
    for (let r = m + 1; r < 3; r++) {
      const row = d + 2 * (3 * r + m);
      const a = v[row]! * x - v[row + 1]! * y;
      const b = v[row]! * y + v[row + 1]! * x;
      v[row] = a;
      v[row + 1] = b;
      for (let c = m + 1; c < 3; c++) multiplySubtract(v, d + 2 * (3 * r + c), a, b, d + 2 * (3 * m + c));
    }
    for (let c = m + 1; c < 3; c++) scaleAt(v, d + 2 * (3 * m + c), x, y);
    v[diagonal] = x;
    v[diagonal + 1] = y;
  }
  return check;
}

/** L = A·u⁻¹·d⁻¹ in place; returns ‖L‖²_F. */
function lowerBlock(v: Float64Array, d: number, p: number): number {
  let size = 0;
  for (let o = p; o < p + 18; o += 6) {
    multiplySubtract(v, o + 2, v[o]!, v[o + 1]!, d + 2);
    multiplySubtract(v, o + 4, v[o]!, v[o + 1]!, d + 4);
    multiplySubtract(v, o + 4, v[o + 2]!, v[o + 3]!, d + 10);
    for (let c = 0; c < 3; c++) {
      const at = o + 2 * c;
      scaleAt(v, at, v[d + 8 * c]!, v[d + 8 * c + 1]!);
      size += v[at]! * v[at]! + v[at + 1]! * v[at + 1]!;
    }
  }
  return size;
}

/** V = Aᵀ·l⁻ᵀ in place of the transposed upper block. */
function upperBlock(v: Float64Array, d: number, p: number): void {
  for (let o = p; o < p + 18; o += 6) {
    multiplySubtract(v, o + 2, v[o]!, v[o + 1]!, d + 6);
    multiplySubtract(v, o + 4, v[o]!, v[o + 1]!, d + 12);
    multiplySubtract(v, o + 4, v[o + 2]!, v[o + 3]!, d + 14);
  }
}

/** v[q] ← v[q] − (a + j·b)·v[f]. */
function multiplySubtract(v: Float64Array, q: number, a: number, b: number, f: number): void {
  const re = v[f]!;
  const im = v[f + 1]!;
  v[q] = v[q]! - (a * re - b * im);
  v[q + 1] = v[q + 1]! - (a * im + b * re);
}

function scaleAt(v: Float64Array, at: number, x: number, y: number): void {
  const re = v[at]!;
  const im = v[at + 1]!;
  v[at] = re * x - im * y;
  v[at + 1] = re * y + im * x;
}

/** Block at q ← block at q − (block at w)·(block at p)ᵀ. */
function subtractProduct(v: Float64Array, q: number, w: number, p: number): void {
  for (let c = 0; c < 6; c += 2, p += 6) {
    const a0 = v[p]!;
    const b0 = v[p + 1]!;
    const a1 = v[p + 2]!;
    const b1 = v[p + 3]!;
    const a2 = v[p + 4]!;
    const b2 = v[p + 5]!;
    for (let r = 0; r < 18; r += 6) {
      const x0 = v[w + r]!;
      const y0 = v[w + r + 1]!;
      const x1 = v[w + r + 2]!;
      const y1 = v[w + r + 3]!;
      const x2 = v[w + r + 4]!;
      const y2 = v[w + r + 5]!;
      const o = q + r + c;
      v[o] = v[o]! - (x0 * a0 - y0 * b0) - (x1 * a1 - y1 * b1) - (x2 * a2 - y2 * b2);
      v[o + 1] = v[o + 1]! - (x0 * b0 + y0 * a0) - (x1 * b1 + y1 * a1) - (x2 * b2 + y2 * a2);
    }
  }
}

/** L·y = x, then D·U·x = y, x interleaved by node from offset o. */
export function blockLuSolve(v: Float64Array, plan: EliminationPlan, x: Float64Array, o: number): void {
  const { nodeCount: n, columnStart, rowPosition, order } = plan;
  for (let k = 0; k < n; k++) {
    const q = o + 6 * order[k]!;
    luPivotForward(v, 18 * k, x, q);
    for (let s = columnStart[k]!; s < columnStart[k + 1]!; s++) {
      const row = o + 6 * order[rowPosition[s]!]!;
      for (let e = 0; e < 9; e++)
        productAt(x, row + 2 * ((e / 3) | 0), v, 18 * n + 36 * s + 2 * e, q + 2 * (e % 3));
    }
  }
  for (let k = n - 1; k >= 0; k--) {
    const q = o + 6 * order[k]!;
    for (let s = columnStart[k]!; s < columnStart[k + 1]!; s++) {
      const row = o + 6 * order[rowPosition[s]!]!;
      for (let e = 0; e < 9; e++)
        productAt(x, q + 2 * (e % 3), v, 18 * n + 36 * s + 18 + 2 * e, row + 2 * ((e / 3) | 0));
    }
    luPivotBackward(v, 18 * k, x, q);
  }
}

/** x ← l⁻¹·x of one diagonal block. */
export function luPivotForward(v: Float64Array, d: number, x: Float64Array, q: number): void {
  productAt(x, q + 2, v, d + 6, q);
  productAt(x, q + 4, v, d + 12, q);
  productAt(x, q + 4, v, d + 14, q + 2);
}

/** x ← u⁻¹·d⁻¹·x of one diagonal block. */
export function luPivotBackward(v: Float64Array, d: number, x: Float64Array, q: number): void {
  for (let c = 0; c < 3; c++) scaleAt(x, q + 2 * c, v[d + 8 * c]!, v[d + 8 * c + 1]!);
  productAt(x, q + 2, v, d + 10, q + 4);
  productAt(x, q, v, d + 2, q + 2);
  productAt(x, q, v, d + 4, q + 4);
}

/** x[q] ← x[q] − v[f]·x[s]. */
function productAt(x: Float64Array, q: number, v: Float64Array, f: number, s: number): void {
  x[q] = x[q]! - (v[f]! * x[s]! - v[f + 1]! * x[s + 1]!);
  x[q + 1] = x[q + 1]! - (v[f]! * x[s + 1]! + v[f + 1]! * x[s]!);
}
