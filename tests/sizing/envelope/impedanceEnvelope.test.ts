import { describe, expect, it } from 'vitest';
import { scanImpedance } from '../../../src/engine/index.ts';
import { peakPaths } from '../../../src/sizing/envelope/peakPaths.ts';
import {
  defaultFamilies,
  defaultTolerances,
  impedanceEnvelope,
  statesOf,
} from '../../../src/sizing/index.ts';
import { studyAtPoint } from '../../../src/sizing/tolerance/studyAtPoint.ts';
import { toleranceSpace } from '../../../src/sizing/tolerance/toleranceSpace.ts';
import type { StudyElement } from '../../../src/study/index.ts';
import { benchmarkSite, withDrives } from '../../reference/benchmarkSite.ts';

const motor: StudyElement = { id: 'm', kind: 'motor', bus: 'lv', ratedKW: 90, count: 3 };
const plain = withDrives(benchmarkSite({ steps: [{ kvar: 150 }, { kvar: 150 }] }));
const study = { ...plain, elements: [...plain.elements, motor] };
const frequencyHz = Float64Array.from({ length: 120 }, (_, k) => 50 * 1.03 ** k);

function whole(tolerances: typeof defaultTolerances | null, families = defaultFamilies) {
  const request = { bus: 'lv', states: statesOf(study, families).states ?? [], tolerances, frequencyHz };
  const steps = impedanceEnvelope(study, request);
  for (let next = steps.next(); ; next = steps.next()) if (next.done) return next.value;
}

const magnitudes = (point: Float64Array, dimensions: ReturnType<typeof toleranceSpace>): number[] => {
  const { study: actual, frequencyFactor } = studyAtPoint(study, 'base', dimensions, point);
  const scan = scanImpedance(
    actual,
    'base',
    { bus: 'lv', sequence: 'positive', frequencyHz },
    { frequencyFactor },
  );
  return Array.from(scan.re, (re, k) => Math.hypot(re, scan.im[k] ?? 0));
};

describe('the band of an impedance', () => {
  it('holds the rated curve and the curves of every state', () => {
    const band = whole(null);
    expect(band?.states).toBe(3);
    for (const kvar of [0, 150, 300]) {
      const steps = kvar === 0 ? [] : [{ kvar }];
      const elements = study.elements.map((part) =>
        part.id === 'bank' ? ({ ...part, steps } as StudyElement) : part,
      );
      const scan = scanImpedance({ ...study, elements }, 'base', {
        bus: 'lv',
        sequence: 'positive',
        frequencyHz,
      });
      scan.re.forEach((re, k) => {
        const ohm = Math.hypot(re, scan.im[k] ?? 0);
        expect(ohm).toBeGreaterThanOrEqual((band?.lowOhm[k] ?? Number.NaN) * (1 - 1e-12));
        expect(ohm).toBeLessThanOrEqual((band?.highOhm[k] ?? Number.NaN) * (1 + 1e-12));
      });
    }
  });

  it('with tolerances is nowhere narrower, and holds the curve at random points of the space but for the peaks’ tips', () => {
    const own = { ...defaultFamilies, steps: false };
    const rated = whole(null, own);
    const band = whole(defaultTolerances, own);
    frequencyHz.forEach((_, k) => {
      expect(band?.lowOhm[k]).toBeLessThanOrEqual(rated?.lowOhm[k] ?? Number.NaN);
      expect(band?.highOhm[k]).toBeGreaterThanOrEqual(rated?.highOhm[k] ?? Number.NaN);
    });
    const dimensions = toleranceSpace(study, 'base');
    let seed = 7;
    for (let trial = 0; trial < 40; trial++) {
      const point = Float64Array.from(dimensions, ({ kind, low, high }) => {
        seed = (Math.imul(seed, 1664525) + 1013904223) >>> 0;
        const share = seed / 2 ** 32;
        return kind === 'motors' ? Math.round(share) : low + share * (high - low);
      });
      magnitudes(point, dimensions).forEach((ohm, k) => {
        expect(ohm).toBeLessThan(1.25 * (band?.highOhm[k] ?? Number.NaN));
        expect(ohm).toBeGreaterThan((band?.lowOhm[k] ?? Number.NaN) / 1.25);
      });
    }
  });

  it('is none at a busbar that has no source in any state', () => {
    const dead = { ...study, buses: [...study.buses, { id: 'x', nominalV: 400 }] };
    const states = statesOf(dead, defaultFamilies).states ?? [];
    const steps = impedanceEnvelope(dead, { bus: 'x', states, tolerances: null, frequencyHz });
    let next = steps.next();
    while (!next.done) next = steps.next();
    expect(next.value).toBeNull();
  });
});

describe('the path of the peaks', () => {
  it('takes the parallel resonance from its lowest order to its highest, step by step', () => {
    const dimensions = toleranceSpace(study, 'base').filter(({ kind }) => kind !== 'motors');
    const [row = []] = peakPaths(dimensions, 6);
    const orders = row.map((point) => {
      const { study: actual, frequencyFactor } = studyAtPoint(study, 'base', dimensions, point);
      const span = { bus: 'lv', sequence: 'positive', fromHz: 100, toHz: 1000, points: 400 } as const;
      const found = scanImpedance(actual, 'base', span, { frequencyFactor }).resonances;
      return found.find(({ kind }) => kind === 'parallel')?.order ?? Number.NaN;
    });
    expect(orders).toHaveLength(7);
    orders.slice(1).forEach((order, k) => {
      expect(order).toBeGreaterThan(orders[k] ?? Number.NaN);
    });
  });
});
