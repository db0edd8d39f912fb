import { describe, expect, it } from 'vitest';
import { builtInSpectra, builtInSpectrum, newStudy, spectrumOf } from '../../src/study/index.ts';
import { exampleStudy } from './exampleStudies.ts';

const distortion = (rows: readonly { percent: number }[]) => Math.hypot(...rows.map((row) => row.percent));

/**
 * Order h of the line current of a six-pulse bridge with firing angle 0 and overlap µ, by numerical
 * integration over the period: commutation follows (1 − cos θ)/(1 − cos µ), the rest of the block is flat.
 */
function overlapPercent(h: number, overlapDeg: number): number {
  const mu = (overlapDeg * Math.PI) / 180;
  const rise = (theta: number) => (1 - Math.cos(theta)) / (1 - Math.cos(mu));
  const block = (theta: number): number => {
    if (theta > (2 * Math.PI) / 3 + mu) return 0;
    if (theta < mu) return rise(theta);
    return theta > (2 * Math.PI) / 3 ? 1 - rise(theta - (2 * Math.PI) / 3) : 1;
  };
  const order = (n: number) => {
    const points = 120_000;
    let re = 0;
    let im = 0;
    for (let index = 0; index < points; index += 1) {
      const angle = ((index + 0.5) / points) * Math.PI;
      re += block(angle) * Math.cos(n * angle);
      im += block(angle) * Math.sin(n * angle);
    }
    return Math.hypot(re, im);
  };
  return (100 * order(h)) / order(1);
}

describe('Built-in spectra', () => {
  it('each have an origin, whole orders from 2, each once', () => {
    expect(new Set(builtInSpectra.map((spectrum) => spectrum.id)).size).toBe(builtInSpectra.length);
    for (const spectrum of builtInSpectra) {
      expect(spectrum.origin.length).toBeGreaterThan(10);
      const orders = spectrum.orders.map((row) => row.h);
      expect(new Set(orders).size).toBe(orders.length);
      expect(orders.every((h) => Number.isInteger(h) && h >= 2)).toBe(true);
      expect(spectrum.orders.every((row) => (row.angleDeg !== undefined) === spectrum.anglesKnown)).toBe(
        true,
      );
    }
  });

  it('the ideal six-pulse bridge has 100/h at 6k ± 1, turned for 6k − 1 (Fourier series of a 120° block)', () => {
    const rows = spectrumOf({ ...newStudy(), maxOrder: 13 }, 'six-pulse-ideal');
    expect(rows).toEqual([
      { h: 5, percent: 20, angleDeg: 180 },
      { h: 7, percent: 100 / 7, angleDeg: 0 },
      { h: 11, percent: 100 / 11, angleDeg: 180 },
      { h: 13, percent: 100 / 13, angleDeg: 0 },
    ]);
  });

  it('ideal pulse numbers 6 and 12 have a distortion of 30.02 % and 14.17 % up to order 49 (closed form)', () => {
    const study = { ...newStudy(), maxOrder: 49 };
    expect(distortion(spectrumOf(study, 'six-pulse-ideal'))).toBeCloseTo(30.02, 2);
    expect(distortion(spectrumOf(study, 'twelve-pulse-ideal'))).toBeCloseTo(14.17, 2);
  });

  it.each([10, 20, 30, 40])('an overlap of %d° follows the closed form of line commutation', (degrees) => {
    for (const row of builtInSpectrum(`six-pulse-overlap-${degrees}`)?.orders ?? []) {
      expect(row.percent, `order ${row.h}`).toBeCloseTo(overlapPercent(row.h, degrees), 3);
    }
  });

  it('drives by input reactance have the recalled distortion (from memory: 72.2, 44.1 and 35 % at 1, 3 and 5 %)', () => {
    for (const [percent, thd] of [
      [1, 72.2],
      [3, 44.1],
      [5, 35],
    ] as const) {
      expect(distortion(builtInSpectrum(`drive-reactance-${percent}`)?.orders ?? [])).toBeCloseTo(thd, 0);
    }
  });

  it('are cut at the highest order of the study', () => {
    expect(spectrumOf({ ...newStudy(), maxOrder: 100 }, 'six-pulse-ideal').at(-1)?.h).toBe(97);
    expect(spectrumOf({ ...newStudy(), maxOrder: 7 }, 'drive-reactance-3').map((row) => row.h)).toEqual([
      5, 7,
    ]);
  });
});

describe('A spectrum reference', () => {
  const study = exampleStudy('2-four-wire-480v');
  it('stands for the study’s own rows, or for rows given in place', () => {
    expect(spectrumOf(study, 'desk').map((row) => row.h)).toEqual([3, 5, 7, 9]);
    expect(
      spectrumOf(study, [
        { h: 1, percent: 100 },
        { h: 2, percent: 1 },
        { h: 17, percent: 1 },
      ]),
    ).toEqual([{ h: 2, percent: 1 }]);
  });
  it('nobody knows is a programming error', () => {
    expect(() => spectrumOf(study, 'nobody')).toThrow(RangeError);
  });
});
