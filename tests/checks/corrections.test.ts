import { describe, expect, it } from 'vitest';
import { judgeCase, worstMargin } from '../../src/checks/index.ts';
import { scanImpedance, solveCase } from '../../src/engine/index.ts';
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
