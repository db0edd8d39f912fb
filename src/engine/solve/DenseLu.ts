/**
 * P·A = L·U of a real dense matrix, row by row, with partial pivoting, in place on the array given.
 * `sign` is that of the determinant, 0 when singular. For the few unknowns of the Newton fallback.
 */
export class DenseLu {
  readonly sign: number;
  private readonly a: Float64Array;
  private readonly n: number;
  private readonly row: Int32Array;

  constructor(a: Float64Array, n: number) {
    if (a.length !== n * n)
      throw new RangeError(`a dense matrix of size ${n} holds ${n * n} numbers, not ${a.length}`);
    this.a = a;
    this.n = n;
    this.row = Int32Array.from({ length: n }, (_, k) => k);
    this.sign = this.factor();
  }

  private factor(): number {
    const { a, n } = this;
    let sign = 1;
    for (let k = 0; k < n; k++) {
      const p = this.largestBelow(k);
      const pivot = a[p * n + k]!;
      if (!(Math.abs(pivot) > 0) || !Number.isFinite(pivot)) return 0;
      if (p !== k) {
        this.swap(p, k);
        sign = -sign;
      }
      if (pivot < 0) sign = -sign;
      for (let i = k + 1; i < n; i++) {
        const factor = a[i * n + k]! / pivot;
        a[i * n + k] = factor;
        if (factor === 0) continue;
        for (let j = k + 1; j < n; j++) a[i * n + j] = a[i * n + j]! - factor * a[k * n + j]!;
      }
    }
    return sign;
  }

  /** x ← A⁻¹·x. */
  solve(x: Float64Array): void {
    const { a, n, row } = this;
    const y = Float64Array.from(row, (r) => x[r]!);
    for (let i = 0; i < n; i++) {
      let sum = y[i]!;
      for (let j = 0; j < i; j++) sum -= a[i * n + j]! * y[j]!;
      y[i] = sum;
    }
    for (let i = n - 1; i >= 0; i--) {
      let sum = y[i]!;
      for (let j = i + 1; j < n; j++) sum -= a[i * n + j]! * y[j]!;
      y[i] = sum / a[i * n + i]!;
    }
    x.set(y);
  }

  private largestBelow(k: number): number {
    const { a, n } = this;
    let best = k;
    for (let i = k + 1; i < n; i++) if (Math.abs(a[i * n + k]!) > Math.abs(a[best * n + k]!)) best = i;
    return best;
  }

  private swap(p: number, k: number): void {
    const { a, n, row } = this;
    for (let j = 0; j < n; j++) {
      const held = a[p * n + j]!;
      a[p * n + j] = a[k * n + j]!;
      a[k * n + j] = held;
    }
    const held = row[p]!;
    row[p] = row[k]!;
    row[k] = held;
  }
}
