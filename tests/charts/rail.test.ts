import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Box, boxesMeet, boxInside } from '../../src/charts/figure/box.ts';
import { handleLabelBox } from '../../src/charts/rail/handleLabelBox.ts';
import { impedanceAt, impedanceCurve, ohmAt } from '../../src/charts/rail/impedanceCurve.ts';
import { injectedOrders, injectionHeights } from '../../src/charts/rail/injections.ts';
import { ohmAxis } from '../../src/charts/rail/ohmAxis.ts';
import { orderAxis, panDomain, revealOrder, zoomDomain } from '../../src/charts/rail/orderAxis.ts';
import { readOrderEntry } from '../../src/charts/rail/orderEntry.ts';
import { fineOrderStep, snappedOrder, wholeOrderStep } from '../../src/charts/rail/orderSteps.ts';
import { orderTicks } from '../../src/charts/rail/orderTicks.ts';
import { railKeyAction } from '../../src/charts/rail/railKeys.ts';
import { railLayout } from '../../src/charts/rail/railLayout.ts';
import { fullDomain, railModel } from '../../src/charts/rail/railModel.ts';
import { railPeaks, steppedPeak } from '../../src/charts/rail/railPeaks.ts';
import { handleValueText, handleWords, peakWords } from '../../src/charts/rail/railWords.ts';
import { impedance, railScan } from './railScan.ts';

const FULL = { low: 0.8, high: 51.5 };
const SEED = { seed: 20261201, numRuns: 120 };
const view = fc
  .tuple(fc.double({ min: 0.8, max: 40, noNaN: true }), fc.double({ min: 1.02, max: 60, noNaN: true }))
  .map(([low, ratio]) => ({ low, high: Math.min(51.5, low * ratio) }))
  .filter(({ low, high }) => high / low > 1.015);

describe('the order axis', () => {
  it('is logarithmic and reads back what it draws', () => {
    const axis = orderAxis(FULL, 50, 1400);
    expect(axis.order(axis.x(7.18))).toBeCloseTo(7.18, 9);
    expect(axis.x(10) - axis.x(5)).toBeCloseTo(axis.x(20) - axis.x(10), 9);
    expect(() => orderAxis({ low: 0, high: 5 }, 0, 1)).toThrow(RangeError);
  });

  it('zooms about an order that keeps its place and never leaves the whole axis', () => {
    fc.assert(
      fc.property(
        view,
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 0.2, max: 5, noNaN: true }),
        (from, share, factor) => {
          const about = from.low * (from.high / from.low) ** share;
          const to = zoomDomain(from, FULL, about, factor);
          expect(to.low).toBeGreaterThanOrEqual(FULL.low);
          expect(to.high).toBeLessThanOrEqual(FULL.high);
          expect(to.high).toBeGreaterThan(to.low);
        },
      ),
      SEED,
    );
    const closer = zoomDomain({ low: 2, high: 20 }, FULL, 7, 0.5);
    const at = (domain: { low: number; high: number }) => orderAxis(domain, 0, 1).x(7);
    expect(at(closer)).toBeCloseTo(at({ low: 2, high: 20 }), 9);
  });

  it('pans without changing its span and follows a handle that leaves the view', () => {
    const moved = panDomain({ low: 4, high: 8 }, FULL, 10);
    expect(moved.high).toBeCloseTo(FULL.high, 9);
    expect(moved.high / moved.low).toBeCloseTo(2, 9);
    const followed = revealOrder({ low: 4, high: 8 }, FULL, 11);
    expect(followed.low).toBeLessThan(11);
    expect(followed.high).toBeGreaterThan(11);
    expect(revealOrder({ low: 4, high: 8 }, FULL, 5)).toEqual({ low: 4, high: 8 });
  });

  it('never lays order or hertz labels over one another, at any zoom and width', () => {
    fc.assert(
      fc.property(view, fc.integer({ min: 240, max: 1900 }), fc.constantFrom(50, 60), (domain, width, fn) => {
        const ticks = orderTicks(orderAxis(domain, 50, width), fn, 11);
        for (const row of ['label', 'hzLabel'] as const) {
          const shown = ticks.filter((tick) => tick[row] !== null);
          shown.slice(1).forEach((tick, i) => {
            const before = shown[i];
            const half = (text: string | null) => ((text ?? '').length * 11 * 0.5) / 2;
            if (before) expect(tick.x - before.x).toBeGreaterThan(half(tick[row]) + half(before[row]));
          });
        }
      }),
      SEED,
    );
  });

  it('labels the fundamental and the characteristic orders first, and fractions when zoomed', () => {
    const labels = (low: number, high: number) =>
      orderTicks(orderAxis({ low, high }, 50, 1400), 50, 11)
        .map((tick) => tick.label)
        .filter((label) => label !== null);
    expect(labels(0.8, 51.5)).toEqual(
      expect.arrayContaining(['1', '3', '5', '7', '11', '13', '17', '19', '23', '25']),
    );
    expect(labels(6.9, 7.4)).toEqual(expect.arrayContaining(['7', '7.1', '7.2', '7.3']));
  });
});

