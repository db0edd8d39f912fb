/** Sums of one order, contiguous: three complex a row and their magnitudes, with the figure formed across phases. */
export class OrderSums {
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly magnitude: Float64Array;
  /** Line voltages (three a row) or neutral currents (one a row), as magnitudes. */
  readonly across: Float64Array;

  constructor(rows: number, acrossPerRow: number) {
    this.re = new Float64Array(3 * rows);
    this.im = new Float64Array(3 * rows);
    this.magnitude = new Float64Array(3 * rows);
    this.across = new Float64Array(acrossPerRow * rows);
  }

  clear(): void {
    for (const sums of [this.re, this.im, this.magnitude, this.across]) sums.fill(0);
  }

  /** Adds three complex numbers of `x` from `i` to the row at 3·row = `at`. */
  addThree(at: number, x: Float64Array, i: number, exponent: number): void {
    const { re, im, magnitude } = this;
    for (let k = 0; k < 3; k++) {
      const a = x[i + 2 * k]!;
      const b = x[i + 2 * k + 1]!;
      re[at + k] = re[at + k]! + a;
      im[at + k] = im[at + k]! + b;
      magnitude[at + k] = magnitude[at + k]! + powered(a, b, exponent);
    }
  }

  root(exponent: number): void {
    if (exponent === 1) return;
    for (const sums of [this.magnitude, this.across])
      for (let k = 0; k < sums.length; k++)
        sums[k] = exponent === 2 ? Math.sqrt(sums[k]!) : sums[k]! ** (1 / exponent);
  }
}

/** |re + j·im| to the power `exponent`. */
export function powered(re: number, im: number, exponent: number): number {
  const square = re * re + im * im;
  if (exponent === 2) return square;
  return exponent === 1 ? Math.sqrt(square) : square ** (exponent / 2);
}
