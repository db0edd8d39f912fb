import { describe, expect, it } from 'vitest';
import {
  judgeCase,
  judgeStudy,
  margin,
  SolvedCase,
  sortByMargin,
  summarise,
  toResultsCheck,
  worstMargin,
} from '../../src/checks/index.ts';
import { scanImpedance, solveCase } from '../../src/engine/index.ts';
import { casesOf } from '../../src/study/index.ts';
import { of, one, site, verdictsOf } from './site.ts';

// All studies here are invented; the numbers checked are laws (value, limit, margin by their definitions)
// or recomputed in the test from the solution.

describe('power factor at the PCC', () => {
  it('fails without correction, passes with the bank, by the target of 0.95', () => {
    const bare = one(verdictsOf(site({ bank: null })), 'target-pf');
    expect(bare).toMatchObject({ verdict: 'fail', limit: 0.95, subject: { kind: 'bus', id: 'HV' } });
    expect(bare.margin).toBeCloseTo(margin(bare.value ?? 0, 0.95, 1, 'lower'), 12);
    expect(bare.mend).toMatch(/kvar/);
    const corrected = one(verdictsOf(site()), 'target-pf');
    expect(corrected.verdict).toBe('pass');
    expect(corrected.mend).toBeUndefined();
  });

  it("is the supply terminal's own displacement factor", () => {
    const study = site();
    const solution = solveCase(study, 'base');
    const verdict = one(judgeCase(study, solution), 'target-pf');
    const terminal = solution.terminals.findIndex(({ element }) => element === 'S');
    const at = terminal * solution.maxOrder * 3;
    const bus = solution.buses.indexOf('HV') * solution.maxOrder * 3;
    let p = 0;
    let q = 0;
    for (let k = 0; k < 3; k++) {
      const [vr, vi] = [solution.voltage.re[bus + k] ?? 0, solution.voltage.im[bus + k] ?? 0];
      const [ir, ii] = [-(solution.current.re[at + k] ?? 0), -(solution.current.im[at + k] ?? 0)];
      p += vr * ir + vi * ii;
      q += vi * ir - vr * ii;
    }
    expect(verdict.value).toBeCloseTo(p / Math.hypot(p, q), 9);
  });

  it('judges light-load states by leading kvar and asks for the limit when it is not given', () => {
    const cases = [
      {
        id: 'night',
        role: 'light' as const,
        changes: [
          { element: 'L', set: { kW: 5 } },
          { element: 'D', set: { kW: 5 } },
        ],
      },
    ];
    expect(one(verdictsOf(site({ study: { cases } }), 'night'), 'target-pf')).toMatchObject({
      verdict: 'unknown',
      limit: null,
    });
    const kept = site({ study: { cases, criteria: { leadingKvarLimit: 400 } } });
    expect(one(verdictsOf(kept, 'night'), 'target-pf')).toMatchObject({
      verdict: 'pass',
      limit: 400,
      unit: 'kvar',
    });
    const broken = site({ study: { cases, criteria: { leadingKvarLimit: 50 } } });
    expect(one(verdictsOf(broken, 'night'), 'target-pf').verdict).toBe('fail');
    const none = site({ study: { cases, criteria: { leadingKvarLimit: 0 } } });
    expect(one(verdictsOf(none, 'night'), 'target-pf')).toMatchObject({ verdict: 'fail', limit: 0 });
  });

  it('below a tenth of the largest case a load case is judged by leading kvar too', () => {
    const cases = [
      { id: 'day', changes: [] },
      {
        id: 'sunday',
        changes: [
          { element: 'L', set: { kW: 10 } },
          { element: 'D', set: { on: false } },
        ],
      },
    ];
    const study = site({ study: { cases, criteria: { leadingKvarLimit: 400 } } });
    expect(one(verdictsOf(study, 'sunday'), 'target-pf')).toMatchObject({ unit: 'kvar', verdict: 'pass' });
    expect(one(verdictsOf(study, 'day'), 'target-pf').unit).toBe('');
  });

  it('on its own generator is judged there by leading kvar', () => {
    const cases = [
      { id: 'grid', changes: [] },
      {
        id: 'genset',
        role: 'generator' as const,
        changes: [
          { element: 'S', set: { on: false } },
          { element: 'G', set: { on: true } },
        ],
      },
    ];
    const generator = {
      id: 'G',
      kind: 'generator' as const,
      bus: 'LV',
      ratedKVA: 800,
      xdSubtransientPercent: 15,
      on: false,
    };
    const study = site({ more: [generator], study: { cases, criteria: { leadingKvarLimit: 80 } } });
    expect(one(verdictsOf(study, 'genset'), 'target-pf')).toMatchObject({
      unit: 'kvar',
      limit: 80,
      subject: { id: 'LV' },
    });
    expect(of(verdictsOf(study, 'genset'), 'pcc-tdd')).toHaveLength(0);
    expect(one(verdictsOf(study, 'grid'), 'target-pf').subject.id).toBe('HV');
  });

  it('leaves exported power to the tariff in words', () => {
    const verdict = one(verdictsOf(site({ drive: { kW: -900, powerFactor: 1 } })), 'target-pf');
    expect(verdict).toMatchObject({ verdict: 'unknown', limit: null, margin: null });
    expect(verdict.remarks[0]).toMatch(/tariff/);
  });
});

