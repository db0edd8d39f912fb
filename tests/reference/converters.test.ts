import { describe, expect, it } from 'vitest';
import { currentPhasor, terminalReading } from '../../src/engine/index.ts';
import { builtInSpectrum, type Converter, type Study, type StudyElement } from '../../src/study/index.ts';
import { amps, solved, stiffSupply, studyOf, terminalOf } from '../engine/study.ts';

function drive(more: Partial<Converter> = {}): StudyElement {
  return {
    id: 'drive',
    kind: 'converter',
    bus: 'b',
    kW: 100,
    powerFactor: 1,
    spectrum: 'six-pulse-ideal',
    ...more,
  };
}

function onStiffBus(...parts: StudyElement[]): Study {
  return studyOf([{ id: 'b', nominalV: 400 }], [stiffSupply('b'), ...parts], { maxOrder: 49 });
}

/** Complex Fourier coefficient of order h of a waveform sampled over one period, cosine reference. */
function fourier(wave: (angle: number) => number, h: number): { re: number; im: number } {
  const samples = 72_000;
  let re = 0;
  let im = 0;
  for (let k = 0; k < samples; k++) {
    const angle = (2 * Math.PI * (k + 0.5)) / samples;
    re += wave(angle) * Math.cos(h * angle);
    im -= wave(angle) * Math.sin(h * angle);
  }
  return { re: (2 * re) / samples, im: (2 * im) / samples };
}

describe('ideal six-pulse bridge', () => {
  /** A 120° block centred on the fundamental's peak. */
  const block = (angle: number): number => {
    const c = Math.cos(angle);
    return Math.abs(c) > 0.5 ? Math.sign(c) : 0;
  };

  it('draws the Fourier series of a 120° block: 1/h at h = 6k ± 1, turned at 6k − 1 (theory)', () => {
    const solution = solved(onStiffBus(drive()));
    const t = terminalOf(solution, 'drive');
    const first = currentPhasor(solution, t, 1, 0);
    const one = fourier(block, 1);
    for (let h = 1; h <= 49; h++) {
      const want = fourier(block, h);
      const got = currentPhasor(solution, t, h, 0);
      const turn = h * first.arg();
      const size = first.abs() / one.re;
      expect(got.re * Math.cos(turn) + got.im * Math.sin(turn)).toBeCloseTo(want.re * size, 4);
      expect(got.im * Math.cos(turn) - got.re * Math.sin(turn)).toBeCloseTo(want.im * size, 4);
    }
  });

  it('has a THD of 30.02 % up to the 49th (theory)', () => {
    const solution = solved(onStiffBus(drive()));
    expect(terminalReading(solution, terminalOf(solution, 'drive')).thdPercent[0]).toBeCloseTo(30.02, 2);
  });

  it('with overlap matches the Fourier series of cosine-shaped commutation at α = 0 (closed form, u = 20°)', () => {
    const u = Math.PI / 9;
    const ramp = (x: number): number => (1 - Math.cos(x)) / (1 - Math.cos(u));
    const wave = (angle: number): number => {
      const x = ((angle % (2 * Math.PI)) + 2 * Math.PI) % (2 * Math.PI);
      if (x >= Math.PI) return -wave(x - Math.PI);
      const third = (2 * Math.PI) / 3;
      if (x < u) return ramp(x);
      if (x < third) return 1;
      return x < third + u ? 1 - ramp(x - third) : 0;
    };
    const size = (h: number): number => Math.hypot(fourier(wave, h).re, fourier(wave, h).im);
    const spectrum = builtInSpectrum('six-pulse-overlap-20');
    expect(spectrum).toBeDefined();
    for (const row of spectrum?.orders ?? []) {
      if (row.h > 25) continue;
      expect((100 * size(row.h)) / size(1)).toBeCloseTo(row.percent, 4);
    }
    // The published rounding: 5th 18.42, 7th 12.11, 11th 5.954, 13th 4.224 per cent.
    expect((100 * size(5)) / size(1)).toBeCloseTo(18.42, 2);
    expect((100 * size(11)) / size(1)).toBeCloseTo(5.954, 3);
  });
});

describe('two equal six-pulse drives behind Dd0 and Dy11', () => {
  const transformer = (id: string, to: string, vectorGroup: string): StudyElement => ({
    id,
    kind: 'transformer',
    from: 'hv',
    to,
    ratedKVA: 1000,
    hvV: 20000,
    lvV: 400,
    ukPercent: 6,
    loadLossKW: 8,
    vectorGroup,
  });
  const study = studyOf(
    [
      { id: 'hv', nominalV: 20000 },
      { id: 'd', nominalV: 400 },
      { id: 'y', nominalV: 400 },
    ],
    [
      { id: 'grid', kind: 'supply', bus: 'hv', shortCircuitMVA: 200, xOverR: 10 },
      transformer('t1', 'd', 'Dd0'),
      transformer('t2', 'y', 'Dy11'),
      drive({ id: 'd1', bus: 'd', kW: 500 }),
      drive({ id: 'd2', bus: 'y', kW: 500 }),
    ],
    { maxOrder: 25 },
  );

  it('cancel the 5th, 7th, 17th and 19th at the supply and add the 11th, 13th, 23rd and 25th (theory)', () => {
    const solution = solved(study);
    for (const h of [5, 7, 17, 19])
      expect(amps(solution, 'grid', h)).toBeLessThan(1e-9 * amps(solution, 't1', h, 0, 'hv'));
    for (const h of [11, 13, 23, 25])
      expect(amps(solution, 'grid', h) / amps(solution, 't1', h, 0, 'hv')).toBeCloseTo(2, 9);
  });
});

describe('neutral of four-wire electronic loads', () => {
  it('carries 151.91 A where the phases carry 114.39 A (Masters, example 2.13: inputs as printed)', () => {
    const rows = [
      [3, 50],
      [5, 20],
      [7, 10],
      [9, 8],
      [11, 4],
      [13, 2],
    ] as const;
    const spectrum = rows.map(([h, percent]) => ({ h, percent, angleDeg: 0 }));
    const kW = (3 * 100 * (400 / Math.sqrt(3))) / 1e3;
    const solution = solved(onStiffBus(drive({ kW, wires: 4, spectrum })));
    const reading = terminalReading(solution, terminalOf(solution, 'drive'));
    expect(reading.neutralRmsA).toBeCloseTo(151.91, 2);
    expect(reading.rmsA[0]).toBeCloseTo(114.39, 2);
  });
});
