const golden = (3 - Math.sqrt(5)) / 2;
const tolerance = 2e-8;

/**
 * Place of the minimum of f between a and b, from an inner point `start`, to about 1e-7: golden section
 * with parabolic steps. R. P. Brent, Algorithms for Minimization without Derivatives, 1973, ch. 5.
 * A finer tolerance is lost in the rounding of f, which is flat there.
 */
export function minimum(f: (x: number) => number, a: number, b: number, start: number): number {
  let low = a;
  let high = b;
  let x = start;
  let w = x;
  let v = x;
  let fx = f(x);
  let fw = fx;
  let fv = fx;
  let step = 0;
  let before = 0;
  for (let round = 0; round < 100; round++) {
    const middle = (low + high) / 2;
    const tol = tolerance * Math.max(1, Math.abs(x));
    if (Math.abs(x - middle) <= 2 * tol - (high - low) / 2) break;
    const parabola = parabolicStep(x, w, v, fx, fw, fv);
    const usable =
      Math.abs(before) > tol &&
      Math.abs(parabola) < Math.abs(before / 2) &&
      x + parabola > low + 2 * tol &&
      x + parabola < high - 2 * tol;
    if (usable) {
      before = step;
      step = parabola;
    } else {
      before = x < middle ? high - x : low - x;
      step = golden * before;
    }
    const u = x + (Math.abs(step) >= tol ? step : Math.sign(step) * tol);
    const fu = f(u);
    if (fu <= fx) {
      if (u < x) high = x;
      else low = x;
      [v, w, x] = [w, x, u];
      [fv, fw, fx] = [fw, fx, fu];
      continue;
    }
    if (u < x) low = u;
    else high = u;
    if (fu <= fw || w === x) {
      [v, w] = [w, u];
      [fv, fw] = [fw, fu];
    } else if (fu <= fv || v === x || v === w) {
      v = u;
      fv = fu;
    }
  }
  return x;
}

/** From x to the vertex of the parabola through three points; not finite where they lie in line. */
function parabolicStep(x: number, w: number, v: number, fx: number, fw: number, fv: number): number {
  const r = (x - w) * (fx - fv);
  const q = (x - v) * (fx - fw);
  return ((x - v) * q - (x - w) * r) / (2 * (r - q));
}
