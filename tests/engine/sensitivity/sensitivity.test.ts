import { describe, expect, it } from 'vitest';
import { compileNetwork } from '../../../src/engine/network/compileNetwork.ts';
import { DrivingPoint } from '../../../src/engine/sensitivity/DrivingPoint.ts';
import { impedanceSensitivity, resonanceElasticities } from '../../../src/engine/sensitivity/index.ts';
import { Jet } from '../../../src/engine/sensitivity/Jet.ts';
import { quantitiesOf } from '../../../src/engine/sensitivity/parameters.ts';
import { type SeriesElement, seriesJets } from '../../../src/engine/sensitivity/seriesJets.ts';
import { type ShuntElement, shuntJets } from '../../../src/engine/sensitivity/shuntJets.ts';
import type { Study } from '../../../src/study/index.ts';
import { balancedKinds, everyKind, withParameter } from './everyKind.ts';

const OMEGA = 100 * Math.PI;

function expectClose(jet: Jet | null, re: number, im: number): void {
  const size = Math.hypot(re, im);
  expect(Math.abs((jet?.c[0] ?? 0) - re)).toBeLessThanOrEqual(1e-13 * size);
  expect(Math.abs((jet?.c[1] ?? 0) - im)).toBeLessThanOrEqual(1e-13 * size);
}

describe('differentiable element models', () => {
  it.each([1, 2.7, 5, 13, 49])('equal the admittance laws of every kind at order %d', (h) => {
    const network = compileNetwork(everyKind, 'base');
    const { values: y } = network;
    for (const { element, law, at, bus } of network.shunts) {
      if (!law) continue;
      law(h, y, at);
      const place = { omega: OMEGA, nominalV: network.buses[bus]!.nominalV };
      const jets = shuntJets(element as ShuntElement, quantitiesOf(element), Jet.order(h), place);
      if (!/^L\d/.test('connection' in element ? String(element.connection) : '') || element.id === 'P1')
        expectClose(jets.y0, y[at]!, y[at + 1]!);
      expectClose(jets.y1, y[at + 2]!, y[at + 3]!);
    }
    for (const { element, law, at } of network.series) {
      law(h, y, at);
      const jets = seriesJets(element as SeriesElement, quantitiesOf(element), Jet.order(h), {
        omega: OMEGA,
      });
      [jets.ff0, jets.ff1, jets.tt0, jets.tt1, jets.ft0, jets.ft1].forEach((jet, k) => {
        expectClose(jet, y[at + 2 * k]!, y[at + 2 * k + 1]!);
      });
    }
  });

  it('a cable of many wavelengths keeps to its law as well', () => {
    const long = withParameter(everyKind, 'W1', 'lengthM', 60000);
    const network = compileNetwork(long, 'base');
    const { element, law, at } = network.series[0]!;
    for (const h of [3, 30, 90]) {
      law(h, network.values, at);
      const jets = seriesJets(element as SeriesElement, quantitiesOf(element), Jet.order(h), {
        omega: OMEGA,
      });
      expectClose(jets.ft1, network.values[at + 10]!, network.values[at + 11]!);
      expectClose(jets.ff0, network.values[at]!, network.values[at + 1]!);
    }
  });

  it('jets carry the first, second and mixed derivatives of a formula', () => {
    // f = √(p·h) / (p + h²): compared with its derivatives worked out by hand at h = 2, p = 3.
    const [h, p] = [Jet.order(2), Jet.parameter(3)];
    const f = p
      .times(h)
      .squareRoot()
      .over(p.plus(h.times(h)));
    const at = (x: number, y: number) => Math.sqrt(x * y) / (y + x * x);
    const d = 1e-4;
    expect(f.c[0]).toBeCloseTo(Math.sqrt(6) / 7, 14);
    expect(f.c[2]).toBeCloseTo(Math.sqrt(6) / 28 - (4 * Math.sqrt(6)) / 49, 13);
    expect(f.c[6]).toBeCloseTo(Math.sqrt(6) / 42 - Math.sqrt(6) / 49, 13);
    expect(2 * f.c[4]!).toBeCloseTo((at(2 + d, 3) - 2 * at(2, 3) + at(2 - d, 3)) / d ** 2, 6);
    const mixed = at(2 + d, 3 + d) - at(2 + d, 3 - d) - at(2 - d, 3 + d) + at(2 - d, 3 - d);
    expect(f.c[8]).toBeCloseTo(mixed / (4 * d * d), 6);
  });
});

const POINTS = [
  ['unbalanced', 'positive', 'main', 4.3],
  ['unbalanced', 'positive', 'yard', 20],
  ['unbalanced', 'zero', 'mill', 7],
  ['balanced', 'positive', 'hall', 1],
  ['balanced', 'zero', 'shed', 11.2],
] as const;