describe('the impedance curve', () => {
  it('reaches the refined height of a resonance between two scan points', () => {
    const scan = {
      bus: 'b',
      sequence: 'positive' as const,
      frequencyHz: new Float64Array([300, 400]),
      re: new Float64Array([0.1, 0.1]),
      im: new Float64Array([0, 0]),
      resonances: [{ order: 7.1, kind: 'parallel' as const, ohm: 5, q: 40 }],
    };
    const curve = impedanceCurve(scan, 50);
    expect(curve.points.map((point) => point.order)).toEqual([6, 7.1, 8]);
    expect(ohmAt(curve, 7.1)).toBe(5);
    expect(ohmAt(curve, 6)).toBeCloseTo(0.1, 12);
    expect(ohmAt(curve, 9)).toBeNull();
  });

  it('follows the analytic impedance of the site to two thousandths off the sharp flanks', () => {
    const { with: scan } = railScan(300, 0.07);
    for (const h of [1, 2.77, 7, 11.01, 49.9]) {
      const exact = impedance(h, 300, 0.07);
      const read = impedanceAt(scan, h * 50);
      expect(Math.hypot((read?.re ?? 0) - exact.re, (read?.im ?? 0) - exact.im)).toBeLessThan(
        2e-3 * Math.hypot(exact.re, exact.im),
      );
    }
    expect(impedanceAt(scan, 20)).toBeNull();
    expect(impedanceAt(scan, 3000)).toBeNull();
  });

  it('is empty for a scan that failed', () => {
    const none = new Float64Array();
    const failed = {
      bus: 'b',
      sequence: 'zero' as const,
      frequencyHz: none,
      re: none,
      im: none,
      resonances: [],
      error: 'no zero-sequence path',
    };
    const layout = railLayout(800, 150, 11);
    const model = railModel(
      { scan: { with: failed, without: failed }, frequencyHz: 50, injected: [] },
      fullDomain({ with: failed, without: failed }, 50, 50),
      layout,
      { textSize: 12, smallSize: 11 },
    );
    expect(model.withPath).toBeNull();
    expect(model.ohm).toBeNull();
    expect(model.peaks).toEqual([]);
  });

  it('has at least a decade of height, so that a flat curve is not blown up', () => {
    const axis = ohmAxis({ min: 0.1, max: 0.1 }, 0, 100);
    expect(axis.y(0.1)).toBeCloseTo(50, 9);
    expect(ohmAxis({ min: 0.002, max: 0.7 }, 0, 100).decades.map((decade) => decade.label)).toEqual([
      '10 mΩ',
      '100 mΩ',
    ]);
  });
});

