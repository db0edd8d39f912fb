/**
 * Root of f between a and b, where f(a) and f(b) differ in sign, to 1e-11 relative: false position, the
 * kept end's value halved (Illinois variant; M. Dowell and P. Jarratt, BIT 11 (1971) 168, from memory).
 */
export function crossing(f: (x: number) => number, a: number, fa: number, b: number, fb: number): number {
  let [x0, f0, x1, f1] = [a, fa, b, fb];
  for (let round = 0; round < 100 && f1 !== 0; round++) {
    if (Math.abs(x1 - x0) <= 1e-11 * Math.abs(x1)) break;
    const x = x1 - (f1 * (x1 - x0)) / (f1 - f0);
    const fx = f(x);
    if (fx * f1 < 0) {
      x0 = x1;
      f0 = f1;
    } else {
      f0 /= 2;
    }
    const settled = Math.abs(x - x1) <= 1e-12 * Math.abs(x);
    x1 = x;
    f1 = fx;
    if (settled) break;
  }
  return x1;
}
