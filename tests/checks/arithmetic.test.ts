import { describe, expect, it } from 'vitest';
import { thirdHarmonicRule } from '../../src/checks/cableLoad.ts';
import { innerDuty } from '../../src/checks/filterDuty.ts';
import { capacitorDuty, harmonicLoss, permissibleLoad } from '../../src/checks/index.ts';
import { closestMeeting, parallelPeaks } from '../../src/checks/parallelPeaks.ts';
import { stepSums } from '../../src/checks/stepSums.ts';

/** Amperes by order, index h − 1. */
function spectrum(rows: Record<number, number>): number[] {
  const last = Math.max(...Object.keys(rows).map(Number));
  return Array.from({ length: last }, (_, index) => rows[index + 1] ?? 0);
}

describe('duty of a capacitor from its own current', () => {
  // Dugan, McGranaghan, Santoso, Beaty, Electrical Power Systems Quality, 2nd ed. 2003, filter-design case
  // study (from memory): 450 kvar at 480 V, 60 Hz, I1 566.93 A, I5 407.37 A; recalled 698.1 A, 507.97 V,
  // 575.1 V, about 614 kvar.
  const duty = capacitorDuty(spectrum({ 1: 566.9304519202896, 5: 407.36570039595733 }), 0.512, 480);

  it('gives 698.1 A against 541.3 A rated: 129 %', () => {
    expect(duty.rmsA).toBeCloseTo(698.11, 2);
    expect(duty.ratedA).toBeCloseTo(541.27, 2);
    expect(duty.rmsA / duty.ratedA).toBeCloseTo(1.29, 3);
  });

  it('gives 502.8 V at the fundamental, 507.9 V rms and 575.0 V crest equivalent', () => {
    expect(duty.fundamentalV).toBeCloseTo(502.76, 2);
    expect(duty.rmsV).toBeCloseTo(507.92, 2);
    expect(duty.peakV).toBeCloseTo(575.01, 2);
    expect(duty.peakV / duty.ratedV).toBeCloseTo(1.198, 3);
    expect(duty.rmsV / duty.ratedV).toBeCloseTo(1.058, 3);
  });

  it('gives kvar 1.210 summed by order and 1.365 as the product of rms values', () => {
    expect(duty.kvarSum / duty.ratedKvar).toBeCloseTo(1.21, 3);
    expect(duty.kvarProduct / duty.ratedKvar).toBeCloseTo(1.365, 3);
    expect(duty.kvarProduct).toBeCloseTo(614.16, 2);
  });

  it('refuses a capacitor without reactance', () => {
    expect(() => capacitorDuty([1], 0, 400)).toThrow(RangeError);
  });
});

describe('transformer heating by harmonics', () => {
  it('F_HL is 2.7243 and the permissible load 0.9035 at P_EC-R 0.15', () => {
    // IEEE C57.110 example (from memory, printed 2.72): I_h/I at 1, 5, 7, 11, 13, 17, 19.
    const loss = harmonicLoss(
      spectrum({ 1: 0.978, 5: 0.171, 7: 0.108, 11: 0.044, 13: 0.028, 17: 0.015, 19: 0.0098 }),
      1,
    );
    expect(loss?.lossFactor).toBeCloseTo(2.7243, 4);
    expect(permissibleLoad(loss?.lossFactor ?? 0, 0.15)).toBeCloseTo(0.9035, 4);
  });

  it('K is 8.3476 for the public work sheet (second-hand: ΣI² 1.0838, I 1.0410, K 8.3476)', () => {
    const amperes = spectrum({
      1: 1,
      5: 0.2,
      7: 0.14,
      11: 0.091,
      13: 0.077,
      17: 0.058,
      19: 0.056,
      23: 0.043,
      25: 0.04,
    });
    const loss = harmonicLoss(amperes, Math.sqrt(amperes.reduce((sum, a) => sum + a * a, 0)));
    expect(loss?.rmsA).toBeCloseTo(1.041, 4);
    expect(loss?.kFactor).toBeCloseTo(8.3476, 4);
    expect(loss?.lossFactor).toBeCloseTo(8.3476, 4);
  });

  it('a sinusoidal load keeps the full rating whatever P_EC-R', () => {
    expect(permissibleLoad(1, 0.15)).toBe(1);
    expect(harmonicLoss([0, 0], 100)).toBeNull();
  });
});

