import { describe, expect, it } from 'vitest';
import { bankAdmittance, filterAdmittance } from '../../src/checks/correctionBranch.ts';
import { judgeCase, SolvedCase, worstMargin } from '../../src/checks/index.ts';
import { unitAmperes } from '../../src/checks/unitAmperes.ts';
import { scanImpedance, solveCase } from '../../src/engine/index.ts';
import type { Study, StudyElement } from '../../src/study/index.ts';
import { of, one, site, verdictsOf } from './site.ts';

// Invented studies; each value is recomputed in the test from the solution.

describe('current at the PCC', () => {
  const ieee = { frequencyHz: 60 as const, criteria: { demandCurrentA: 20, shortCircuitMVAAtPcc: 250 } };

  it('tells TDD and single orders without the correction', () => {
    const plain = { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 320 }] };
    const verdicts = verdictsOf(site({ bank: plain, study: ieee }));
    const bare = verdictsOf(site({ bank: null, study: ieee }));
    const tdd = one(verdicts, 'pcc-tdd');
    expect(tdd.withoutCorrection?.value).toBeCloseTo(one(bare, 'pcc-tdd').value ?? 0, 6);
    expect(tdd.value).toBeGreaterThan(tdd.withoutCorrection?.value ?? Number.NaN);
    for (const order of of(verdicts, 'pcc-order')) expect(order.withoutCorrection?.value).toBeGreaterThan(0);
    expect(one(bare, 'pcc-tdd').withoutCorrection).toBeUndefined();
  });
});

describe('presence of orders', () => {
  it('does not depend on the chosen set holding limits: a resonance on the 7th is seen all the same', () => {
    const plain = { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 320 }] };
    for (const internal of ['none-such', 'ansi-c84.1']) {
      const verdicts = verdictsOf(site({ bank: plain, study: { limits: { internal } } }));
      expect(one(verdicts, 'resonance-distance', 'C').verdict).toBe('watch');
      expect(one(verdicts, 'amplification', 'LV').verdict).toBe('watch');
    }
  });
});

describe('amplification of supply distortion', () => {
  it('keeps the filter capacitors of the converters in the network', () => {
    const study = site({
      supply: { background: [{ h: 11, percent: 2 }] },
      drive: { filterCapacitanceUF: 900, spectrum: [{ h: 5, percent: 1 }] },
    });
    const verdict = one(
      verdictsOf(study).filter(({ key }) => key.endsWith('background')),
      'amplification',
    );
    // Behind the same EMF the ratio of voltages equals the ratio of transfer impedances, and so, on one busbar
    // behind one supply, that of the driving-point impedances.
    const span = { bus: 'LV', sequence: 'positive' as const, frequencyHz: Float64Array.of(550) };
    const ohm = (without: string[]): number => {
      const scan = scanImpedance(study, 'base', span, { without: new Set(without) });
      return Math.hypot(scan.re[0] ?? 0, scan.im[0] ?? 0);
    };
    expect(verdict.order).toBe(11);
    expect(verdict.value).toBeCloseTo(ohm([]) / ohm(['C']), 6);
  });

  it('keeps its key whether an order is present or not', () => {
    const quiet = site({ drive: { spectrum: [{ h: 5, percent: 1e-6 }] } });
    const loud = site();
    const keyOf = (study: typeof loud): string => one(verdictsOf(study), 'amplification', 'LV').key;
    expect(keyOf(quiet)).toBe(keyOf(loud));
  });
});