describe('sensitivity of a driving-point impedance', () => {
  it.each(POINTS)(
    '%s site, %s sequence at %s, order %d: every parameter of every kind agrees with central differences',
    (kind, sequence, bus, order) => {
      const study = kind === 'balanced' ? balancedKinds : everyKind;
      const at = { bus, order, sequence };
      const { impedance, parameters, error } = impedanceSensitivity(study, 'base', at);
      expect(error).toBeUndefined();
      if (!impedance) return;
      expect(parameters.length).toBeGreaterThan(110);
      for (const { element, field, value, dZ, elasticityMagnitude } of parameters) {
        const unit = value === 0 ? 1 : value;
        const step = 1e-5 * unit;
        const z = (x: number) =>
          new DrivingPoint(withParameter(study, element, field, x), 'base', at).impedance(order);
        const difference = z(value + step)
          .sub(z(value - step))
          .div(2 * step);
        const scale = unit / impedance.abs();
        const gap = difference.sub(dZ).abs() * scale;
        expect(gap, `${element}.${field}`).toBeLessThan(3e-7 * (1e-2 + dZ.abs() * scale));
        const along = (impedance.re * dZ.re + impedance.im * dZ.im) / impedance.abs() ** 2;
        expect(elasticityMagnitude).toBeCloseTo(value * along, 12);
      }
    },
  );

  it('names every part in service in study order, converters without a filter capacitor left out', () => {
    const bare = withParameter(everyKind, 'D1', 'filterCapacitanceUF', 0);
    const found = impedanceSensitivity(bare, 'base', { bus: 'main', order: 5, sequence: 'positive' });
    const named = [...new Set(found.parameters.map(({ element }) => element))];
    expect(named).toEqual(everyKind.elements.map(({ id }) => id).filter((id) => id !== 'D1'));
  });

  it('impedances scale: all ohmic data together by one per cent move |Z| by one per cent', () => {
    // Ssc, kVA and kvar are inverse ohms; X/R, ratios and percentages have none.
    const sign: Record<string, number> = {
      shortCircuitMVA: -1,
      kvar: -1,
      ratedKVA: -1,
      kW: -1,
      ratedKW: -1,
      lengthM: 1,
    };
    const study: Study = {
      ...balancedKinds,
      elements: balancedKinds.elements
        .filter(({ id }) => ['Q', 'T2', 'W2', 'M1', 'C2', 'F2'].includes(id))
        .map((part) => (part.id === 'T2' ? { ...part, from: 'grid' } : part)),
    };
    const scaled: Study = {
      ...study,
      elements: study.elements.map((part) =>
        part.kind === 'transformer' ? { ...part, loadLossKW: 0 } : part,
      ),
    };
    const { parameters } = impedanceSensitivity(scaled, 'base', {
      bus: 'mill',
      order: 5,
      sequence: 'positive',
    });
    const sum = parameters.reduce(
      (total, { field, elasticityMagnitude }) => total + (sign[field] ?? 0) * elasticityMagnitude,
      0,
    );
    expect(sum).toBeCloseTo(1, 9);
  });

  it('a busbar without a source or without a zero-sequence path says so', () => {
    const dark: Study = {
      ...everyKind,
      elements: everyKind.elements.filter(({ kind }) => kind !== 'supply' && kind !== 'generator'),
    };
    expect(impedanceSensitivity(dark, 'base', { bus: 'main', order: 5, sequence: 'positive' })).toEqual({
      parameters: [],
      error: 'the busbar has no path to a source',
    });
    const open: Study = {
      ...balancedKinds,
      elements: balancedKinds.elements
        .filter(({ id }) => ['Q', 'W1', 'T3', 'P2'].includes(id))
        .map((part) => (part.id === 'P2' ? { ...part, neutral: false } : part)),
    };
    expect(impedanceSensitivity(open, 'base', { bus: 'shed', order: 5, sequence: 'zero' }).error).toBe(
      'the busbar has no zero-sequence path',
    );
    expect(() =>
      impedanceSensitivity(everyKind, 'base', { bus: 'nowhere', order: 5, sequence: 'zero' }),
    ).toThrow(RangeError);
    expect(() =>
      impedanceSensitivity(everyKind, 'base', { bus: 'main', order: 0, sequence: 'zero' }),
    ).toThrow('order 0');
  });

  it('parts of the correction can be left out', () => {
    const { parameters } = impedanceSensitivity(everyKind, 'base', {
      bus: 'main',
      order: 5,
      sequence: 'positive',
      without: new Set(['C1', 'F1']),
    });
    expect(parameters.some(({ element }) => element === 'C1' || element === 'F1')).toBe(false);
  });
});

/** Order of the extremum of |Z| near a start, by golden section. */
function extremum(study: Study, bus: string, low: number, high: number, sign: 1 | -1): number {
  const point = new DrivingPoint(study, 'base', { bus, sequence: 'positive' });
  const size = (order: number) => sign * point.impedance(order).abs();
  const ratio = (Math.sqrt(5) - 1) / 2;
  let [a, b] = [low, high];
  while (b - a > 1e-7 * b) {
    const [c, d] = [b - ratio * (b - a), a + ratio * (b - a)];
    if (size(c) > size(d)) b = d;
    else a = c;
  }
  return (a + b) / 2;
}

