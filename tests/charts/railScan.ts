import type { RailScan } from '../../src/charts/index.ts';
import type { ImpedanceScan } from '../../src/engine/types.ts';

/** Impedance per phase of a site behind 12.69 mΩ + j·h·10.16 mΩ at 400 V with a bank of `kvar`, detuned by `p`. */
export function impedance(h: number, kvar: number, p: number): { re: number; im: number } {
  const grid = { re: 1.28e-3 * Math.sqrt(h), im: 10.16e-3 * h };
  if (kvar === 0) return grid;
  const xc = (0.4 * 0.4 * 1000) / kvar;
  const bank = { re: 0.0003 * xc + (p * xc) / 50, im: h * p * xc - xc / h };
  const re = grid.re * bank.re - grid.im * bank.im;
  const im = grid.re * bank.im + grid.im * bank.re;
  const sumRe = grid.re + bank.re;
  const sumIm = grid.im + bank.im;
  const square = sumRe * sumRe + sumIm * sumIm;
  return { re: (re * sumRe + im * sumIm) / square, im: (im * sumRe - re * sumIm) / square };
}

function scan(kvar: number, p: number): ImpedanceScan {
  const points = 1000;
  const frequencyHz = Float64Array.from({ length: points }, (_, i) => 40 + (i * 2460) / (points - 1));
  const z = Array.from(frequencyHz, (hz) => impedance(hz / 50, kvar, p));
  const size = z.map((one) => Math.hypot(one.re, one.im));
  const resonances: ImpedanceScan['resonances'] = [];
  for (let i = 1; i < points - 1; i++) {
    const [a = 0, b = 0, c = 0] = size.slice(i - 1, i + 2);
    const order = (frequencyHz[i] ?? 0) / 50;
    if (b > a && b >= c) resonances.push({ order, kind: 'parallel', ohm: b, q: 12 });
    if (b < a && b <= c) resonances.push({ order, kind: 'series', ohm: b, q: null });
  }
  return {
    bus: 'main',
    sequence: 'positive',
    frequencyHz,
    re: Float64Array.from(z, (one) => one.re),
    im: Float64Array.from(z, (one) => one.im),
    resonances,
  };
}

/** Scans of the site with a bank and without it; invented values. */
export function railScan(kvar: number, p: number): RailScan {
  return { with: scan(kvar, p), without: scan(0, 0) };
}