describe('steady voltage', () => {
  it('passes inside ±10 % at 50 Hz, its margin measured from nominal', () => {
    const verdict = one(verdictsOf(site()), 'bus-voltage', 'LV');
    expect(verdict).toMatchObject({ verdict: 'pass', unit: '%', source: { document: 'EN 50160' } });
    const end = verdict.limit ?? 0;
    expect(verdict.margin).toBeCloseTo((end - (verdict.value ?? 0)) / (end - 100), 12);
    expect(verdict.withoutCorrection?.value).toBeLessThan(verdict.value ?? 0);
  });

  it('fails above the band and names the end that governs', () => {
    expect(one(verdictsOf(site({ supply: { setpointPercent: 113 } })), 'bus-voltage', 'LV')).toMatchObject({
      verdict: 'fail',
      limit: 110,
    });
    expect(one(verdictsOf(site({ supply: { setpointPercent: 89 } })), 'bus-voltage', 'LV')).toMatchObject({
      verdict: 'fail',
      limit: 90,
    });
  });

  it('takes ±5 % of ANSI C84.1 at 60 Hz', () => {
    const verdict = one(verdictsOf(site({ study: { frequencyHz: 60 } })), 'bus-voltage', 'LV');
    expect(verdict.source.document).toBe('ANSI C84.1');
    expect([95, 105]).toContain(verdict.limit);
  });

  it('is unknown on a busbar without a path to a source, and the one row that says so', () => {
    const study = site({
      study: {
        buses: [
          { id: 'HV', nominalV: 20_000, pcc: true },
          { id: 'LV', nominalV: 400 },
          { id: 'X', nominalV: 400 },
        ],
      },
    });
    expect(one(verdictsOf(study), 'bus-voltage', 'X')).toMatchObject({ verdict: 'unknown', value: null });
    expect(verdictsOf(study).filter(({ subject }) => subject.id === 'X')).toHaveLength(1);
  });
});