describe('third harmonic in a cable', () => {
  // IEC 60364-5-52 Annex E (from memory).
  it.each([
    [0, 1, 'phase'],
    [15, 1, 'phase'],
    [15.1, 0.86, 'phase'],
    [33, 0.86, 'phase'],
    [33.1, 0.86, 'neutral'],
    [45, 0.86, 'neutral'],
    [45.1, 1, 'neutral'],
  ])('a share of %f per cent reduces by %f on the %s current', (share, factor, basis) => {
    expect(thirdHarmonicRule(share)).toMatchObject({ factor, basis });
  });
});

describe('step combinations', () => {
  it('n like steps make n values, unlike ones every sum once', () => {
    expect(stepSums([{ kvar: 50 }, { kvar: 50 }, { kvar: 50 }]).kvar).toEqual([50, 100, 150]);
    expect(stepSums([{ kvar: 25 }, { kvar: 50 }, { kvar: 100 }]).kvar).toEqual([
      25, 50, 75, 100, 125, 150, 175,
    ]);
    expect(stepSums([{ kvar: 0.1 }, { kvar: 0.2 }, { kvar: 0.3 }]).kvar.map((v) => v.toFixed(1))).toEqual([
      '0.1',
      '0.2',
      '0.3',
      '0.4',
      '0.5',
      '0.6',
    ]);
  });

  it('a thinned list tells how many there are and keeps both ends', () => {
    const sums = stepSums(
      Array.from({ length: 12 }, (_, i) => ({ kvar: 2 ** i })),
      50,
    );
    expect(sums.kvar).toHaveLength(50);
    expect(sums.total).toBeGreaterThan(50);
    expect(sums.kvar[0]).toBe(1);
    expect(sums.kvar.at(-1)).toBe(4095);
  });
});

describe('parallel resonance of an inductive network with capacitors', () => {
  const grid = Float64Array.from({ length: 300 }, (_, i) => 1 + i * 0.1);
  const network = (x: number, q: number) => {
    const re = new Float64Array(grid.length);
    const im = new Float64Array(grid.length);
    grid.forEach((h, i) => {
      const z = { re: x / q, im: h * x };
      const square = z.re ** 2 + z.im ** 2;
      re[i] = z.re / square;
      im[i] = -z.im / square;
    });
    return { order: grid, re, im };
  };

  // h = √(Ssc/Q). 1500 kVA 5.5 % behind 48 MVA with 350 kvar: 17 391 kVA, order 7.05 (second-hand).
  it('350 kvar on 17 391 kVA lies at order 7.049', () => {
    const ssc = 1 / (0.055 / 1500 + 1 / 48_000);
    expect(ssc).toBeCloseTo(17_391.3, 1);
    const peaks = parallelPeaks(network(1 / ssc, 200), (h) => ({ re: 0, im: h * 350 }));
    expect(peaks).toHaveLength(1);
    expect(peaks[0]).toBeCloseTo(7.049, 2);
  });

  it('5 Mvar on 125 MVA lies at order 5.0 (computed twice, independently)', () => {
    const peaks = parallelPeaks(network(1 / 125, 200), (h) => ({ re: 0, im: h * 5 }));
    expect(peaks[0]).toBeCloseTo(5, 2);
  });

  it('the peak closest to a present order is found by |h_r − h|/h', () => {
    expect(closestMeeting([4.4, 12.3], [5, 7, 11, 13])).toMatchObject({ peak: 12.3, order: 13 });
    expect(closestMeeting([], [5])).toBeNull();
  });
});

describe('inside a filter', () => {
  it('a high-pass of order 11, Q 3 on 400 V, 100 kvar loses 8.480 W per phase at the fundamental', () => {
    // Closed form: Xc 1.6 Ω, X_L 13.223 mΩ, R 436.36 mΩ, Z(1) 0.40033 − j1586.79 mΩ (own computation).
    const amperes = 400 / Math.sqrt(3) / Math.hypot(0.00040033, 1.58679);
    const duty = innerDuty({ type: 'high-pass', tunedOrder: 11, qFactor: 3 }, 1.6 / 121, [amperes]);
    expect(duty.resistorWPerPhase).toBeCloseTo(8.48, 2);
  });

  it('a c-type loses nothing at the fundamental', () => {
    const duty = innerDuty({ type: 'c-type', tunedOrder: 5, qFactor: 2 }, 1.6 / 24, [144]);
    expect(duty.resistorWPerPhase).toBeCloseTo(0, 12);
    expect(duty.reactorA).toBeCloseTo(144, 9);
  });
});
