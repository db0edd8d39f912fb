import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { judgeCase, orderTable, SolvedCase, type Verdict } from '../../src/checks/index.ts';
import { contentVolts } from '../../src/checks/presentOrders.ts';
import { scanImpedance, solveCase } from '../../src/engine/index.ts';
import type { HarmonicRow, StudyElement } from '../../src/study/index.ts';
import { of, one, type SiteParts, site, verdictsOf } from './site.ts';

const silent = { drive: { on: false } };

describe('a delta bank under unbalance', () => {
  it('draws in each unit what the line-to-line voltage across it drives', () => {
    const welder: StudyElement = {
      id: 'W',
      kind: 'load',
      bus: 'LV',
      kW: 150,
      powerFactor: 0.7,
      connection: 'L1L2',
    };
    const study = site({
      ...silent,
      bank: { ratedV: 400, detuningPercent: 0, lossWPerKvar: 0 },
      more: [welder],
    });
    const solution = solveCase(study, 'base');
    const solved = new SolvedCase(solution);
    const bus = solved.bus('LV');
    const largest = Math.max(...[0, 1, 2].map((pair) => solved.lineVolts(bus, 1, pair)));
    const smallest = Math.min(...[0, 1, 2].map((pair) => solved.lineVolts(bus, 1, pair)));
    expect(largest - smallest).toBeGreaterThan(2);
    const verdicts = judgeCase(study, solution);
    // No harmonics: I/I_N of a plain delta unit is U_LL/U_N, and so is its voltage.
    expect(one(verdicts, 'bank-current', 'C').value).toBeCloseTo(largest / 400, 9);
    expect(one(verdicts, 'bank-voltage', 'C').value).toBeCloseTo(largest / 400, 9);
  });
});

describe('sequence content of a busbar', () => {
  const electronics = (spectrum: HarmonicRow[]): StudyElement => ({
    id: 'E',
    kind: 'converter',
    bus: 'LV',
    kW: 100,
    powerFactor: 0.98,
    wires: 4,
    spectrum,
  });

  it('balanced triplens are zero sequence, balanced 5th and 7th are not', () => {
    const study = site({
      ...silent,
      more: [
        electronics([
          { h: 3, percent: 60, angleDeg: 0 },
          { h: 5, percent: 30, angleDeg: 0 },
        ]),
      ],
    });
    const solved = new SolvedCase(solveCase(study, 'base'));
    const bus = solved.bus('LV');
    expect(contentVolts(solved, bus, 3, 'zero')).toBeCloseTo(solved.volts(bus, 3, 0), 9);
    expect(contentVolts(solved, bus, 3, 'positive')).toBeLessThan(1e-9 * solved.volts(bus, 1, 0));
    expect(contentVolts(solved, bus, 5, 'positive')).toBeCloseTo(solved.volts(bus, 5, 0), 9);
    expect(contentVolts(solved, bus, 5, 'zero')).toBeLessThan(1e-6 * solved.volts(bus, 1, 0));
  });

  it('a positive-sequence peak on the 3rd is no matter of balanced triplens', () => {
    // 1600 kvar plain on 1000 kVA: parallel resonance near the 3rd.
    const big = { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 1600 }] };
    const triplens: SiteParts = {
      ...silent,
      loadKW: 700,
      more: [electronics([{ h: 3, percent: 60, angleDeg: 0 }])],
    };
    const delta = one(verdictsOf(site({ ...triplens, bank: big })), 'resonance-distance', 'C');
    expect(delta).toMatchObject({ verdict: 'pass', value: null });
    const earthed = site({ ...triplens, bank: { ...big, connection: 'star-earthed' } });
    const star = one(verdictsOf(earthed), 'resonance-distance', 'C');
    const scan = scanImpedance(earthed, 'base', {
      bus: 'LV',
      sequence: 'zero',
      fromHz: 50,
      toHz: 500,
      points: 901,
    });
    const peak = scan.resonances.find(({ kind }) => kind === 'parallel')?.order ?? 0;
    expect(star.order).toBeCloseTo(peak, 4);
    expect(star.value).toBeCloseTo(Math.abs(peak - 3) / 3, 4);
    expect(star.working[1]?.numbers).toMatch(/zero sequence/);
  });
});