describe('voltage distortion', () => {
  it("is the worst phase's THD and says what it is without the correction", () => {
    const study = site();
    const solution = solveCase(study, 'base');
    const verdict = one(judgeCase(study, solution), 'bus-thd', 'LV');
    const bus = solution.buses.indexOf('LV');
    const at = (h: number) => {
      const i = (bus * solution.maxOrder + h - 1) * 3;
      return Math.hypot(solution.voltage.re[i] ?? 0, solution.voltage.im[i] ?? 0);
    };
    const thd =
      Math.sqrt(
        Array.from({ length: solution.maxOrder - 1 }, (_, i) => at(i + 2) ** 2).reduce((a, b) => a + b),
      ) / at(1);
    expect(verdict.value).toBeCloseTo(thd * 100, 9);
    expect(verdict).toMatchObject({
      verdict: 'pass',
      limit: 8,
      source: { document: 'IEC 61000-2-4', provenance: 'memory' },
    });
    expect(verdict.withoutCorrection?.value).toBeGreaterThan(verdict.value ?? 0);
  });

  it('fails where a plain bank resonates on the 7th, and says the correction raises it', () => {
    const verdicts = verdictsOf(site({ bank: { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 320 }] } }));
    const thd = one(verdicts, 'bus-thd', 'LV');
    expect(thd.verdict).toBe('fail');
    expect(thd.withoutCorrection?.verdict).not.toBe('fail');
    expect(thd.mend).toMatch(/detune/);
    const orders = of(verdicts, 'bus-order', 'LV');
    expect(orders.some(({ order, verdict }) => order === 7 && verdict === 'fail')).toBe(true);
  });

  it('gives one verdict of an order for a quiet busbar, not a row for every order', () => {
    const orders = of(verdictsOf(site()), 'bus-order', 'HV');
    expect(orders).toHaveLength(1);
    expect(orders[0]?.key).toBe(`bus-order|HV|${orders[0]?.order}`);
    expect(orders[0]?.working[1]?.numbers).toMatch(/no order reaches a tenth|\d+: .* of /);
  });

  it('has no verdict where the chosen set has no limits, and says so', () => {
    const study = site({ study: { limits: { pcc: 'iec-61000-2-2', internal: 'no-such-set' } } });
    const verdicts = verdictsOf(study);
    expect(one(verdicts, 'bus-thd', 'HV').remarks[0]).toMatch(/no harmonic limits at 20000 V/);
    expect(one(verdicts, 'bus-order', 'LV').remarks[0]).toMatch(/no-such-set/);
    expect(of(verdicts, 'bus-thd').every(({ verdict }) => verdict === 'unknown')).toBe(true);
  });

  it('IEEE 519 only informs away from the PCC', () => {
    const verdicts = verdictsOf(site({ study: { limits: { internal: 'ieee-519-2022' } } }));
    expect(one(verdicts, 'bus-thd', 'LV').screening).toBe(true);
    expect(one(verdicts, 'bus-thd', 'HV').screening).toBe(false);
  });

  it('adds sources of unknown angle by magnitude and says so', () => {
    const unknownAngles = [
      { h: 5, percent: 30 },
      { h: 7, percent: 17 },
    ];
    const second = {
      id: 'D2',
      kind: 'converter' as const,
      bus: 'LV',
      kW: 200,
      powerFactor: 0.95,
      spectrum: unknownAngles,
    };
    const study = site({ drive: { spectrum: unknownAngles }, more: [second] });
    const fifth = one(verdictsOf(study), 'bus-thd', 'LV');
    expect(fifth.remarks.join(' ')).toMatch(/unknown at orders 5, 7.*by magnitude/);
    const known = one(verdictsOf(site()), 'bus-thd', 'LV');
    expect(known.remarks.join(' ')).not.toMatch(/unknown/);
  });
});