describe('transformer loading', () => {
  it('is judged in the phase that heats most, not in the one of the largest rms current', () => {
    const study = site({
      bank: null,
      loadKW: 50,
      transformer: { eddyLossShare: 0.15 },
      drive: { kW: 1 },
      more: [
        { id: 'A', kind: 'load', bus: 'LV', kW: 120, powerFactor: 1, connection: 'L1' },
        {
          id: 'B',
          kind: 'converter',
          bus: 'LV',
          kW: 100,
          powerFactor: 1,
          connection: 'L2',
          spectrum: [
            { h: 11, percent: 40 },
            { h: 13, percent: 30 },
          ],
        },
      ],
    });
    const solution = solveCase(study, 'base');
    const verdict = one(judgeCase(study, solution), 'transformer-load');
    expect(verdict.working[0]?.numbers).toMatch(/L2/);
    expect(verdict.value).toBeGreaterThan(0.5);
  });
});

describe('the worst margin', () => {
  it('leaves out power factor and delivered kvar, the contours of a choice', () => {
    const short = verdictsOf(site({ loadPF: 0.6, bank: { steps: [{ kvar: 10 }] } }));
    expect(one(short, 'target-pf').verdict).toBe('fail');
    expect(['target-pf', 'delivered-kvar']).not.toContain(worstMargin(short)?.check);
  });
});

describe('steady voltage at 60 Hz', () => {
  it('is judged by ANSI C84.1 range A though an IEC set is chosen for the harmonics', () => {
    const study = site({ study: { frequencyHz: 60, limits: { internal: 'iec-61000-2-4-class-2' } } });
    const verdict = one(verdictsOf(study), 'bus-voltage', 'LV');
    expect(verdict.source.document).toBe('ANSI C84.1');
    expect([95, 105]).toContain(verdict.limit);
  });
});

describe('current of a delta unit', () => {
  const welder = (angles: boolean): Study =>
    site({
      drive: {
        connection: 'L1L2',
        spectrum: [{ h: 5, percent: 60, ...(angles ? { angleDeg: 0 } : {}) }],
      },
      bank: { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 100 }] },
    });
  const filters: StudyElement[] = (['single-tuned', 'high-pass', 'c-type'] as const).map((type) => ({
    id: type,
    kind: 'filter',
    bus: 'LV',
    type,
    kvar: 50,
    tunedOrder: 7,
    qFactor: type === 'single-tuned' ? 40 : 2,
    ratedV: 500,
  }));

  it('is |I_k − I_(k+1)|/√3 of the lines as solved, for banks and every type of filter', () => {
    const base = welder(true);
    const study = { ...base, elements: [...base.elements, ...filters] };
    const solution = solveCase(study, 'base');
    const solved = new SolvedCase(solution);
    const { current, maxOrder } = solution;
    for (const part of study.elements) {
      if (part.kind !== 'bank' && part.kind !== 'filter') continue;
      const bus = { id: 'LV', nominalV: 400 };
      const terminal = solved.terminal(part.id, 'LV') ?? -1;
      const y = part.kind === 'bank' ? bankAdmittance(part, bus, 100) : filterAdmittance(part, bus);
      const admittance = (h: number): number => {
        const value = y(h);
        return typeof value === 'number' ? value : Math.hypot(value.re, value.im);
      };
      const units = unitAmperes(solved, { terminal, bus: 'LV', connection: 'delta', admittance });
      for (const h of [1, 5]) {
        for (let unit = 0; unit < 3; unit++) {
          const at = (terminal * maxOrder + h - 1) * 3;
          const next = (unit + 1) % 3;
          const re = (current.re[at + unit] ?? 0) - (current.re[at + next] ?? 0);
          const im = (current.im[at + unit] ?? 0) - (current.im[at + next] ?? 0);
          const expected = Math.hypot(re, im) / Math.sqrt(3);
          expect(units[unit]?.[h - 1], `${part.id} ${h} ${unit}`).toBeCloseTo(expected, 6);
        }
      }
    }
  });

  it('does not fall where the angles are unknown: the unit between the loaded lines carries more than its lines', () => {
    const known = one(verdictsOf(welder(true)), 'bank-current').value ?? 0;
    const open = one(verdictsOf(welder(false)), 'bank-current').value ?? 0;
    expect(open).toBeGreaterThanOrEqual(known * (1 - 1e-9));
  });
});
