import type { Bank, Bus, Filter } from '../study/index.ts';
import { withDefaults } from '../study/index.ts';

/** Kvar of the steps in service at the bank's rated voltage. */
export function kvarOn(bank: Bank): number {
  return bank.steps.reduce((sum, step) => (step.on === false ? sum : sum + step.kvar), 0);
}

/** Xc = ratedV²/Q_N per star-equivalent phase at the fundamental, ohm; null with no step on. */
export function bankXc(bank: Bank): number | null {
  const kvar = kvarOn(bank);
  return kvar > 0 ? bank.ratedV ** 2 / (kvar * 1000) : null;
}

/**
 * Xc of a filter's main capacitor, star-equivalent ohm at the fundamental (study format §4):
 * U²/Q·n²/(n²−1) for single-tuned and high-pass, U²/Q for the c-type.
 */
export function filterXc(filter: Filter, bus: Bus): number {
  const net = bus.nominalV ** 2 / (filter.kvar * 1000);
  const n2 = filter.tunedOrder ** 2;
  return filter.type === 'c-type' ? net : (net * n2) / (n2 - 1);
}

/** Series X_L of a filter, star-equivalent ohm at the fundamental: Xc/n², or Xc/(n²−1) for the c-type. */
export function filterXl(filter: Filter, bus: Bus): number {
  const n2 = filter.tunedOrder ** 2;
  return filterXc(filter, bus) / (filter.type === 'c-type' ? n2 - 1 : n2);
}

/**
 * Admittance of a bank with `kvar` of its steps in service at real order h, siemens per phase:
 * 1/(Rc + RL(h) + j(h·XL − Xc/h)), as the study format defines it.
 */
export function bankAdmittance(
  bank: Bank,
  bus: Bus,
  kvar: number,
): (h: number) => { re: number; im: number } {
  const full = withDefaults(bank, bus);
  const xc = bank.ratedV ** 2 / (kvar * 1000);
  const xl = (full.detuningPercent / 100) * xc;
  const rc = (full.lossWPerKvar / 1000) * xc;
  const rl = xl / full.reactorQ;
  const [share, exponent] = full.reactorSkin;
  return (h) => {
    const re = rc + rl * (1 - share + share * h ** exponent);
    const im = h * xl - xc / h;
    const square = re * re + im * im;
    return { re: re / square, im: -im / square };
  };
}

/**
 * |Y| of a filter at integer order h, siemens per star-equivalent phase, by the study format's laws of the
 * single-tuned, high-pass and c-type filter.
 */
export function filterAdmittance(filter: Filter, bus: Bus): (h: number) => number {
  const xc = filterXc(filter, bus);
  const xl = filterXl(filter, bus);
  const rc = (withDefaults(filter, bus).lossWPerKvar / 1000) * xc;
  const { type, tunedOrder: n, qFactor: q } = filter;
  if (type === 'single-tuned') return (h) => 1 / Math.hypot(rc + (n * xl) / q, h * xl - xc / h);
  const r = q * n * xl;
  return (h) => {
    const x = type === 'high-pass' ? h * xl : h * xl - xl / h;
    const square = r * r + x * x;
    return 1 / Math.hypot(rc + (r * x * x) / square, (r * r * x) / square - xc / h);
  };
}