/** A ladder of nearly lossless inductances and capacitances behind a supply. */
function ladder(sections: number): Study {
  const buses = Array.from({ length: sections + 1 }, (_, k) => ({ id: `b${k}`, nominalV: 10000 }));
  return {
    format: 'varwright-study',
    version: 1,
    title: 'Ladder',
    frequencyHz: 50,
    buses,
    elements: [
      { id: 'Q', kind: 'supply', bus: 'b0', shortCircuitMVA: 100, xOverR: 2000 },
      ...buses.slice(1).flatMap(({ id }, k) => [
        {
          id: `L${k}`,
          kind: 'branch' as const,
          from: `b${k}`,
          to: id,
          inductanceMH: 1 + 0.3 * k,
          arrangement: 'series' as const,
        },
        {
          id: `C${k}`,
          kind: 'shunt' as const,
          bus: id,
          capacitanceUF: 40 - 7 * k,
          arrangement: 'series' as const,
        },
      ]),
    ],
  };
}

describe('what moves a resonance', () => {
  it('one inductance and one capacitance: each moves the order by minus one half', () => {
    const study = ladder(1);
    const found = resonanceElasticities(study, 'base', {
      bus: 'b1',
      sequence: 'positive',
      order: extremum(study, 'b1', 6, 10, 1),
    });
    const of = (element: string) =>
      found.parameters.filter((p) => p.element === element).reduce((sum, p) => sum + p.elasticity, 0);
    const grid = 1e4 ** 2 / 100e6 / OMEGA;
    const total = grid + 1e-3;
    expect(found.order).toBeCloseTo(1 / (OMEGA * Math.sqrt(total * 40e-6)), 4);
    expect(of('C0')).toBeCloseTo(-0.5, 5);
    expect(of('L0')).toBeCloseTo((-0.5 * 1e-3) / total, 5);
    expect(of('Q')).toBeCloseTo((0.5 * grid) / total, 5);
  });

  it('a lossless ladder: over all inductances the elasticities sum to minus one half, over all capacitances too', () => {
    const study = ladder(3);
    for (const [low, high] of [
      [3, 7],
      [13, 18],
      [22, 29],
    ] as const) {
      const start = extremum(study, 'b3', low, high, 1);
      const { parameters, order } = resonanceElasticities(study, 'base', {
        bus: 'b3',
        sequence: 'positive',
        order: start,
        kind: 'parallel',
      });
      expect(Math.abs(order! - start)).toBeLessThan(2e-6);
      const sum = (fields: string[]) =>
        parameters.filter((p) => fields.includes(p.field)).reduce((total, p) => total + p.elasticity, 0);
      expect(sum(['inductanceMH']) - sum(['shortCircuitMVA'])).toBeCloseTo(-0.5, 5);
      expect(sum(['capacitanceUF'])).toBeCloseTo(-0.5, 5);
    }
  });

  it.each([
    ['main', 2.5, 4, 'parallel'],
    ['mill', 5, 15, 'parallel'],
    ['main', 4, 5.5, 'series'],
  ] as const)(
    'at %s between orders %d and %d the %s resonance moves as a renewed search says',
    (bus, low, high, kind) => {
      const sign = kind === 'parallel' ? 1 : -1;
      const start = extremum(everyKind, bus, low, high, sign);
      const found = resonanceElasticities(everyKind, 'base', {
        bus,
        sequence: 'positive',
        order: start,
        kind,
      });
      expect(found.error).toBeUndefined();
      expect(found.order).toBeCloseTo(start, 4);
      const near = { bus, sequence: 'positive' as const, order: start, kind };
      for (const { element, field, value, elasticity } of found.parameters.slice(0, 40)) {
        const at = (x: number) =>
          resonanceElasticities(withParameter(everyKind, element, field, x), 'base', near).order!;
        const difference = (Math.log(at(value * 1.0001)) - Math.log(at(value * 0.9999))) / 2e-4;
        expect(Math.abs(difference - elasticity), `${element}.${field}`).toBeLessThan(
          1e-5 + 1e-4 * Math.abs(elasticity),
        );
      }
    },
  );

  it('the parts come ranked by effect', () => {
    const { parameters } = resonanceElasticities(everyKind, 'base', {
      bus: 'main',
      sequence: 'positive',
      order: extremum(everyKind, 'main', 2.5, 4, 1),
    });
    const sizes = parameters.map(({ elasticity }) => Math.abs(elasticity));
    expect(sizes).toEqual([...sizes].sort((a, b) => b - a));
    expect(sizes[0]).toBeGreaterThan(0.1);
  });

  it('an order without an extremum is answered in words', () => {
    const study = ladder(1);
    expect(resonanceElasticities(study, 'base', { bus: 'b1', sequence: 'positive', order: 3 }).error).toBe(
      '|Z| has no extremum near order 3',
    );
  });
});
