import type { StarDelta } from '../study/index.ts';

/** A three-phase capacitor between ideal voltages, its chokes in the lines, some units missing. */
export interface UnevenBank {
  connection: StarDelta;
  /** Line-to-line volts of the busbar, balanced. */
  volts: number;
  /** X_L of one line, ohm. */
  reactorOhm: number;
  /** Star-equivalent X_c of the whole bank, ohm. */
  capacitorOhm: number;
  /** Share of each phase's (star) or branch's (delta) units that is still in, above 0 each, or 0 for none. */
  shares: readonly [number, number, number];
}

type Phasor = readonly [re: number, im: number];

/**
 * Volts at the fundamental across the capacitors of the three phases (star, phase-to-star-point) or branches
 * (delta L1L2, L2L3, L3L1); losses left out. Star: I_k = (V_k − V_N)/j(X_L − X_c,k), V_N = ΣY_k·V_k/ΣY_k, or 0
 * earthed. Delta with B = share/(3·X_c): u_k − X_L·Σ_m B_km·(u_k − u_m) = V_k at the capacitors' terminals.
 */
export function unitVoltages(bank: UnevenBank): [number, number, number] {
  return bank.connection === 'delta' ? deltaVoltages(bank) : starVoltages(bank);
}

function phaseVoltages(volts: number): [Phasor, Phasor, Phasor] {
  const phase = volts / Math.sqrt(3);
  const half = Math.sqrt(3) / 2;
  return [
    [phase, 0],
    [-phase / 2, -half * phase],
    [-phase / 2, half * phase],
  ];
}

function starVoltages({
  connection,
  volts,
  reactorOhm,
  capacitorOhm,
  shares,
}: UnevenBank): [number, number, number] {
  const source = phaseVoltages(volts);
  // Susceptances of the phases; a phase without units carries nothing.
  const y = shares.map((share) => (share > 0 ? 1 / (capacitorOhm / share - reactorOhm) : 0));
  const sum = y.reduce((total, value) => total + value, 0);
  const shift = (part: 0 | 1): number =>
    connection === 'star-earthed' || sum === 0
      ? 0
      : source.reduce((total, v, k) => total + (y[k] ?? 0) * v[part], 0) / sum;
  const neutral: Phasor = [shift(0), shift(1)];
  const across = (k: 0 | 1 | 2): number => {
    const share = shares[k];
    if (!(share > 0)) return 0;
    const size = Math.hypot(source[k][0] - neutral[0], source[k][1] - neutral[1]);
    return size * Math.abs(y[k] ?? 0) * (capacitorOhm / share);
  };
  return [across(0), across(1), across(2)];
}

function deltaVoltages({ volts, reactorOhm, capacitorOhm, shares }: UnevenBank): [number, number, number] {
  const source = phaseVoltages(volts);
  const [b01, b12, b20] = shares.map((share) => (reactorOhm * share) / (3 * capacitorOhm)) as [
    number,
    number,
    number,
  ];
  const rows: [number, number, number][] = [
    [1 - b01 - b20, b01, b20],
    [b01, 1 - b01 - b12, b12],
    [b20, b12, 1 - b12 - b20],
  ];
  const re = solveThree(
    rows,
    source.map(([real]) => real),
  );
  const im = solveThree(
    rows,
    source.map(([, imaginary]) => imaginary),
  );
  const between = (i: number, k: number, share: number): number =>
    share > 0 ? Math.hypot((re[i] ?? 0) - (re[k] ?? 0), (im[i] ?? 0) - (im[k] ?? 0)) : 0;
  return [between(0, 1, shares[0]), between(1, 2, shares[1]), between(2, 0, shares[2])];
}

/** Cramer's rule; RangeError where the chokes and capacitors cancel. */
function solveThree(rows: readonly [number, number, number][], right: readonly number[]): number[] {
  const [a, b, c] = rows as [[number, number, number], [number, number, number], [number, number, number]];
  const determinant = (p: readonly number[], q: readonly number[], r: readonly number[]): number =>
    p[0]! * (q[1]! * r[2]! - q[2]! * r[1]!) -
    p[1]! * (q[0]! * r[2]! - q[2]! * r[0]!) +
    p[2]! * (q[0]! * r[1]! - q[1]! * r[0]!);
  const whole = determinant(a, b, c);
  if (Math.abs(whole) < 1e-9) throw new RangeError('chokes and capacitors cancel at the fundamental');
  const withColumn = (column: number): number => {
    const put = (row: readonly number[], value: number): number[] =>
      row.map((entry, k) => (k === column ? value : entry));
    return determinant(put(a, right[0]!), put(b, right[1]!), put(c, right[2]!)) / whole;
  };
  return [0, 1, 2].map(withColumn);
}
