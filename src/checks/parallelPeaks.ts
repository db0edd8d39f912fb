/** Complex values over ascending real orders, split. */
export interface OrderCurve {
  order: Float64Array;
  re: Float64Array;
  im: Float64Array;
}

/** 1/Z of a driving-point impedance over order. */
export function admittanceOf(
  frequencyHz: Float64Array,
  re: Float64Array,
  im: Float64Array,
  fundamentalHz: number,
): OrderCurve {
  const curve = {
    order: Float64Array.from(frequencyHz, (f) => f / fundamentalHz),
    re: new Float64Array(re.length),
    im: new Float64Array(re.length),
  };
  for (let i = 0; i < re.length; i++) {
    const r = re[i] ?? 0;
    const x = im[i] ?? 0;
    const square = r * r + x * x;
    curve.re[i] = r / square;
    curve.im[i] = -x / square;
  }
  return curve;
}

/**
 * Orders of the parallel resonances of a network admittance with a branch added: interior minima of
 * |Y + Y_branch|², each refined by the parabola through its three points (|Y|² is close to one there: the
 * conductance is nearly constant and the susceptance nearly straight).
 */
export function parallelPeaks(
  network: OrderCurve,
  branch: (h: number) => { re: number; im: number },
): number[] {
  const square = Float64Array.from(network.order, (h, i) => {
    const added = branch(h);
    return ((network.re[i] ?? 0) + added.re) ** 2 + ((network.im[i] ?? 0) + added.im) ** 2;
  });
  const peaks: number[] = [];
  for (let i = 1; i + 1 < square.length; i++) {
    const left = square[i - 1] ?? 0;
    const here = square[i] ?? 0;
    const right = square[i + 1] ?? 0;
    if (!(here < left && here <= right)) continue;
    const [a, b, c] = [network.order[i - 1] ?? 0, network.order[i] ?? 0, network.order[i + 1] ?? 0];
    peaks.push(parabolaVertex(a, b, c, left, here, right));
  }
  return peaks;
}

/** Abscissa of the extremum of the parabola through three points, spacing free; b where they lie on a line. */
function parabolaVertex(a: number, b: number, c: number, ya: number, yb: number, yc: number): number {
  const left = (b - a) * (yb - yc);
  const right = (b - c) * (yb - ya);
  return left === right ? b : b - ((b - a) * left - (b - c) * right) / (2 * (left - right));
}

/** The peak and present order that lie closest, by |h_r − h|/h; null where either list is empty. */
export function closestMeeting(
  peaks: readonly number[],
  present: readonly number[],
): { peak: number; order: number; distance: number } | null {
  let closest: { peak: number; order: number; distance: number } | null = null;
  for (const peak of peaks) {
    for (const order of present) {
      const distance = Math.abs(peak - order) / order;
      if (!closest || distance < closest.distance) closest = { peak, order, distance };
    }
  }
  return closest;
}
