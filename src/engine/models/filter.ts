import { type PartLaw, writeInverse, writeZeroSequence } from './PartLaw.ts';

export interface FilterData {
  type: 'single-tuned' | 'high-pass' | 'c-type';
  kvar: number;
  tunedOrder: number;
  qFactor: number;
  lossWPerKvar: number;
  connection: 'delta' | 'star-earthed' | 'star';
}

/** A filter's star-equivalent parts at the fundamental, ohm; xc2 only in a C-type. */
export interface FilterParts {
  xc: number;
  xl: number;
  xc2: number;
  /** Series resistance (single-tuned) or damping resistor (the others). */
  r: number;
  /** Capacitor loss resistance. */
  rc: number;
}

/**
 * Parts of a filter of net `kvar` at the busbar's nominal voltage, tuned to n, quality q:
 * single-tuned and high-pass Xc = U²/Q·n²/(n² − 1), XL = Xc/n²; C-type Xc = U²/Q, XL = Xc2 = Xc/(n² − 1).
 * R = n·XL/q in series (single-tuned), q·n·XL in parallel (others).
 * Arrillaga and Watson, Power System Harmonics, 2nd ed. 2003 (from memory).
 */
export function filterParts(data: FilterData, nominalV: number): FilterParts {
  const n = data.tunedOrder;
  const netOhm = (nominalV * nominalV) / (data.kvar * 1e3);
  const cType = data.type === 'c-type';
  const xc = cType ? netOhm : (netOhm * n * n) / (n * n - 1);
  const xl = cType ? xc / (n * n - 1) : xc / (n * n);
  const r = data.type === 'single-tuned' ? (n * xl) / data.qFactor : data.qFactor * n * xl;
  return { xc, xl, xc2: cType ? xl : 0, r, rc: (data.lossWPerKvar / 1e3) * xc };
}

/** Filter admittance y1 = y2 = 1/Z(h) of its parts; y0 only star-earthed. */
export function filterLaw(data: FilterData, nominalV: number): PartLaw {
  const { xc, xl, xc2, r, rc } = filterParts(data, nominalV);
  const joinsZero = data.connection === 'star-earthed';
  if (data.type === 'single-tuned')
    return (h, out, at) => {
      writeInverse(rc + r, h * xl - xc / h, out, at + 2);
      writeZeroSequence(joinsZero, out, at);
    };
  return (h, out, at) => {
    // R in parallel with jx: R·x·(x + jR)/(R² + x²).
    const x = h * xl - xc2 / h;
    const scale = (r * x) / (r * r + x * x);
    writeInverse(rc + scale * x, scale * r - xc / h, out, at + 2);
    writeZeroSequence(joinsZero, out, at);
  };
}
