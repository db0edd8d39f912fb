import { cellOf, type FigureValues } from '../figure/FigureValues.ts';
import { impedanceAt } from './impedanceCurve.ts';
import type { RailScan } from './railModel.ts';

const DEGREES = 180 / Math.PI;

/** The scan point by point: order, hertz, size and angle of the impedance, and its size without the correction. */
export function railValues(scan: RailScan, frequencyHz: number): FigureValues {
  const { frequencyHz: hertz, re, im } = scan.with;
  return [
    ['order', 'Hz', '|Z|, Ω', 'angle, °', '|Z| without correction, Ω'],
    ...Array.from(hertz, (hz, i) => {
      const [x, y] = [re[i] ?? Number.NaN, im[i] ?? Number.NaN];
      const bare = impedanceAt(scan.without, hz);
      return [
        hz / frequencyHz,
        hz,
        Math.hypot(x, y),
        Math.atan2(y, x) * DEGREES,
        bare && Math.hypot(bare.re, bare.im),
      ].map(cellOf);
    }),
  ];
}