describe('peaks', () => {
  it('carry the amplification against the impedance without the correction', () => {
    const scan = railScan(300, 0);
    const [peak] = railPeaks(scan.with, scan.without, 50);
    const order = peak?.order ?? 0;
    const without = impedance(order, 0, 0);
    expect(peak?.kind).toBe('parallel');
    expect(peak?.amplification).toBeCloseTo((peak?.ohm ?? 0) / Math.hypot(without.re, without.im), 3);
    expect(peakWords({ order: 7.18, kind: 'parallel', ohm: 1, q: 12.1, amplification: 11.9 })).toBe(
      'parallel h 7.18 · ×12 · Q 12',
    );
    expect(peakWords({ order: 3.8, kind: 'series', ohm: 1, q: null, amplification: null })).toBe(
      'series h 3.80',
    );
  });

  it('are stepped through round the ends', () => {
    const { with: seen, without } = railScan(300, 0.07);
    const peaks = railPeaks(seen, without, 50);
    expect(peaks.map((peak) => peak.kind)).toEqual(['parallel', 'series']);
    expect(steppedPeak(peaks, 1, 1)).toBe(peaks[0]);
    expect(steppedPeak(peaks, peaks[1]?.order ?? 0, 1)).toBe(peaks[0]);
    expect(steppedPeak(peaks, 1, -1)).toBe(peaks[1]);
    expect(steppedPeak([], 1, 1)).toBeNull();
  });

  it('have flags inside the rail that never cover one another, however many and however narrow', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(fc.double({ min: 1, max: 50, noNaN: true }), fc.boolean()), { maxLength: 12 }),
        fc.integer({ min: 320, max: 1900 }),
        view,
        (rows, width, domain) => {
          const scan = railScan(300, 0.07);
          const resonances = rows.map(([order, up]) => ({
            order,
            kind: up ? ('parallel' as const) : ('series' as const),
            ohm: up ? 0.5 : 0.002,
            q: 20,
          }));
          const layout = railLayout(width, 150, 11);
          const model = railModel(
            { scan: { ...scan, with: { ...scan.with, resonances } }, frequencyHz: 50, injected: [] },
            domain,
            layout,
            { textSize: 12, smallSize: 11 },
          );
          const boxes = model.peaks.map((peak) => peak.box).filter((box): box is Box => box !== null);
          for (const box of boxes) expect(boxInside(box, layout.words)).toBe(true);
          boxes.forEach((a, i) => {
            for (const b of boxes.slice(i + 1)) expect(boxesMeet(a, b)).toBe(false);
          });
        },
      ),
      { seed: 20261201, numRuns: 60 },
    );
  });

  it('keep their words for a few well-spread resonances', () => {
    const layout = railLayout(1300, 150, 11);
    const scan = railScan(300, 0.07);
    const model = railModel({ scan, frequencyHz: 50, injected: [] }, FULL, layout, {
      textSize: 12,
      smallSize: 11,
    });
    expect(model.peaks.every((peak) => peak.box !== null)).toBe(true);
  });

  it('show the verdict of the resonance they belong to', () => {
    const scan = railScan(300, 0);
    const order = scan.with.resonances[0]?.order ?? 0;
    const model = railModel(
      {
        scan,
        frequencyHz: 50,
        injected: [],
        peakVerdicts: [
          { order: order * 1.002, verdict: 'watch' },
          { order: 3, verdict: 'fail' },
        ],
      },
      FULL,
      railLayout(1300, 150, 11),
      { textSize: 12, smallSize: 11 },
    );
    expect(model.peaks.map((peak) => peak.verdict)).toEqual(['watch']);
  });
});

