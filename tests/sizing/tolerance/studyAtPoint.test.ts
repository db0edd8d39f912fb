import { describe, expect, it } from 'vitest';
import { filterParts } from '../../../src/engine/models/filter.ts';
import type { Dimension } from '../../../src/sizing/tolerance/Dimension.ts';
import { pointWords } from '../../../src/sizing/tolerance/pointWords.ts';
import { studyAtPoint } from '../../../src/sizing/tolerance/studyAtPoint.ts';
import { defaultTolerances } from '../../../src/sizing/tolerance/ToleranceSettings.ts';
import { toleranceSpace } from '../../../src/sizing/tolerance/toleranceSpace.ts';
import type { Filter, Study, StudyElement } from '../../../src/study/index.ts';
import { studyOf } from '../../engine/study.ts';

const supply: StudyElement = {
  id: 'grid',
  kind: 'supply',
  bus: 'lv',
  shortCircuitMVA: 40,
  shortCircuitMVAMin: 10,
  xOverR: 5,
  background: [{ h: 5, percent: 2 }],
};

const withParts = (...parts: StudyElement[]): Study =>
  studyOf([{ id: 'lv', nominalV: 400 }], [supply, ...parts]);

function pointOf(study: Study, kinds: Partial<Record<Dimension['kind'], number>>) {
  const dimensions = toleranceSpace(study, 'base');
  const point = Float64Array.from(dimensions, ({ kind }) => kinds[kind] ?? 1);
  return { dimensions, ...studyAtPoint(study, 'base', dimensions, point) };
}

describe('a bank off its rated values', () => {
  const bank: StudyElement = {
    id: 'c',
    kind: 'bank',
    bus: 'lv',
    steps: [{ kvar: 50 }, { kvar: 50, on: false }],
    ratedV: 440,
    detuningPercent: 7,
  };

  it('keeps its choke when the capacitance moves, and its capacitance when the choke does', () => {
    const { study } = pointOf(withParts(bank), { capacitance: 1.08, inductance: 0.97 });
    const real = study.elements.find((part) => part.kind === 'bank');
    const xc = 440 ** 2 / 50e3;
    const actualXc = 440 ** 2 / ((real?.steps[0]?.kvar ?? 0) * 1e3);
    expect(actualXc).toBeCloseTo(xc / 1.08, 9);
    expect(((real?.detuningPercent ?? 0) / 100) * actualXc).toBeCloseTo(0.97 * 0.07 * xc, 9);
  });

  it('has its own band, the lower end less the ageing', () => {
    const axis = toleranceSpace(
      withParts({ ...bank, tolerancePercent: [-4, 6], ageingPercent: 20 }),
      'base',
    ).find(({ kind }) => kind === 'capacitance');
    expect(axis?.low).toBeCloseTo(0.96 * 0.8, 12);
    expect(axis?.high).toBeCloseTo(1.06, 12);
  });

  it('has no axes with every step off', () => {
    const off = { ...bank, steps: [{ kvar: 50, on: false }] };
    expect(toleranceSpace(withParts(off), 'base').some(({ part }) => part === 'c')).toBe(false);
  });
});

describe('a filter off its rated values', () => {
  const filter = (type: Filter['type']): Filter => ({
    id: 'f',
    kind: 'filter',
    bus: 'lv',
    type,
    kvar: 80,
    tunedOrder: 4.8,
    qFactor: type === 'single-tuned' ? 40 : 3,
    ratedV: 480,
  });
  const partsOf = (data: Filter) => filterParts({ lossWPerKvar: 0, connection: 'star', ...data }, 400);

  it.each([
    ['single-tuned', 0.97],
    ['high-pass', 1],
  ] as const)(
    '%s: capacitor and choke by their own factors, its resistance with the choke only in series',
    (type, r) => {
      const { study } = pointOf(withParts(filter(type)), { capacitance: 1.08, inductance: 0.97 });
      const rated = partsOf(filter(type));
      const real = partsOf(study.elements.find((part) => part.kind === 'filter') as Filter);
      expect(real.xc).toBeCloseTo(rated.xc / 1.08, 9);
      expect(real.xl).toBeCloseTo(rated.xl * 0.97, 9);
      expect(real.r).toBeCloseTo(rated.r * r, 9);
    },
  );
});

describe('the site off its rated values', () => {
  it('moves fault level, background and frequency by their factors', () => {
    const { study, frequencyFactor } = pointOf(withParts(), {
      'fault-level': 0.25,
      background: 0.5,
      frequency: 0.99,
    });
    const real = study.elements.find((part) => part.kind === 'supply');
    expect(real?.shortCircuitMVA).toBe(10);
    expect(real?.background?.[0]?.percent).toBe(1);
    expect(frequencyFactor).toBe(0.99);
  });

  it('takes every motor out at once, and says so', () => {
    const motor: StudyElement = { id: 'm', kind: 'motor', bus: 'lv', ratedKW: 30 };
    const { study, dimensions } = pointOf(withParts(motor), { motors: 0 });
    expect(study.elements.find(({ id }) => id === 'm')?.on).toBe(false);
    const point = Float64Array.from(dimensions, ({ kind }) =>
      kind === 'motors' ? 0 : kind === 'frequency' ? 1.01 : 1,
    );
    expect(pointWords(dimensions, point)).toBe('frequency +1 %, motors off');
  });

  it('is wider in frequency on a generator, where no supply feeds it', () => {
    const generator: StudyElement = {
      id: 'g',
      kind: 'generator',
      bus: 'lv',
      ratedKVA: 500,
      xdSubtransientPercent: 12,
    };
    const onGenerator = { ...withParts(generator), elements: [{ ...supply, on: false }, generator] };
    const axis = toleranceSpace(onGenerator, 'base').find(({ kind }) => kind === 'frequency');
    expect(axis?.high).toBeCloseTo(1.025, 12);
  });

  it('leaves out what the settings switch off', () => {
    const on = { ...defaultTolerances.on, frequency: false, 'fault-level': false, background: false };
    expect(toleranceSpace(withParts(), 'base', { ...defaultTolerances, on })).toEqual([]);
  });

  it('never lets uk fall below what the load losses alone make of it', () => {
    const transformer: StudyElement = {
      id: 't',
      kind: 'transformer',
      from: 'mv',
      to: 'lv',
      ratedKVA: 100,
      hvV: 20000,
      lvV: 400,
      ukPercent: 2,
      loadLossKW: 1.95,
      vectorGroup: 'Dyn11',
    };
    const axis = toleranceSpace(withParts(transformer), 'base').find(({ part }) => part === 't');
    expect(2 * (axis?.low ?? 0)).toBeGreaterThan(1.95);
    expect(
      toleranceSpace(withParts({ ...transformer, ukTested: true }), 'base').some(({ part }) => part === 't'),
    ).toBe(false);
  });
});
