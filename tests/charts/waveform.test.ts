import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { crestFactor, type PhasorSpectrum, waveform } from '../../src/charts/index.ts';
import { degreeTicks, millisecondTicks } from '../../src/charts/waveform/timeTicks.ts';
import { highestOrder, instantaneous, samplesPerPeriod } from '../../src/charts/waveform/waveform.ts';
import { waveModel } from '../../src/charts/waveform/waveModel.ts';
import { contentWords, waveDoubt } from '../../src/charts/waveform/waveWords.ts';

function spectrum(
  maxOrder: number,
  rows: readonly [h: number, k: number, re: number, im: number][],
): PhasorSpectrum {
  const re = new Float64Array(maxOrder * 3);
  const im = new Float64Array(maxOrder * 3);
  for (const [h, k, real, imaginary] of rows) {
    re[(h - 1) * 3 + k] = real;
    im[(h - 1) * 3 + k] = imaginary;
  }
  return { re, im };
}

describe('the waveform', () => {
  it('is √2 times the rms phasor on the cosine reference', () => {
    const values = waveform(spectrum(1, [[1, 0, 230, 0]]), 0, 1, 240);
    expect(values[0]).toBeCloseTo(230 * Math.SQRT2, 9);
    expect(values[60]).toBeCloseTo(0, 9);
    expect(values[120]).toBeCloseTo(-230 * Math.SQRT2, 9);
  });

  it('has the rms value of its orders (Parseval)', () => {
    const part = fc.double({ min: -100, max: 100, noNaN: true });
    const row = fc.tuple(fc.integer({ min: 1, max: 40 }), fc.constant(1), part, part);
    fc.assert(
      fc.property(fc.array(row, { minLength: 1, maxLength: 12 }), (rows) => {
        const of = spectrum(40, rows as [number, number, number, number][]);
        const samples = samplesPerPeriod(40);
        const values = waveform(of, 1, 40, samples);
        let square = 0;
        for (let n = 0; n < samples; n++) square += (values[n] ?? 0) ** 2 / samples;
        let expected = 0;
        for (let i = 0; i < of.re.length; i++) expected += (of.re[i] ?? 0) ** 2 + (of.im[i] ?? 0) ** 2;
        expect(square).toBeCloseTo(expected, 6);
      }),
      { seed: 20261201, numRuns: 40 },
    );
  });

  it('agrees with the exact instantaneous value at the time cursor', () => {
    const of = spectrum(13, [
      [1, 2, 200, -80],
      [5, 2, -12, 9],
      [13, 2, 3, 4],
    ]);
    const values = waveform(of, 2, 13, 360);
    for (const n of [0, 17, 200, 359]) expect(values[n]).toBeCloseTo(instantaneous(of, 2, 13, n / 360), 9);
  });

  it('tends to a square wave with the odd orders 1/h of its Fourier series, whose crest is the Gibbs overshoot', () => {
    // Fourier series of the square wave: (4/π)·Σ sin(hωt)/h, odd h; overshoot (2/π)·Si(π) = 1.178980 of the flat top.
    // Wilbraham–Gibbs constant (DLMF §6.16): Si(π) = 1.851937…
    const odd = Array.from({ length: 50 }, (_, i) => 2 * i + 1);
    const of = spectrum(
      99,
      odd.map((h) => [h, 0, 0, -4 / Math.PI / h / Math.SQRT2]),
    );
    const values = waveform(of, 0, 99, 9900);
    expect(Math.max(...values)).toBeCloseTo((2 / Math.PI) * 1.851937, 3);
    expect(values[2475]).toBeCloseTo(1, 1);
  });

  it('refuses fewer than two samples an order', () => {
    expect(() => waveform(spectrum(10, []), 0, 10, 19)).toThrow(RangeError);
  });

  it('has crest factor √2 for a sine and none where nothing flows', () => {
    expect(crestFactor(spectrum(5, [[1, 0, 3, 4]]), 0, 5)).toBeCloseTo(Math.SQRT2, 3);
    expect(crestFactor(spectrum(5, [[1, 0, 3, 4]]), 1, 5)).toBeNull();
  });
});

describe('what a waveform is made of', () => {
  it('is the fundamental, the orders up to N, or all the solution holds', () => {
    expect(highestOrder('fundamental', 50)).toBe(1);
    expect(highestOrder({ upTo: 25 }, 50)).toBe(25);
    expect(highestOrder({ upTo: 80 }, 50)).toBe(50);
    expect(highestOrder('all', 40)).toBe(40);
    expect(contentWords({ content: { upTo: 25 } }, 25, 50)).toBe('orders 1 to 25');
  });

  it('is refused under the summation law that gives no angles, but for the fundamental', () => {
    expect(waveDoubt('alpha', false, { content: 'all' })?.refused).toBe(true);
    expect(waveDoubt('alpha', true, { content: 'fundamental' })).toBeNull();
  });

  it('is drawn with unknown angles taken as 0, and says so', () => {
    expect(waveDoubt('phasor', true, { content: 'all' })).toEqual({
      refused: false,
      words: 'drawn with unknown angles taken as 0',
    });
    expect(waveDoubt('phasor', false, { content: 'all' })).toBeNull();
  });

  it('keeps voltage and current on scales of their own and draws each phase once', () => {
    const voltage = spectrum(3, [
      [1, 0, 230, 0],
      [1, 1, -115, -199],
      [1, 2, -115, 199],
    ]);
    const current = spectrum(3, [[1, 0, 10, 0]]);
    const model = waveModel(
      { voltage, current, maxOrder: 3, settings: { content: 'all', periods: 2, phases: 'all' } },
      { left: 0, right: 100, top: 0, bottom: 50 },
    );
    expect(model.peakV).toBeCloseTo(230 * Math.SQRT2, 1);
    expect(model.peakA).toBeCloseTo(10 * Math.SQRT2, 6);
    expect(model.curves.map((curve) => `${curve.quantity}${curve.phase}`)).toHaveLength(6);
    expect(model.curves.every((curve) => !curve.path.includes('NaN'))).toBe(true);
  });
});

describe('the time axis', () => {
  it('has round milliseconds at 50 Hz and stops inside a 60 Hz period', () => {
    expect(millisecondTicks(50, 1, 6).map((tick) => tick.label)).toEqual(['0', '4', '8', '12', '16', '20']);
    expect(millisecondTicks(60, 1, 6).at(-1)).toEqual({ share: expect.closeTo(0.96, 6), label: '16' });
  });

  it('marks quarter turns where there is room, half turns where not', () => {
    expect(degreeTicks(1, 6).map((tick) => tick.label)).toEqual(['0°', '90°', '180°', '270°', '360°']);
    expect(degreeTicks(2, 5).map((tick) => tick.label)).toEqual(['0°', '180°', '360°', '540°', '720°']);
  });
});
