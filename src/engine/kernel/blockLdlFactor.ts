import type { EliminationPlan } from './EliminationPlan.ts';
import type { FactorOutcome } from './FactorOutcome.ts';

/**
 * A = L·D·Lᵀ without pivoting, in place, A complex symmetric with 3 × 3 blocks.
 *
 * Column by column (right-looking). With the pivot block P = l·d·lᵀ, l unit lower triangular:
 *   W_a = A_ak·l⁻ᵀ,  L_a = W_a·d⁻¹,  A_ab ← A_ab − W_a·L_bᵀ  for the rows a ≥ b below.
 * That is the scalar LDLᵀ of the whole matrix taken three rows at a time; an explicit P⁻¹ was rejected,
 * it loses the digits of a block whose zero and positive sequence differ by decades.
 *
 * v  values: n diagonal blocks of 6 complex (00 10 20 11 21 22), then the slots of 9 complex, row by row.
 *    On return a diagonal block holds 1/d₀ l₁₀ l₂₀ 1/d₁ l₂₁ 1/d₂, a slot holds L.
 * W  workspace: the longest column's blocks.   target  offsets into v of the plan's updates.
 */
export function blockLdlFactor(
  v: Float64Array,
  W: Float64Array,
  target: Int32Array,
  plan: EliminationPlan,
  outcome: FactorOutcome,
): void {
  const n = plan.nodeCount;
  const start = plan.columnStart;
  const base = 12 * n;
  let worst = 0;
  let worstColumn = 0;
  let finite = 0; // 0 as long as every number met is finite, else NaN
  let t = 0;
  for (let k = 0; k < n; k++) {
    const first = base + 18 * start[k]!;
    const end = base + 18 * start[k + 1]!;
    finite += 0 * pivotBlock(v, 12 * k);
    let size = 0;
    for (let p = first, w = 0; p < end; p += 18, w += 18)
      size = Math.max(size, columnBlock(v, 12 * k, p, W, w));
    finite += 0 * size;
    if ((size > worst || finite !== 0) && worst < Number.POSITIVE_INFINITY) {
      worst = finite === 0 ? size : Number.POSITIVE_INFINITY;
      worstColumn = k;
    }
    for (let b = first, w = 0; b < end; b += 18, w += 18) {
      updateDiagonal(v, target[t++]!, W, w, b);
      for (let a = w + 18; a < end - first; a += 18) updateBlock(v, target[t++]!, W, a, b);
    }
  }
  outcome.status = finite === 0 ? 'factored' : 'singular';
  outcome.growth = Math.sqrt(worst);
  outcome.worstNode = plan.order[worstColumn] ?? 0;
}

/** P = l·d·lᵀ in place, 1/d kept. Returns a sum that is finite exactly when every result is. */
function pivotBlock(v: Float64Array, d: number): number {
  const r00 = v[d]!;
  const i00 = v[d + 1]!;
  const r10 = v[d + 2]!;
  const i10 = v[d + 3]!;
  const r20 = v[d + 4]!;
  const i20 = v[d + 5]!;
  const t0 = 1 / (r00 * r00 + i00 * i00);
  const x0 = r00 * t0;
  const y0 = -i00 * t0;
  const l10 = r10 * x0 - i10 * y0;
  const m10 = r10 * y0 + i10 * x0;
  const l20 = r20 * x0 - i20 * y0;
  const m20 = r20 * y0 + i20 * x0;
  const r11 = v[d + 6]! - (l10 * r10 - m10 * i10);
  const i11 = v[d + 7]! - (l10 * i10 + m10 * r10);
  const r21 = v[d + 8]! - (l20 * r10 - m20 * i10);
  const i21 = v[d + 9]! - (l20 * i10 + m20 * r10);
  const t1 = 1 / (r11 * r11 + i11 * i11);
  const x1 = r11 * t1;
  const y1 = -i11 * t1;
  const l21 = r21 * x1 - i21 * y1;
  const m21 = r21 * y1 + i21 * x1;
  const r22 = v[d + 10]! - (l20 * r20 - m20 * i20) - (l21 * r21 - m21 * i21);
  const i22 = v[d + 11]! - (l20 * i20 + m20 * r20) - (l21 * i21 + m21 * r21);
  const t2 = 1 / (r22 * r22 + i22 * i22);
  v[d] = x0;
  v[d + 1] = y0;
  v[d + 2] = l10;
  v[d + 3] = m10;
  v[d + 4] = l20;
  v[d + 5] = m20;
  v[d + 6] = x1;
  v[d + 7] = y1;
  v[d + 8] = l21;
  v[d + 9] = m21;
  v[d + 10] = r22 * t2;
  v[d + 11] = -i22 * t2;
  return t0 + t1 + t2;
}

