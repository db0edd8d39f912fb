/**
 * Sequence admittances of one part at order h = f/fn, in siemens, written into `out` from `at` as
 * interleaved real and imaginary parts. Nothing is allocated. Negative sequence equals positive, but for
 * the vector group's rotation, which stays with the stamp.
 *
 * Shunt parts write y0, y1 (shuntFloats numbers; a single-phase or pair part uses y1 alone).
 * Series parts write ff0, ff1, tt0, tt1, ft0, ft1 (seriesFloats numbers): the two-port
 * [If; It] = [[ff, ft], [ft, tt]]·[Vf; Vt] of each sequence, currents into the part.
 */
export type PartLaw = (h: number, out: Float64Array, at: number) => void;

export const shuntFloats = 4;
export const seriesFloats = 12;

/** Writes 1/(re + j·im) at `at`; an ideal short becomes 1e12 S so that nothing turns infinite. */
export function writeInverse(re: number, im: number, out: Float64Array, at: number): void {
  const square = re * re + im * im;
  if (square < 1e-24) {
    out[at] = 1e12;
    out[at + 1] = 0;
    return;
  }
  out[at] = re / square;
  out[at + 1] = -im / square;
}

/** Fills a series part whose three sequences share the admittance already standing at `at` (ff0). */
export function spreadSeriesAdmittance(out: Float64Array, at: number): void {
  const re = out[at] as number;
  const im = out[at + 1] as number;
  for (let k = 2; k < 8; k += 2) {
    out[at + k] = re;
    out[at + k + 1] = im;
  }
  for (let k = 8; k < 12; k += 2) {
    out[at + k] = -re;
    out[at + k + 1] = -im;
  }
}

/** Copies y0 from y1 when the part joins zero sequence, else leaves it open. */
export function writeZeroSequence(joins: boolean, out: Float64Array, at: number): void {
  out[at] = joins ? (out[at + 2] as number) : 0;
  out[at + 1] = joins ? (out[at + 3] as number) : 0;
}