describe('bank duty', () => {
  it('a detuned bank passes current; its capacitor voltage is U/(1 − p) of the busbar', () => {
    const study = site({ drive: { on: false } });
    const solution = solveCase(study, 'base');
    const verdicts = judgeCase(study, solution);
    expect(one(verdicts, 'bank-current', 'C').verdict).toBe('pass');
    const solved = new SolvedCase(solution);
    const busV = solved.volts(solved.bus('LV'), 1, 0) * Math.sqrt(3);
    // Losses shift it by parts in ten thousand.
    expect((one(verdicts, 'bank-voltage', 'C').value ?? 0) * 440).toBeCloseTo(busV / 0.93, 0);
    expect(one(verdicts, 'bank-kvar', 'C').verdict).toBe('pass');
  });

  it('a plain bank on the 7th fails current, and kvar is Σ √3·U·I', () => {
    const study = site({
      loadKW: 100,
      drive: { kW: 500 },
      bank: { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 320 }] },
    });
    const solution = solveCase(study, 'base');
    const verdicts = judgeCase(study, solution);
    const current = one(verdicts, 'bank-current', 'C');
    const solved = new SolvedCase(solution);
    const terminal = solved.terminal('C', 'LV') ?? -1;
    const rated = 320_000 / (Math.sqrt(3) * 400);
    expect(current.value).toBeCloseTo(solved.rmsAmperes(terminal, 0) / rated, 9);
    expect(current).toMatchObject({ verdict: 'fail', limit: 1.3, source: { document: 'IEC 60831-1' } });
    const xc = 400 ** 2 / 320_000;
    let kvar = 0;
    for (let h = 1; h <= solved.maxOrder; h++)
      kvar += (3 * solved.amperes(terminal, h, 0) ** 2 * xc) / h / 320_000;
    expect(one(verdicts, 'bank-kvar', 'C').value).toBeCloseTo(kvar, 9);
  });

  it('capacitors rated at busbar voltage behind a reactor fail their voltage all day, pass for 8 hours', () => {
    const cases = [
      { id: 'day', changes: [] },
      { id: 'shift', hoursPerDay: 8, changes: [] },
    ];
    const study = site({ bank: { ratedV: 400 }, drive: { on: false }, study: { cases } });
    const voltage = (id: string) =>
      of(verdictsOf(study, id), 'bank-voltage', 'C').find(({ key }) => key === 'bank-voltage|C');
    expect(voltage('day')).toMatchObject({ verdict: 'fail', limit: 1 });
    expect(voltage('shift')).toMatchObject({ limit: 1.1 });
    expect(voltage('shift')?.verdict).not.toBe('fail');
  });

  it('raises the fundamental to the highest supply voltage the study states', () => {
    const at = (maxVoltagePercent?: number) =>
      one(
        verdictsOf(
          site({
            drive: { on: false },
            study: { criteria: maxVoltagePercent === undefined ? {} : { maxVoltagePercent } },
          }),
        ),
        'bank-voltage',
        'C',
      );
    expect((at(106).value ?? 0) / (at().value ?? 1)).toBeCloseTo(1.06, 6);
    expect(at().remarks.join(' ')).toMatch(/enter the highest supply voltage/);
  });

  it('has no verdict for a capacitor set that is not known', () => {
    const verdicts = verdictsOf(site({ study: { limits: { capacitor: 'mine' } } }));
    expect(one(verdicts, 'bank-current', 'C')).toMatchObject({ verdict: 'unknown' });
    expect(one(verdicts, 'bank-voltage', 'C').mend).toMatch(/"mine" is not known/);
  });

  it('takes IEC 60871-1 above 1 kV and IEEE 18 at 60 Hz', () => {
    const mv = { id: 'M', kind: 'bank' as const, bus: 'HV', ratedV: 22_000, steps: [{ kvar: 500 }] };
    expect(one(verdictsOf(site({ more: [mv] })), 'bank-current', 'M').source.document).toBe('IEC 60871-1');
    expect(one(verdictsOf(site({ study: { frequencyHz: 60 } })), 'bank-current', 'C')).toMatchObject({
      limit: 1.35,
      source: { document: 'IEEE 18' },
    });
  });

  it('a bank with every step off gives no duty rows', () => {
    expect(
      of(verdictsOf(site({ bank: { steps: [{ kvar: 100, on: false }] } })), 'bank-current'),
    ).toHaveLength(0);
  });
});

describe('filter duty', () => {
  const filter = {
    id: 'F',
    kind: 'filter' as const,
    bus: 'LV',
    type: 'single-tuned' as const,
    kvar: 150,
    tunedOrder: 4.7,
    qFactor: 40,
  };
  it('judges the filter capacitor and leaves reactor and resistor without a verdict', () => {
    const rows = (ratedV: number) =>
      of(verdictsOf(site({ bank: null, more: [{ ...filter, ratedV }] })), 'filter-duty', 'F');
    expect(
      rows(440)
        .map(({ key }) => key)
        .sort(),
    ).toEqual([
      'filter-duty|F|current',
      'filter-duty|F|kvar',
      'filter-duty|F|peak',
      'filter-duty|F|reactor',
      'filter-duty|F|voltage',
    ]);
    expect(rows(440).find(({ key }) => key.endsWith('reactor'))).toMatchObject({
      verdict: 'unknown',
      unit: 'A',
    });
    expect(rows(400).find(({ key }) => key.endsWith('|voltage'))?.verdict).toBe('fail');
    expect(rows(600).find(({ key }) => key.endsWith('|voltage'))?.verdict).toBe('pass');
  });
});