/** W = A·l⁻ᵀ into the workspace, L = W·d⁻¹ in place of A. Returns ‖L‖²_F. */
function columnBlock(v: Float64Array, d: number, p: number, W: Float64Array, w: number): number {
  const x0 = v[d]!;
  const y0 = v[d + 1]!;
  const l10 = v[d + 2]!;
  const m10 = v[d + 3]!;
  const l20 = v[d + 4]!;
  const m20 = v[d + 5]!;
  const x1 = v[d + 6]!;
  const y1 = v[d + 7]!;
  const l21 = v[d + 8]!;
  const m21 = v[d + 9]!;
  const x2 = v[d + 10]!;
  const y2 = v[d + 11]!;
  let size = 0;
  for (const end = p + 18; p < end; p += 6, w += 6) {
    const a0 = v[p]!;
    const b0 = v[p + 1]!;
    const a1 = v[p + 2]! - (a0 * l10 - b0 * m10);
    const b1 = v[p + 3]! - (a0 * m10 + b0 * l10);
    const a2 = v[p + 4]! - (a0 * l20 - b0 * m20) - (a1 * l21 - b1 * m21);
    const b2 = v[p + 5]! - (a0 * m20 + b0 * l20) - (a1 * m21 + b1 * l21);
    W[w] = a0;
    W[w + 1] = b0;
    W[w + 2] = a1;
    W[w + 3] = b1;
    W[w + 4] = a2;
    W[w + 5] = b2;
    const c0 = a0 * x0 - b0 * y0;
    const e0 = a0 * y0 + b0 * x0;
    const c1 = a1 * x1 - b1 * y1;
    const e1 = a1 * y1 + b1 * x1;
    const c2 = a2 * x2 - b2 * y2;
    const e2 = a2 * y2 + b2 * x2;
    v[p] = c0;
    v[p + 1] = e0;
    v[p + 2] = c1;
    v[p + 3] = e1;
    v[p + 4] = c2;
    v[p + 5] = e2;
    size += c0 * c0 + e0 * e0 + (c1 * c1 + e1 * e1) + (c2 * c2 + e2 * e2);
  }
  return size;
}

/** A_bb ← A_bb − W_b·L_bᵀ, lower triangle. q: offset of A_bb, w: of W_b in W, p: of L_b in v. */
function updateDiagonal(v: Float64Array, q: number, W: Float64Array, w: number, p: number): void {
  const a0 = v[p]!;
  const b0 = v[p + 1]!;
  const a1 = v[p + 2]!;
  const b1 = v[p + 3]!;
  const a2 = v[p + 4]!;
  const b2 = v[p + 5]!;
  for (let r = 0; r < 6; r += 2) {
    const o = w + 3 * r;
    const x0 = W[o]!;
    const y0 = W[o + 1]!;
    const x1 = W[o + 2]!;
    const y1 = W[o + 3]!;
    const x2 = W[o + 4]!;
    const y2 = W[o + 5]!;
    v[q + r] = v[q + r]! - (x0 * a0 - y0 * b0) - (x1 * a1 - y1 * b1) - (x2 * a2 - y2 * b2);
    v[q + r + 1] = v[q + r + 1]! - (x0 * b0 + y0 * a0) - (x1 * b1 + y1 * a1) - (x2 * b2 + y2 * a2);
  }
  const a3 = v[p + 6]!;
  const b3 = v[p + 7]!;
  const a4 = v[p + 8]!;
  const b4 = v[p + 9]!;
  const a5 = v[p + 10]!;
  const b5 = v[p + 11]!;
  for (let r = 6; r < 10; r += 2) {
    const o = w + 3 * r - 12;
    const x0 = W[o]!;
    const y0 = W[o + 1]!;
    const x1 = W[o + 2]!;
    const y1 = W[o + 3]!;
    const x2 = W[o + 4]!;
    const y2 = W[o + 5]!;
    v[q + r] = v[q + r]! - (x0 * a3 - y0 * b3) - (x1 * a4 - y1 * b4) - (x2 * a5 - y2 * b5);
    v[q + r + 1] = v[q + r + 1]! - (x0 * b3 + y0 * a3) - (x1 * b4 + y1 * a4) - (x2 * b5 + y2 * a5);
  }
  const x0 = W[w + 12]!;
  const y0 = W[w + 13]!;
  const x1 = W[w + 14]!;
  const y1 = W[w + 15]!;
  const x2 = W[w + 16]!;
  const y2 = W[w + 17]!;
  const a6 = v[p + 12]!;
  const b6 = v[p + 13]!;
  const a7 = v[p + 14]!;
  const b7 = v[p + 15]!;
  const a8 = v[p + 16]!;
  const b8 = v[p + 17]!;
  v[q + 10] = v[q + 10]! - (x0 * a6 - y0 * b6) - (x1 * a7 - y1 * b7) - (x2 * a8 - y2 * b8);
  v[q + 11] = v[q + 11]! - (x0 * b6 + y0 * a6) - (x1 * b7 + y1 * a7) - (x2 * b8 + y2 * a8);
}

/** A_ab ← A_ab − W_a·L_bᵀ. q: offset of A_ab, w: of W_a in W, p: of L_b in v. */
function updateBlock(v: Float64Array, q: number, W: Float64Array, w: number, p: number): void {
  for (let c = 0; c < 6; c += 2, p += 6) {
    const a0 = v[p]!;
    const b0 = v[p + 1]!;
    const a1 = v[p + 2]!;
    const b1 = v[p + 3]!;
    const a2 = v[p + 4]!;
    const b2 = v[p + 5]!;
    for (let r = 0; r < 18; r += 6) {
      const x0 = W[w + r]!;
      const y0 = W[w + r + 1]!;
      const x1 = W[w + r + 2]!;
      const y1 = W[w + r + 3]!;
      const x2 = W[w + r + 4]!;
      const y2 = W[w + r + 5]!;
      const o = q + r + c;
      v[o] = v[o]! - (x0 * a0 - y0 * b0) - (x1 * a1 - y1 * b1) - (x2 * a2 - y2 * b2);
      v[o + 1] = v[o + 1]! - (x0 * b0 + y0 * a0) - (x1 * b1 + y1 * a1) - (x2 * b2 + y2 * a2);
    }
  }
}