describe('the handle', () => {
  it('keeps its words inside the rail wherever it stands', () => {
    const bounds = { x: 50, y: 1, width: 900, height: 110 };
    fc.assert(
      fc.property(
        fc.double({ min: 50, max: 950, noNaN: true }),
        fc.double({ min: 1, max: 111, noNaN: true }),
        (x, y) => {
          const box = handleLabelBox({ x, y }, { width: 190, height: 23 }, bounds, [], []);
          expect(
            boxInside(box, { ...bounds, width: bounds.width + 1e-9, height: bounds.height + 1e-9 }),
          ).toBe(true);
        },
      ),
      SEED,
    );
  });

  it('never lays its words over the flag of a peak or a current, at any size of the rail', () => {
    const place = fc.record({
      kvar: fc.integer({ min: 60, max: 600 }),
      p: fc.constantFrom(0, 0.0567, 0.07, 0.14),
      width: fc.integer({ min: 700, max: 2540 }),
      height: fc.integer({ min: 100, max: 260 }),
      share: fc.double({ min: 0.02, max: 0.98, noNaN: true }),
    });
    const injected = [5, 7, 11, 13, 17, 19, 23, 25].map((h) => ({ h, amps: 200 / h, name: 'drives' }));
    fc.assert(
      fc.property(place, ({ kvar, p, width, height, share }) => {
        const layout = railLayout(width, height, 11);
        const sizes = { textSize: 12, smallSize: 11 };
        const inputs = { scan: railScan(kvar, p), frequencyHz: 50, injected };
        const model = railModel(inputs, FULL, layout, sizes);
        const written = [
          ...model.peaks.flatMap((peak) => peak.box ?? []),
          ...model.injected.flatMap((tick) => tick.words?.box ?? []),
        ];
        for (const box of written)
          expect(boxInside(box, { ...layout.words, height: layout.axisY })).toBe(true);
        const handle = { x: layout.left + share * (layout.right - layout.left), y: layout.axisY / 2 };
        const size = { width: 205, height: 23 };
        const bounds = { ...layout.words, width: layout.width - layout.words.x - 2 };
        const box = handleLabelBox(handle, size, bounds, written, model.curveHeights);
        expect(written.filter((one) => boxesMeet(one, box))).toEqual([]);
      }),
      { seed: 44, numRuns: 60 },
    );
  });

  it('moves its words off a flag and stands right of the handle where nothing is in the way', () => {
    const bounds = { x: 0, y: 0, width: 900, height: 110 };
    const size = { width: 190, height: 23 };
    const free = handleLabelBox({ x: 300, y: 50 }, size, bounds, [], []);
    expect(free.x).toBeGreaterThan(300);
    const flag = { ...free };
    expect(boxesMeet(handleLabelBox({ x: 300, y: 50 }, size, bounds, [flag], []), flag)).toBe(false);
  });

  it('says order, hertz and impedance with its angle', () => {
    const probe = { re: 0.557, im: 0.284 };
    expect(handleWords(7, 50, probe).replace(/\u00a0/g, ' ')).toBe('h 7.000 · 350 Hz · 625 mΩ ∠ 27°');
    expect(handleValueText(7.18, 50, { re: 0.01, im: -0.02 }, undefined)).toContain(
      'order 7.180, 359.0 hertz',
    );
    expect(handleValueText(7.18, 50, { re: 0.01, im: -0.02 }, undefined)).toContain('capacitive');
    expect(handleWords(7, 50, probe, false)).toContain('· ≈ 625');
    expect(handleWords(7, 50, null)).toBe('h 7.000 · 350 Hz · impedance not known');
  });

  it('snaps to a whole order within a few pixels and leaves room between close ones', () => {
    const axis = orderAxis(FULL, 50, 1400);
    expect(snappedOrder(axis, axis.x(7) + 3)).toBe(7);
    expect(snappedOrder(axis, axis.x(7) + 12)).not.toBe(7);
    const between = (axis.x(48) + axis.x(49)) / 2;
    expect(Number.isInteger(snappedOrder(axis, between))).toBe(false);
    expect(snappedOrder(axis, axis.x(0.85))).toBeCloseTo(0.85, 9);
  });
});

