/**
 * Smallest and largest |Z| by frequency over rows of neighbouring points of a tolerance space. Between three
 * neighbours a peak or dip that stands between the points is filled in: at one frequency |Y|² = G² + B² with B
 * close to linear along the row, so 1/|Z|² (and near a dip |Z|²) is a parabola through them.
 */
export class Band {
  readonly lowOhm: Float64Array;
  readonly highOhm: Float64Array;
  /** |Z|² of the last two points of the row under way; the row's length so far. */
  private before: Float64Array;
  private last: Float64Array;
  private length = 0;

  constructor(count: number) {
    this.lowOhm = new Float64Array(count).fill(Number.POSITIVE_INFINITY);
    this.highOhm = new Float64Array(count);
    this.before = new Float64Array(count);
    this.last = new Float64Array(count);
  }

  /** The next point belongs to no neighbour of the last. */
  beginRow(): void {
    this.length = 0;
  }

  /** Takes one curve in, ohms. */
  add(re: Float64Array, im: Float64Array): void {
    const { before, last, lowOhm, highOhm } = this;
    for (let k = 0; k < lowOhm.length; k++) {
      const square = re[k]! * re[k]! + im[k]! * im[k]!;
      const ohm = Math.sqrt(square);
      if (ohm < lowOhm[k]!) lowOhm[k] = ohm;
      if (ohm > highOhm[k]!) highOhm[k] = ohm;
      if (this.length >= 2) {
        const tip = 1 / Math.sqrt(valley(1 / before[k]!, 1 / last[k]!, 1 / square));
        const dip = Math.sqrt(valley(before[k]!, last[k]!, square));
        if (tip > highOhm[k]!) highOhm[k] = tip;
        if (dip < lowOhm[k]!) lowOhm[k] = dip;
      }
      before[k] = square;
    }
    // What was just written is the newest: it changes places with the one before it.
    this.before = last;
    this.last = before;
    this.length++;
  }
}

/** A parabola's vertex is not trusted below this share of its lowest sample. */
const DEEPEST = 0.25;

/** Lowest value of the parabola through three equidistant positive values, where it lies among them. */
function valley(a: number, b: number, c: number): number {
  const bend = a - 2 * b + c;
  const lowest = Math.min(a, b, c);
  if (!(bend > 0) || Math.abs(a - c) > 2 * bend) return lowest;
  return Math.max(DEEPEST * lowest, b - (a - c) ** 2 / (8 * bend));
}
