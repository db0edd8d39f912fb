import type { BusReading, CaseSolution } from '../types.ts';

type Three = [number, number, number];

/**
 * rms volts over all orders per phase and between phases (12, 23, 31), and THD(U) = √(Σ_{h≥2} U_h²)/U_1 in
 * per cent per phase; null where U_1 is below 1e-6 of nominal. RangeError for a bus the solution lacks.
 */
export function busReading(solution: CaseSolution, busIndex: number): BusReading {
  const { maxOrder, voltage, buses } = solution;
  if (!(busIndex >= 0 && busIndex < buses.length) || !solution.converged)
    throw new RangeError(`bus ${busIndex} is not among the ${solution.converged ? buses.length : 0} solved`);
  const nominal = (solution.nominalV?.[busIndex] ?? 0) / Math.sqrt(3);
  const rmsV: Three = [0, 0, 0];
  const rmsLL: Three = [0, 0, 0];
  const thdPercent: (number | null)[] = [];
  for (let k = 0; k < 3; k++) {
    let line = 0;
    let harmonics = 0;
    let first = 0;
    for (let h = 1; h <= maxOrder; h++) {
      const at = (busIndex * maxOrder + h - 1) * 3 + k;
      const square = voltage.re[at]! ** 2 + voltage.im[at]! ** 2;
      if (h === 1) first = square;
      else harmonics += square;
      line += solution.lineVoltage[at]! ** 2;
    }
    rmsV[k] = Math.sqrt(first + harmonics);
    rmsLL[k] = Math.sqrt(line);
    thdPercent.push(distortion(first, harmonics, Math.max(1e-6 * nominal, 0)));
  }
  return { rmsV, rmsLL, thdPercent };
}

/** 100·√harmonics/√first of squares; null where the fundamental is not above `least`. */
export function distortion(first: number, harmonics: number, least: number): number | null {
  const size = Math.sqrt(first);
  return size > 0 && size >= least ? 100 * Math.sqrt(harmonics / first) : null;
}