describe('keys of the rail', () => {
  const state = {
    order: 7,
    full: FULL,
    maxOrder: 50,
    peaks: [{ order: 7.18, kind: 'parallel' as const, ohm: 1, q: 12, amplification: 12 }],
    injectedOrders: [5, 7, 11],
  };
  const order = (key: string, shift = false, from = 7) => {
    const action = railKeyAction(key, shift, { ...state, order: from });
    return action?.kind === 'order' ? action.order : action;
  };

  it('step whole orders, hundredths with Shift, injected orders with Page keys', () => {
    expect(order('ArrowRight')).toBe(8);
    expect(order('ArrowLeft')).toBe(6);
    expect(order('ArrowRight', false, 7.18)).toBe(8);
    expect(order('ArrowLeft', false, 7.18)).toBe(7);
    expect(order('ArrowRight', true)).toBe(7.01);
    expect(order('ArrowLeft', true, 7.18)).toBe(7.17);
    expect(order('PageUp')).toBe(11);
    expect(order('PageDown')).toBe(5);
    expect(order('PageUp', false, 11)).toBeNull();
  });

  it('find the peak, the fundamental and the end, and stop there', () => {
    expect(order('p')).toBe(7.18);
    expect(order('P', true, 9)).toBe(7.18);
    expect(order('Home')).toBe(1);
    expect(order('Escape')).toBe(1);
    expect(order('End')).toBe(50);
    expect(order('ArrowLeft', false, 1)).toBe(1);
    expect(order('ArrowRight', false, 51)).toBe(51.5);
  });

  it('open the entry with the digit typed and leave other keys to the page', () => {
    expect(railKeyAction('7', false, state)).toEqual({ kind: 'entry', text: '7' });
    expect(railKeyAction('x', false, state)).toBeNull();
    expect(railKeyAction('Tab', false, state)).toBeNull();
  });

  it('step down through hundredths and orders without drifting', () => {
    let at = 1;
    for (let i = 0; i < 618; i++) at = fineOrderStep(at, 1);
    expect(at).toBeCloseTo(7.18, 12);
    expect(wholeOrderStep(at, -1)).toBe(7);
  });
});

describe('a typed order or frequency', () => {
  it('is read as a person writes it', () => {
    const read = (text: string) => readOrderEntry(text, 50, FULL);
    expect(read('7')).toEqual({ order: 7 });
    expect(read('7,2')).toEqual({ order: 7.2 });
    expect(read(' h 11 ')).toEqual({ order: 11 });
    expect(read('350 Hz')).toEqual({ order: 7 });
    expect(read('0.35kHz')).toEqual({ order: 7 });
    expect(read('350')).toEqual({ order: 7 });
    expect(read('60hz')).toEqual({ order: 1.2 });
  });

  it('is refused in words when it means nothing or lies off the axis', () => {
    for (const text of ['', 'abc', '7 V', '1,2,3', '-5'])
      expect(readOrderEntry(text, 50, FULL)).toHaveProperty('problem');
    expect(readOrderEntry('5 kHz', 50, FULL)).toEqual({
      problem: 'Allowed are orders 0.8 to 51, that is up to 2575 Hz.',
    });
  });
});

describe('injected orders', () => {
  it('carry their currents over their ticks, the largest first, clear of one another and of the curves', () => {
    const injected = [5, 7, 11, 13, 17, 19, 23, 25, 29, 31].map((h) => ({
      h,
      amps: 300 / h,
      name: 'drives',
    }));
    const layout = railLayout(1400, 150, 11);
    const inputs = { scan: railScan(300, 0), frequencyHz: 50, injected };
    const model = railModel(inputs, FULL, layout, { textSize: 12, smallSize: 11 });
    const words = model.injected.flatMap((tick) => tick.words ?? []);
    expect(words[0]?.text).toBe('60\u00a0A');
    words.forEach(({ box }, i) => {
      for (const other of words.slice(i + 1)) expect(boxesMeet(box, other.box)).toBe(false);
    });
  });

  it('are added by magnitude over the sources and stand as high as their current', () => {
    const orders = injectedOrders([
      { h: 7, amps: 70, name: 'Fans' },
      { h: 5, amps: 120, name: 'Fans' },
      { h: 5, amps: 40, name: 'Pumps' },
      { h: 3, amps: 0, name: 'Grid', backgroundPercent: 1.5 },
      { h: 1, amps: 900, name: 'Fans' },
    ]);
    expect(orders.map((one) => [one.h, one.amps, one.backgroundPercent])).toEqual([
      [3, 0, 1.5],
      [5, 160, 0],
      [7, 70, 0],
    ]);
    expect(injectionHeights(orders, 32)).toEqual([0, 32, 14]);
  });
});