describe('transformer loading', () => {
  it('passes at part load, fails overloaded, derated by F_HL', () => {
    const light = one(verdictsOf(site()), 'transformer-load', 'T');
    expect(light).toMatchObject({ verdict: 'pass', limit: 1 });
    expect(light.working.map(({ equation }) => equation).join(' ')).toMatch(/F_HL.*K = /);
    expect(one(verdictsOf(site({ loadKW: 900 })), 'transformer-load', 'T').verdict).toBe('fail');
  });

  it('has no verdict without P_EC-R when harmonics flow, and says what to enter', () => {
    const bare = site();
    const elements = bare.elements.map((part) => {
      if (part.kind !== 'transformer') return part;
      const { eddyLossShare: _, ...rest } = part;
      return rest;
    });
    const verdict = one(verdictsOf({ ...bare, elements }), 'transformer-load', 'T');
    expect(verdict).toMatchObject({ verdict: 'unknown', margin: null });
    expect(verdict.mend).toMatch(/P_EC-R/);
    expect(verdict.value).toBeGreaterThan(0.3);
    const heavy = elements.map((part) => (part.id === 'L' ? { ...part, kW: 1000 } : part));
    expect(one(verdictsOf({ ...bare, elements: heavy }), 'transformer-load', 'T').verdict).toBe('fail');
  });
});

describe('cable loading', () => {
  const study = (ratedA?: number) =>
    site({
      study: {
        buses: [
          { id: 'HV', nominalV: 20_000, pcc: true },
          { id: 'LV', nominalV: 400 },
          { id: 'P', nominalV: 400 },
        ],
      },
      more: [
        {
          id: 'W',
          kind: 'cable',
          from: 'LV',
          to: 'P',
          lengthM: 50,
          resistanceOhmPerKm: 0.2,
          reactanceOhmPerKm: 0.08,
          ...(ratedA === undefined ? {} : { ratedA }),
        },
        {
          id: 'E',
          kind: 'converter',
          bus: 'P',
          kW: 60,
          powerFactor: 0.98,
          wires: 4,
          spectrum: [
            { h: 3, percent: 70 },
            { h: 5, percent: 30 },
          ],
        },
      ],
    });

  it('sizes by the neutral where triplens fill it', () => {
    const verdict = one(verdictsOf(study(250)), 'cable-load', 'W');
    expect(verdict.verdict).toBe('pass');
    expect(verdict.working[1]?.numbers).toMatch(/above 45 %/);
    expect(one(verdictsOf(study(120)), 'cable-load', 'W').verdict).toBe('fail');
  });

  it('asks for the rated current where it is missing', () => {
    expect(one(verdictsOf(study()), 'cable-load', 'W')).toMatchObject({ verdict: 'unknown', margin: null });
  });
});

describe('unbalance', () => {
  it('passes on a balanced site and fails with a heavy load between two phases', () => {
    expect(one(verdictsOf(site()), 'unbalance', 'LV')).toMatchObject({ verdict: 'pass', limit: 2 });
    const welder = {
      id: 'W',
      kind: 'load' as const,
      bus: 'LV',
      kW: 500,
      powerFactor: 0.6,
      connection: 'L1L2' as const,
    };
    expect(one(verdictsOf(site({ more: [welder] })), 'unbalance', 'LV').verdict).toBe('fail');
  });
});

