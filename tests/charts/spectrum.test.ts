import { describe, expect, it } from 'vitest';
import { boxesMeet } from '../../src/charts/figure/box.ts';
import { textWidth } from '../../src/charts/figure/textWidth.ts';
import { spectrumBars } from '../../src/charts/index.ts';
import { thdWords } from '../../src/charts/spectrum/SpectrumView.tsx';
import { lastShownOrder } from '../../src/charts/spectrum/spectrumBars.ts';
import { spectrumModel } from '../../src/charts/spectrum/spectrumModel.ts';

const MAX = 50;

function magnitudes(rows: readonly [h: number, k: number, value: number][]): Float64Array {
  const values = new Float64Array(MAX * 3);
  for (const [h, k, value] of rows) values[(h - 1) * 3 + k] = value;
  return values;
}

const FUNDAMENTAL: [number, number, number][] = [
  [1, 0, 230],
  [1, 1, 230],
  [1, 2, 115],
];

describe('the bars of a spectrum', () => {
  it('take the worst phase against its own fundamental', () => {
    const bars = spectrumBars(magnitudes([...FUNDAMENTAL, [5, 0, 11.5], [5, 2, 6.9]]), MAX, [
      { h: 5, limit: 6 },
    ]);
    expect(bars?.find((bar) => bar.h === 5)).toEqual({
      h: 5,
      percent: expect.closeTo(6, 9),
      value: 6.9,
      limit: 6,
      fails: false,
    });
  });

  it('take all phases against a common base when one is given', () => {
    const bars = spectrumBars(magnitudes([...FUNDAMENTAL, [7, 1, 20]]), MAX, [{ h: 7, limit: 4 }], 400);
    expect(bars?.find((bar) => bar.h === 7)).toMatchObject({ percent: 5, fails: true });
  });

  it('are absent without a fundamental, not 0', () => {
    expect(spectrumBars(magnitudes([[5, 0, 3]]), MAX, [])).toBeNull();
  });

  it('have no limit where the document gives none', () => {
    const bars = spectrumBars(magnitudes(FUNDAMENTAL), MAX, []);
    expect(bars).toHaveLength(MAX - 1);
    expect(bars?.every((bar) => bar.limit === null && !bar.fails)).toBe(true);
  });
});

describe('the spectrum picture', () => {
  const bars =
    spectrumBars(magnitudes([...FUNDAMENTAL, [5, 0, 9], [7, 0, 44.6], [11, 0, 1.2], [49, 1, 9]]), MAX, [
      { h: 5, limit: 6 },
      { h: 7, limit: 5 },
      { h: 49, limit: 1 },
    ]) ?? [];

  it('shows orders to 25, or as far as one fails', () => {
    expect(lastShownOrder(bars, MAX)).toBe(49);
    expect(
      lastShownOrder(
        bars.filter((bar) => bar.h < 40),
        MAX,
      ),
    ).toBe(25);
  });

  for (const width of [180, 300, 520, 900]) {
    it(`never lays order labels or value words over one another at ${width} px`, () => {
      const model = spectrumModel(bars, { width, height: 140, smallSize: 11, lastOrder: 50 });
      const labels = model.orderLabels.map(({ h, x }) => {
        const size = textWidth(String(h), 11);
        return { x: x - size / 2, y: 0, width: size, height: 11 };
      });
      const words = model.bars.flatMap(({ words: one }) =>
        one ? [{ x: one.x, y: one.y - 11, width: textWidth(one.text, 11), height: 11 }] : [],
      );
      expect(words.length).toBeGreaterThan(0);
      for (const list of [labels, words]) {
        list.forEach((a, i) => {
          for (const b of list.slice(i + 1)) expect(boxesMeet(a, b)).toBe(false);
        });
      }
      for (const one of words) expect(one.x + one.width).toBeLessThanOrEqual(width);
    });
  }

  it('keeps every bar and limit inside the frame', () => {
    const model = spectrumModel(bars, { width: 300, height: 140, smallSize: 11, lastOrder: 50 });
    for (const bar of model.bars) {
      expect(bar.top).toBeGreaterThanOrEqual(model.top - 1);
      expect(bar.top).toBeLessThanOrEqual(model.bottom);
      if (bar.limitY !== null) expect(bar.limitY).toBeGreaterThanOrEqual(model.top - 1);
    }
    expect(model.orderX(7)).toBeCloseTo(model.bars.find((bar) => bar.h === 7)?.x ?? Number.NaN, 9);
    expect(model.orderX(60)).toBeNull();
  });

  it('says the THD and its limit in words', () => {
    expect(thdWords(20.2, 8)).toBe('THD 20.2 % · above the limit 8 %');
    expect(thdWords(3.14, 6.5)).toBe('THD 3.1 % · limit 6.5 %');
    expect(thdWords(null, 8)).toBe('THD not known: no fundamental');
  });
});
