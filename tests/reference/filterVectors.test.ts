import { describe, expect, it } from 'vitest';
import { scanImpedance } from '../../src/engine/index.ts';
import type { Filter, Study, StudyElement } from '../../src/study/index.ts';
import { amps, solved, studyOf, volts } from '../engine/study.ts';

/**
 * Star-equivalent impedances of filters on 400 V, 50 Hz, with Xc 1.6 Ω, computed from the textbook
 * formulas (Arrillaga and Watson, Power System Harmonics; IEEE 1531; formulas from memory).
 */
const quiet = { ratedV: 480, lossWPerKvar: 1e-9 } as const;

/** A supply of almost no admittance in parallel leaves the filter's own impedance to be seen. */
function filterSite(filter: Omit<Filter, 'id' | 'kind' | 'bus' | 'ratedV'>): Study {
  return studyOf(
    [{ id: 'b', nominalV: 400 }],
    [
      { id: 'grid', kind: 'supply', bus: 'b', shortCircuitMVA: 1e-9, xOverR: 1 },
      { id: 'f', kind: 'filter', bus: 'b', ...quiet, ...filter },
    ],
  );
}

function impedance(study: Study, h: number): { re: number; im: number } {
  const frequencyHz = Float64Array.of(50 * h);
  const scan = scanImpedance(study, 'base', { bus: 'b', sequence: 'positive', frequencyHz });
  return { re: (scan.re[0] ?? Number.NaN) * 1e3, im: (scan.im[0] ?? Number.NaN) * 1e3 };
}

describe('single-tuned filter of net 104.742 kvar, n 4.7, q 50', () => {
  const n = 4.7;
  const study = filterSite({
    type: 'single-tuned',
    kvar: 100 * (n ** 2 / (n ** 2 - 1)),
    tunedOrder: n,
    qFactor: 50,
  });

  it('is 42.155 mΩ inductive at the 5th, above its tuning, with R 6.8085 mΩ', () => {
    expect(impedance(study, 5).im).toBeCloseTo(42.155, 3);
    expect(impedance(study, 5).re).toBeCloseTo(6.80851, 4);
  });

  it('gives its net kvar at nominal voltage and U_C/U 1.04742', () => {
    const supplied: Study = {
      ...study,
      elements: study.elements.map((e) => (e.kind === 'supply' ? { ...e, shortCircuitMVA: 1e8 } : e)),
    };
    const solution = solved(supplied);
    const current = amps(solution, 'f', 1);
    expect((3 * volts(solution, 'b', 1) * current) / 1e3).toBeCloseTo(104.742, 2);
    // The published ratio leaves the filter's resistance out.
    expect((current * 1.6) / volts(solution, 'b', 1)).toBeCloseTo(1.04742, 4);
  });
});

describe('second-order high-pass filter, n 11, q 3', () => {
  const n = 11;
  const study = filterSite({
    type: 'high-pass',
    kvar: 100 * (n ** 2 / (n ** 2 - 1)),
    tunedOrder: n,
    qFactor: 3,
  });
  it.each([
    [1, 0.40033, -1586.79],
    [5, 9.793, -255.37],
    [7, 18.789, -139.99],
    [11, 43.636, -14.545],
    [13, 58.621, 25.731],
    [25, 159.12, 146.04],
  ] as const)('has the published impedance at order %i: %d + j%d mΩ', (h, re, im) => {
    const z = impedance(study, h);
    expect(Math.abs(z.re / re - 1)).toBeLessThan(6e-5);
    expect(Math.abs(z.im / im - 1)).toBeLessThan(6e-5);
  });
});

describe('C-type filter of 100 kvar, n 5', () => {
  const xl = 1.6 / 24;
  const study = filterSite({
    type: 'c-type',
    kvar: 100,
    tunedOrder: 5,
    qFactor: 0.6531972647421809 / (5 * xl),
  });
  it.each([
    [3, 45.048, -367.82],
    [5, 126.43, -61.935],
    [7, 214.75, 78.278],
  ] as const)('has the published impedance at order %i: %d + j%d mΩ', (h, re, im) => {
    const z = impedance(study, h);
    expect(Math.abs(z.re / re - 1)).toBeLessThan(6e-5);
    expect(Math.abs(z.im / im - 1)).toBeLessThan(6e-5);
  });

  it('loses nothing at the fundamental: −j1600 mΩ', () => {
    const z = impedance(study, 1);
    expect(Math.abs(z.re)).toBeLessThan(1e-3);
    expect(z.im).toBeCloseTo(-1600, 3);
  });
});

/**
 * Filter design case study, 480 V, 60 Hz, 450 kvar tuned to 4.7 behind 1500 kVA, 6 %, background V5 1 %
 * (Dugan et al., Electrical Power Systems Quality, 2nd ed. 2003; recalled figures, recomputed).
 */
describe('published 480 V filter case study', () => {
  const parts: StudyElement[] = [
    {
      id: 'grid',
      kind: 'supply',
      bus: 'mv',
      shortCircuitMVA: 1e8,
      xOverR: 1e4,
      background: [{ h: 5, percent: 1, angleDeg: 0 }],
    },
    {
      id: 't',
      kind: 'transformer',
      from: 'mv',
      to: 'lv',
      ratedKVA: 1500,
      hvV: 12470,
      lvV: 480,
      ukPercent: 6,
      loadLossKW: 1e-3,
      vectorGroup: 'Dyn1',
    },
    {
      id: 'f',
      kind: 'bank',
      bus: 'lv',
      ratedV: 480,
      steps: [{ kvar: 450 }],
      detuningPercent: 100 / 4.7 ** 2,
      reactorQ: 1e6,
      lossWPerKvar: 1e-6,
    },
  ];
  const study = studyOf(
    [
      { id: 'mv', nominalV: 12470 },
      { id: 'lv', nominalV: 480 },
    ],
    parts,
    { frequencyHz: 60 },
  );
  const solution = solved(study);
  const toNominal = 480 / Math.sqrt(3) / volts(solution, 'lv', 1);

  it('has I1 566.93 A, capacitor voltage 502.76 V and 471.34 kvar at 480 V on the busbar', () => {
    const current = amps(solution, 'f', 1) * toNominal;
    expect(current).toBeCloseTo(566.93, 2);
    expect(current * 0.512 * Math.sqrt(3)).toBeCloseTo(502.76, 2);
    expect((3 * (480 / Math.sqrt(3)) * current) / 1e3).toBeCloseTo(471.34, 2);
  });

  it('draws 46.52 A of 5th harmonic from a background of 1 %', () => {
    expect(amps(solution, 'f', 5)).toBeCloseTo(46.52, 2);
  });

  it('resonates in parallel with the transformer at 3.976', () => {
    const span = { bus: 'lv', sequence: 'positive', fromHz: 180, toHz: 330, points: 301 } as const;
    const peak = scanImpedance(study, 'base', span).resonances.find(({ kind }) => kind === 'parallel');
    expect(peak?.order).toBeCloseTo(3.976, 3);
  });
});