describe('current distortion at the PCC', () => {
  const criteria = { demandCurrentA: 20, shortCircuitMVAAtPcc: 250 };
  it('asks for I_L and Isc, prints them, and takes the row by their ratio', () => {
    const study60 = (extra: object) => site({ study: { frequencyHz: 60, ...extra } });
    expect(one(verdictsOf(study60({})), 'pcc-tdd')).toMatchObject({ verdict: 'unknown' });
    const tdd = one(verdictsOf(study60({ criteria })), 'pcc-tdd');
    // Isc = 250 MVA/(√3·20 kV) = 7217 A, 361 times 20 A: row 100 to 1000, TDD 15 %.
    expect(tdd.limit).toBe(15);
    expect(tdd.working[0]?.numbers).toMatch(/7217 A \/ 20 A = 360.8/);
    expect(of(verdictsOf(study60({ criteria })), 'pcc-order').length).toBeGreaterThan(0);
    expect(
      one(verdictsOf(study60({ criteria: { ...criteria, demandCurrentA: 500 } })), 'pcc-tdd').limit,
    ).toBe(5);
  });

  it('fails for a bare converter site of low demand', () => {
    const study = site({
      bank: null,
      drive: {
        kW: 700,
        spectrum: [
          { h: 5, percent: 60 },
          { h: 7, percent: 40 },
        ],
      },
      study: { frequencyHz: 60, criteria },
    });
    expect(one(verdictsOf(study), 'pcc-tdd').verdict).toBe('fail');
    expect(one(verdictsOf(study), 'pcc-order').verdict).toBe('fail');
  });

  it('at 50 Hz says that the operator states the limits until a set is chosen', () => {
    expect(of(verdictsOf(site()), 'pcc-tdd')).toHaveLength(0);
    expect(one(verdictsOf(site({ study: { criteria } })), 'pcc-tdd').remarks[0]).toMatch(/operator/);
    expect(
      one(verdictsOf(site({ study: { limits: { current: 'ieee-519-2022' }, criteria } })), 'pcc-tdd').limit,
    ).toBe(15);
  });
});

