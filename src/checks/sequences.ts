/** A phasor in rectangular form. */
export interface Rectangular {
  re: number;
  im: number;
}

const HALF_ROOT3 = Math.sqrt(3) / 2;

/** (x1 + a^s·x2 + a^2s·x3)/3 with a = 1∠120°, s = +1 or −1. */
function component(phases: readonly Rectangular[], s: 1 | -1): Rectangular {
  const [x1, x2, x3] = phases;
  if (!x1 || !x2 || !x3) throw new RangeError(`${phases.length} phasors: three are needed`);
  const q = s * HALF_ROOT3;
  return {
    re: (x1.re - (x2.re + x3.re) / 2 - q * (x2.im - x3.im)) / 3,
    im: (x1.im - (x2.im + x3.im) / 2 + q * (x2.re - x3.re)) / 3,
  };
}

/** V1 = (VL1 + a·VL2 + a²·VL3)/3. */
export const positiveSequence = (phases: readonly Rectangular[]): Rectangular => component(phases, 1);

/** V2 = (VL1 + a²·VL2 + a·VL3)/3. */
export const negativeSequence = (phases: readonly Rectangular[]): Rectangular => component(phases, -1);
