import type { EntrySource } from './PivotedLu.ts';

/** A copy of a stamped matrix as coordinate triplets: what refinement and residuals need after `factor`. */
export class StampedEntries implements EntrySource {
  readonly size: number;
  private readonly place: number[] = []; // row, column
  private readonly value: number[] = []; // re, im

  constructor(size: number, source: EntrySource) {
    this.size = size;
    source.forEachEntry((row, column, re, im) => {
      if (re === 0 && im === 0) return;
      this.place.push(row, column);
      this.value.push(re, im);
    });
  }

  forEachEntry(visit: (row: number, column: number, re: number, im: number) => void): void {
    for (let e = 0; e < this.place.length; e += 2)
      visit(this.place[e]!, this.place[e + 1]!, this.value[e]!, this.value[e + 1]!);
  }

  isFinite(): boolean {
    return this.value.every(Number.isFinite);
  }

  /** r = b − A·x, interleaved complex. */
  residual(b: Float64Array, x: Float64Array): Float64Array {
    const r = b.slice();
    this.forEachEntry((row, column, re, im) => {
      r[2 * row] = r[2 * row]! - (re * x[2 * column]! - im * x[2 * column + 1]!);
      r[2 * row + 1] = r[2 * row + 1]! - (re * x[2 * column + 1]! + im * x[2 * column]!);
    });
    return r;
  }

  /** Normalised residual ‖A·x − b‖∞ / (‖A‖₁·‖x‖∞ + ‖b‖∞); Infinity when a number is not finite. */
  backwardError(b: Float64Array, x: Float64Array): number {
    const error = largest(this.residual(b, x)) / (this.norm1() * largest(x) + largest(b));
    return Number.isFinite(error) ? error : Number.POSITIVE_INFINITY;
  }

  /** ‖A‖₁, the largest column sum of magnitudes. */
  norm1(): number {
    const sums = new Float64Array(this.size);
    this.forEachEntry((_, column, re, im) => {
      sums[column] = sums[column]! + Math.hypot(re, im);
    });
    return sums.reduce((a, b) => Math.max(a, b), 0);
  }
}

/** ‖x‖∞ of an interleaved complex vector; NaN stays NaN. */
function largest(x: Float64Array): number {
  let worst = 0;
  for (let i = 0; i < x.length; i += 2) worst = Math.max(worst, Math.hypot(x[i]!, x[i + 1]!));
  return worst;
}