describe('distance of the resonance from present orders (screening)', () => {
  const plain = { ratedV: 400, detuningPercent: 0 };

  it('finds the one step combination that meets an order while the full bank is clear', () => {
    // Full: 400 kvar at order 6.2; two of four steps: 200 kvar near 8.7; three: 300 kvar near 7.2.
    const study = site({
      drive: {
        spectrum: [
          { h: 5, percent: 30 },
          { h: 7, percent: 17 },
        ],
      },
      bank: { ...plain, steps: Array.from({ length: 4 }, () => ({ kvar: 100 })) },
    });
    const verdict = one(verdictsOf(study), 'resonance-distance', 'C');
    expect(verdict).toMatchObject({ verdict: 'watch', screening: true, limit: 0.15 });
    expect(verdict.working[0]?.numbers).toMatch(/with 300 of 400 kvar on/);
    const only300 = {
      ...study,
      elements: study.elements.map((part) =>
        part.kind === 'bank' ? { ...part, steps: [{ kvar: 300 }] } : part,
      ),
    };
    const scan = scanImpedance(only300, 'base', {
      bus: 'LV',
      sequence: 'positive',
      fromHz: 50,
      toHz: 1250,
      points: 2401,
    });
    const peaks = scan.resonances.filter(({ kind }) => kind === 'parallel').map(({ order }) => order);
    const best = Math.min(...peaks.flatMap((peak) => [5, 7].map((h) => Math.abs(peak - h) / h)));
    expect(verdict.value).toBeCloseTo(best, 5);
    expect(peaks.some((peak) => Math.abs(peak - (verdict.order ?? 0)) < 1e-5)).toBe(true);
  });

  it('a bank detuned below every present order passes', () => {
    const verdict = one(verdictsOf(site()), 'resonance-distance', 'C');
    expect(verdict).toMatchObject({ verdict: 'pass', screening: true });
    expect(verdict.value).toBeGreaterThan(0.15);
  });

  it('passes quietly where no order is present, and is unknown on a dead busbar', () => {
    const quiet = one(verdictsOf(site({ drive: { on: false } })), 'resonance-distance', 'C');
    expect(quiet).toMatchObject({ verdict: 'pass', value: null });
    const dead = site({
      study: {
        buses: [
          { id: 'HV', nominalV: 20_000, pcc: true },
          { id: 'LV', nominalV: 400 },
          { id: 'X', nominalV: 400 },
        ],
      },
      bank: { bus: 'X' },
    });
    expect(one(verdictsOf(dead), 'resonance-distance', 'C').verdict).toBe('unknown');
  });

  it('never fails and never decides the worst margin', () => {
    const verdicts = verdictsOf(site({ bank: { ...plain, steps: [{ kvar: 320 }] } }));
    const screens = verdicts.filter(({ screening }) => screening);
    expect(screens.length).toBeGreaterThan(1);
    expect(screens.every(({ verdict }) => verdict !== 'fail')).toBe(true);
    expect(worstMargin(verdicts)?.screening).toBe(false);
  });

  it('searches the steps of two banks together', () => {
    const second = {
      id: 'C2',
      kind: 'bank' as const,
      bus: 'LV',
      ratedV: 400,
      steps: [{ kvar: 150 }, { kvar: 150 }],
    };
    const verdict = one(
      verdictsOf(site({ bank: { ...plain, steps: [{ kvar: 150 }] }, more: [second] })),
      'resonance-distance',
      'C',
    );
    expect(verdict.working[0]?.numbers).toMatch(/150 of 150 kvar on, C2 at 150 kvar/);
  });

  it('searches a filter on a busbar without a bank: its parallel peak lies below its tuned order', () => {
    const filter = {
      id: 'F',
      kind: 'filter' as const,
      bus: 'LV',
      type: 'single-tuned' as const,
      kvar: 150,
      tunedOrder: 4.7,
      qFactor: 40,
      ratedV: 500,
    };
    const study = site({
      bank: null,
      more: [filter],
      drive: {
        spectrum: [
          { h: 4, percent: 6 },
          { h: 5, percent: 30 },
        ],
      },
    });
    const verdict = one(verdictsOf(study), 'resonance-distance', 'F');
    const scan = scanImpedance(study, 'base', {
      bus: 'LV',
      sequence: 'positive',
      fromHz: 50,
      toHz: 400,
      points: 1401,
    });
    const peak = scan.resonances.find(({ kind }) => kind === 'parallel')?.order ?? 0;
    expect(peak).toBeLessThan(4.7);
    expect(verdict.order).toBeCloseTo(peak, 4);
    expect(verdict).toMatchObject({ verdict: 'watch', screening: true });
    expect(of(verdictsOf(site({ more: [filter] })), 'resonance-distance', 'F')).toHaveLength(0);
  });

  it('thins the combinations of many banks and says so', () => {
    const many = [1, 2, 3, 4].map((n) => ({
      id: `B${n}`,
      kind: 'bank' as const,
      bus: 'LV',
      ratedV: 400,
      steps: [{ kvar: 20 }, { kvar: 20 }, { kvar: 20 }],
    }));
    const verdict = one(verdictsOf(site({ more: many })), 'resonance-distance', 'C');
    expect(verdict.remarks.join(' ')).toMatch(/256 step combinations together; searched were/);
  });
});