describe('the spectrum beside its limits', () => {
  it('lists every order once, the same figures as the verdicts', () => {
    const study = site({ bank: { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 320 }] } });
    const solution = solveCase(study, 'base');
    const rows = orderTable(study, solution, 'LV');
    expect(rows.map(({ h }) => h)).toEqual(Array.from({ length: 24 }, (_, i) => i + 2));
    for (const verdict of of(judgeCase(study, solution), 'bus-order', 'LV')) {
      const row = rows.find(({ h }) => h === verdict.order);
      expect(row?.percent).toBe(verdict.value);
      expect(row?.limit).toBe(verdict.limit);
    }
    expect(() => orderTable(study, solution, 'nowhere')).toThrow(/nowhere/);
  });
});

describe('verdicts of random sites', () => {
  const rows = fc
    .uniqueArray(fc.integer({ min: 2, max: 25 }), { minLength: 0, maxLength: 6 })
    .chain((orders) =>
      fc.tuple(
        ...orders.map((h) =>
          fc
            .record({ percent: fc.double({ min: 0, max: 60, noNaN: true }), known: fc.boolean() })
            .map(({ percent, known }): HarmonicRow => ({ h, percent, ...(known ? { angleDeg: 40 } : {}) })),
        ),
      ),
    );
  const parts = fc.record({
    kvar: fc.array(fc.integer({ min: 5, max: 120 }), { minLength: 1, maxLength: 4 }),
    detuningPercent: fc.constantFrom(0, 5.67, 7, 14),
    connection: fc.constantFrom('delta' as const, 'star' as const, 'star-earthed' as const),
    frequencyHz: fc.constantFrom(50 as const, 60 as const),
    summation: fc.constantFrom('phasor' as const, 'alpha' as const),
    load: fc.constantFrom('L1L2L3' as const, 'L1' as const, 'L2L3' as const),
    first: rows,
    second: rows,
    wires: fc.constantFrom(3 as const, 4 as const),
  });

  function consistent(verdict: Verdict): void {
    const { value, limit, margin, verdict: word, screening } = verdict;
    for (const number of [value, limit, margin])
      if (number !== null) expect(Number.isFinite(number)).toBe(true);
    if (margin !== null) {
      expect(value).not.toBeNull();
      expect(limit).not.toBeNull();
      const expected =
        margin < 0 ? (screening ? 'watch' : 'fail') : margin < 0.1 && !screening ? 'watch' : 'pass';
      expect(word).toBe(expected);
    } else expect(['unknown', 'pass']).toContain(word);
    expect(verdict.mend === undefined).toBe(word === 'pass');
    if (word === 'unknown') expect(verdict.remarks[0]).toMatch(/\.$/);
    expect(JSON.stringify(verdict)).not.toMatch(/NaN|Infinity|undefined/);
  }

  it('are consistent, finite, uniquely keyed and sorted the same way twice', () => {
    fc.assert(
      fc.property(parts, (p) => {
        const study = site({
          bank: {
            detuningPercent: p.detuningPercent,
            connection: p.connection,
            steps: p.kvar.map((kvar) => ({ kvar })),
          },
          drive: { spectrum: p.first, wires: p.wires },
          more: [
            { id: 'D2', kind: 'converter', bus: 'LV', kW: 80, powerFactor: 0.9, spectrum: p.second },
            { id: 'X', kind: 'load', bus: 'LV', kW: 60, powerFactor: 0.9, connection: p.load },
          ],
          study: { frequencyHz: p.frequencyHz, summation: p.summation },
        });
        const solution = solveCase(study, 'base');
        expect(solution.converged).toBe(true);
        const verdicts = judgeCase(study, solution);
        verdicts.forEach(consistent);
        expect(new Set(verdicts.map(({ key }) => key)).size).toBe(verdicts.length);
        expect(judgeCase(study, solution)).toEqual(verdicts);
      }),
      { seed: 1906, numRuns: 40 },
    );
  });
});
