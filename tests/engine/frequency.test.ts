import { expect, it } from 'vitest';
import { scanImpedance, solveCase } from '../../src/engine/index.ts';
import type { Study } from '../../src/study/index.ts';

/** A supply of 20 MVA at 400 V, X/R 5, with a coil of 2 mH and 0.1 Ω to neutral. */
const study: Study = {
  format: 'varwright-study',
  version: 1,
  title: 'Coil on a supply',
  frequencyHz: 50,
  maxOrder: 7,
  buses: [{ id: 'main', nominalV: 400 }],
  elements: [
    { id: 'supply', kind: 'supply', bus: 'main', shortCircuitMVA: 20, xOverR: 5 },
    {
      id: 'coil',
      kind: 'shunt',
      bus: 'main',
      arrangement: 'series',
      resistanceOhm: 0.1,
      inductanceMH: 2,
      neutral: true,
    },
    { id: 'bank', kind: 'bank', bus: 'main', steps: [{ kvar: 100 }], ratedV: 400, on: false },
  ],
};

it('reactances of supply and coil grow with the actual frequency, resistances stay', () => {
  const factor = 1.02;
  const solution = solveCase(study, 'base', { frequencyFactor: factor });
  const supplyOhm = 400 ** 2 / 20e6;
  const supplyR = supplyOhm / Math.hypot(1, 5);
  const [r, x] = [supplyR + 0.1, factor * (5 * supplyR + 2 * Math.PI * 50 * 2e-3)];
  const coil = solution.terminals.findIndex(({ element }) => element === 'coil');
  const at = coil * solution.maxOrder * 3;
  const amperes = Math.hypot(solution.current.re[at] ?? 0, solution.current.im[at] ?? 0);
  expect(amperes).toBeCloseTo(400 / Math.sqrt(3) / Math.hypot(r, x), 8);
});

it('a resonance stands at an order lower by the factor the frequency rose', () => {
  const withBank = {
    ...study,
    elements: study.elements.map((part) => (part.id === 'bank' ? { ...part, on: true } : part)),
  };
  const span = { bus: 'main', sequence: 'positive', fromHz: 250, toHz: 1500, points: 400 } as const;
  const [rated] = scanImpedance(withBank, 'base', span).resonances;
  const [raised] = scanImpedance(withBank, 'base', span, { frequencyFactor: 1.02 }).resonances;
  expect(rated?.kind).toBe('parallel');
  expect((raised?.order ?? 0) * 1.02).toBeCloseTo(rated?.order ?? 0, 5);
});

it('a frequency that is not above zero is refused', () => {
  expect(() => solveCase(study, 'base', { frequencyFactor: 0 })).toThrow(/frequency factor 0/);
});