describe('amplification (screening)', () => {
  it('is |Z with / Z without| at the injecting busbar, worst present order', () => {
    const study = site({ bank: { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 320 }] } });
    const verdict = one(verdictsOf(study), 'amplification', 'LV');
    const z = (without?: ReadonlySet<string>) => {
      const scan = scanImpedance(
        study,
        'base',
        { bus: 'LV', sequence: 'positive', fromHz: 350, toHz: 400, points: 2 },
        { without },
      );
      return Math.hypot(scan.re[0] ?? 0, scan.im[0] ?? 0);
    };
    expect(verdict.order).toBe(7);
    expect(verdict.value).toBeCloseTo(z() / z(new Set(['C'])), 9);
    expect(verdict).toMatchObject({ verdict: 'watch', limit: 2, screening: true });
  });

  it('a detuned bank lowers every present order and passes', () => {
    expect(one(verdictsOf(site()), 'amplification', 'LV')).toMatchObject({ verdict: 'pass' });
    expect(one(verdictsOf(site()), 'amplification', 'LV').value).toBeLessThan(1);
  });

  it('judges supply distortion at the busbar of the bank, drives silent', () => {
    const study = site({
      supply: {
        background: [
          { h: 5, percent: 2 },
          { h: 7, percent: 1.5 },
        ],
      },
      bank: { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 320 }] },
    });
    const verdict = of(verdictsOf(study), 'amplification', 'LV').find(({ key }) =>
      key.endsWith('background'),
    );
    expect(verdict?.value).toBeGreaterThan(2);
    expect(verdict?.verdict).toBe('watch');
  });

  it('says nothing without correction and is unknown on a dead busbar', () => {
    expect(of(verdictsOf(site({ bank: null })), 'amplification')).toHaveLength(0);
    const dead = site({
      study: {
        buses: [
          { id: 'HV', nominalV: 20_000, pcc: true },
          { id: 'LV', nominalV: 400 },
          { id: 'X', nominalV: 400 },
        ],
      },
      more: [{ id: 'D9', kind: 'converter', bus: 'X', kW: 5, powerFactor: 1, spectrum: 'six-pulse-ideal' }],
    });
    expect(one(verdictsOf(dead), 'amplification', 'X').verdict).toBe('unknown');
  });
});

describe('the list of verdicts', () => {
  const study = site({ bank: { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 320 }] } });

  it('puts fails first, then watch, unknown, pass, each by margin', () => {
    const verdicts = verdictsOf(study);
    const rank = { fail: 0, watch: 1, unknown: 2, pass: 3 };
    for (let i = 1; i < verdicts.length; i++) {
      const [a, b] = [verdicts[i - 1], verdicts[i]];
      if (!a || !b) continue;
      expect(rank[a.verdict]).toBeLessThanOrEqual(rank[b.verdict]);
      if (a.verdict === b.verdict) expect(a.margin ?? 0).toBeLessThanOrEqual(b.margin ?? 0);
    }
    expect(sortByMargin([...verdicts].reverse())).toEqual(verdicts);
  });

  it('counts by word, and keys are unique in a case', () => {
    const verdicts = verdictsOf(study);
    const count = summarise(verdicts);
    expect(count.fail + count.watch + count.pass + count.unknown).toBe(verdicts.length);
    expect(new Set(verdicts.map(({ key }) => key)).size).toBe(verdicts.length);
  });

  it('every figure is finite, every verdict has a source, every judged one a working', () => {
    for (const verdict of verdictsOf(study)) {
      for (const number of [verdict.value, verdict.limit, verdict.margin]) {
        if (number !== null) expect(Number.isFinite(number)).toBe(true);
      }
      expect(verdict.source.document).not.toBe('');
      if (verdict.margin !== null) expect(verdict.working.length).toBeGreaterThan(0);
      if (verdict.verdict === 'unknown') expect(verdict.remarks[0]).toBeTruthy();
      if (verdict.verdict === 'pass') expect(verdict.mend).toBeUndefined();
      expect(JSON.stringify(verdict)).not.toMatch(/NaN|undefined|Infinity/);
    }
  });

  it('a row of the results file names part or busbar, never both', () => {
    for (const row of verdictsOf(study).map(toResultsCheck)) {
      expect((row.element === undefined) !== (row.bus === undefined)).toBe(true);
      expect(row.source).not.toBe('');
    }
  });

  it('judges every case of a study; a case without a solution has no verdicts', () => {
    const cases = [
      { id: 'day', changes: [] },
      { id: 'impossible', changes: [{ element: 'L', set: { kW: 100_000 } }] },
    ];
    const two = { ...study, cases };
    expect(casesOf(two)).toHaveLength(2);
    const verdicts = judgeStudy(two);
    expect(new Set(verdicts.map(({ caseId }) => caseId))).toEqual(new Set(['day']));
  });

  it('does not change the study or the solution, and gives the same list twice', () => {
    const before = JSON.stringify(study);
    const solution = solveCase(study, 'base');
    const first = judgeCase(study, solution);
    expect(judgeCase(study, solution)).toEqual(first);
    expect(JSON.stringify(study)).toBe(before);
  });
});
