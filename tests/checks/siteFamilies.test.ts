import { describe, expect, it } from 'vitest';
import type { Verdict } from '../../src/checks/index.ts';
import { scanImpedance, solveCase } from '../../src/engine/index.ts';
import type { Generator, Motor, Study, StudyElement } from '../../src/study/index.ts';
import { of, one, site, verdictsOf } from './site.ts';

// Invented studies: for each check one that fails, one that passes and one that stays open or says nothing.

const buses = [
  { id: 'HV', nominalV: 20_000, pcc: true },
  { id: 'LV', nominalV: 400 },
  { id: 'M', nominalV: 400 },
];

describe('harmonic voltage factor at a motor', () => {
  const motor = (more: Partial<Motor> = {}): StudyElement => ({
    id: 'X',
    kind: 'motor',
    bus: 'LV',
    ratedKW: 30,
    ...more,
  });
  const loud = {
    kW: 500,
    spectrum: [
      { h: 5, percent: 60 },
      { h: 7, percent: 40 },
    ],
  };

  it('fails by the general rule of IEC 60034-1, passes as design N, passes in a quiet network', () => {
    const quietly = one(verdictsOf(site({ more: [motor()] })), 'motor-hvf', 'X');
    expect(quietly).toMatchObject({ verdict: 'pass', limit: 0.02 });
    const failing = one(verdictsOf(site({ bank: null, drive: loud, more: [motor()] })), 'motor-hvf', 'X');
    expect(failing.verdict).toBe('fail');
    expect(failing.source.document).toBe('IEC 60034-1');
    const designN = one(verdictsOf(site({ more: [motor({ voltageFactorDesign: 'N' })] })), 'motor-hvf', 'X');
    expect(designN.limit).toBe(0.03);
  });

  it('counts odd orders alone by NEMA MG 1, the rule at 60 Hz', () => {
    const even = {
      spectrum: [
        { h: 2, percent: 40, angleDeg: 0 },
        { h: 5, percent: 5, angleDeg: 0 },
      ],
    };
    const at50 = one(verdictsOf(site({ drive: even, more: [motor()] })), 'motor-hvf', 'X').value ?? 0;
    const nema = one(
      verdictsOf(site({ drive: even, more: [motor({ voltageFactorDesign: 'NEMA' })] })),
      'motor-hvf',
      'X',
    );
    expect(nema.value).toBeLessThan(at50);
    const at60 = one(verdictsOf(site({ more: [motor()], study: { frequencyHz: 60 } })), 'motor-hvf', 'X');
    expect(at60.source.document).toBe('NEMA MG 1');
  });

  it('stays open where the study stops below the 13th', () => {
    expect(
      one(verdictsOf(site({ more: [motor()], study: { maxOrder: 11 } })), 'motor-hvf', 'X').verdict,
    ).toBe('unknown');
  });
});

describe('self-excitation', () => {
  const behind = (kvar: number, noLoadCurrentRatio?: number): Study =>
    site({
      study: { buses },
      bank: null,
      more: [
        {
          id: 'K',
          kind: 'cable',
          from: 'LV',
          to: 'M',
          lengthM: 30,
          resistanceOhmPerKm: 0.2,
          reactanceOhmPerKm: 0.08,
        },
        {
          id: 'X',
          kind: 'motor',
          bus: 'M',
          ratedKW: 75,
          ...(noLoadCurrentRatio === undefined ? {} : { noLoadCurrentRatio }),
        },
        { id: 'C', kind: 'bank', bus: 'M', ratedV: 400, steps: [{ kvar }] },
      ],
    });

  it('fails above 0.9 of the magnetising kvar, passes below, asks for the no-load current', () => {
    expect(one(verdictsOf(behind(60, 0.35)), 'self-excitation').verdict).toBe('fail');
    const kept = one(verdictsOf(behind(20, 0.35)), 'self-excitation');
    expect(kept).toMatchObject({ verdict: 'pass', limit: 0.9 });
    const ratedA = 75_000 / (Math.sqrt(3) * 400 * 0.94 * 0.85);
    expect(kept.value).toBeCloseTo(20_000 / (Math.sqrt(3) * 400 * 0.35 * ratedA), 9);
    expect(one(verdictsOf(behind(20)), 'self-excitation').verdict).toBe('unknown');
  });

  it('says nothing of a bank on a board that feeds more than the motor', () => {
    expect(
      of(verdictsOf(site({ more: [{ id: 'X', kind: 'motor', bus: 'LV', ratedKW: 75 }] })), 'self-excitation'),
    ).toHaveLength(0);
  });
});

describe('leading kvar into a generator', () => {
  const onSet = (kvar: number, loadKW: number): Study => {
    const generator: Generator = {
      id: 'G',
      kind: 'generator',
      bus: 'LV',
      ratedKVA: 800,
      xdSubtransientPercent: 15,
    };
    return site({
      supply: { on: false },
      loadKW,
      drive: { kW: 20 },
      bank: { ratedV: 400, steps: [{ kvar }] },
      more: [generator],
    });
  };

  it('fails where the bank pushes more than a tenth of its rating into it, passes under load', () => {
    const failing = one(verdictsOf(onSet(300, 50)), 'generator-leading', 'G');
    expect(failing).toMatchObject({ verdict: 'fail', limit: 0.1, unit: 'p.u.' });
    expect(failing.mend).toMatch(/[Ii]nterlock/);
    expect(one(verdictsOf(onSet(100, 500)), 'generator-leading', 'G')).toMatchObject({
      verdict: 'pass',
      value: 0,
    });
  });

  it('is the kvar the set absorbs as solved', () => {
    const study = onSet(300, 50);
    const solution = solveCase(study, 'base');
    const terminal = solution.terminals.findIndex(({ element }) => element === 'G') * solution.maxOrder * 3;
    const bus = solution.buses.indexOf('LV') * solution.maxOrder * 3;
    let vars = 0;
    for (let k = 0; k < 3; k++)
      vars +=
        (solution.voltage.im[bus + k] ?? 0) * (solution.current.re[terminal + k] ?? 0) -
        (solution.voltage.re[bus + k] ?? 0) * (solution.current.im[terminal + k] ?? 0);
    expect(one(verdictsOf(study), 'generator-leading', 'G').value).toBeCloseTo(vars / 800_000, 9);
  });

  it('says nothing of a site without a generator in service', () => {
    expect(of(verdictsOf(site()), 'generator-leading')).toHaveLength(0);
  });
});

describe('true power factor by kvar alone', () => {
  it('informs where distortion holds it below the target, passes where it does not, and is silent at low distortion', () => {
    const study = (percent: number, kW = 900): Study =>
      site({ bank: null, loadKW: 1, drive: { kW, spectrum: [{ h: 5, percent }] } });
    expect(one(verdictsOf(study(60)), 'pf-ceiling')).toMatchObject({
      verdict: 'watch',
      screening: true,
      limit: 0.95,
    });
    expect(one(verdictsOf(study(25)), 'pf-ceiling').verdict).toBe('pass');
    expect(of(verdictsOf(study(3)), 'pf-ceiling')).toHaveLength(0);
  });
});

describe('fault level with couplers closed', () => {
  const two = (withstandKA?: number): Study =>
    site({
      study: {
        buses: [
          { id: 'HV', nominalV: 20_000, pcc: true },
          { id: 'LV', nominalV: 400, ...(withstandKA === undefined ? {} : { withstandKA }) },
          { id: 'M', nominalV: 400 },
        ],
      },
      more: [
        {
          id: 'T2',
          kind: 'transformer',
          from: 'HV',
          to: 'M',
          ratedKVA: 1000,
          hvV: 20_000,
          lvV: 400,
          ukPercent: 6,
          loadLossKW: 7.6,
          vectorGroup: 'Dyn11',
        },
        { id: 'Q', kind: 'coupler', from: 'LV', to: 'M', on: false },
      ],
    });

  it('counts both transformers though the coupler is open: 30 kA fails, 65 kA passes', () => {
    expect(one(verdictsOf(two(30)), 'fault-level', 'LV').verdict).toBe('fail');
    const kept = one(verdictsOf(two(65)), 'fault-level', 'LV');
    expect(kept.verdict).toBe('pass');
    // Two transformers of 24 kA each behind 250 MVA, and 400 kW of load: between 42 and 50 kA.
    expect(kept.value).toBeGreaterThan(42);
    expect(kept.value).toBeLessThan(50);
  });

  it('alone and unloaded it is c·U/(√3·Z), Z of supply and transformer in series', () => {
    const study = site({
      study: {
        buses: [
          { id: 'HV', nominalV: 20_000, pcc: true },
          { id: 'LV', nominalV: 400, withstandKA: 50 },
        ],
      },
    });
    const lone = { ...study, elements: study.elements.filter(({ id }) => id === 'S' || id === 'T') };
    // Rt + Rg and Xt + Xg of the closed-form benchmark: 1.2797 and 10.1595 mΩ (computed twice).
    const ohm = Math.hypot(1.216 + 0.063682, 9.52268 + 0.636824) / 1000;
    expect(one(verdictsOf(lone), 'fault-level', 'LV').value).toBeCloseTo(
      (1.05 * 400) / (Math.sqrt(3) * ohm) / 1000,
      3,
    );
  });

  it('a coupled board without a withstand stays open; other boards are not asked', () => {
    expect(one(verdictsOf(two()), 'fault-level', 'M')).toMatchObject({ verdict: 'unknown', limit: null });
    expect(of(verdictsOf(site()), 'fault-level')).toHaveLength(0);
  });
});

describe('ripple-control signal', () => {
  const signal = (hertz: number | undefined, detuningPercent: number, agreedKVA?: number): Verdict => {
    const criteria = {
      ...(hertz === undefined ? {} : { rippleControlHz: hertz }),
      ...(agreedKVA === undefined ? {} : { agreedKVA }),
    };
    return one(
      verdictsOf(site({ bank: { ratedV: 400, detuningPercent }, study: { criteria } })),
      'ripple-signal',
    );
  };

  it('a 7 % bank swallows a signal near its 189 Hz, not one of 1050 Hz', () => {
    expect(signal(183.3, 7, 800).verdict).toBe('fail');
    expect(signal(183.3, 7, 800).mend).toMatch(/183/);
    expect(signal(1050, 7, 800).verdict).toBe('pass');
  });

  it('the site alone is what the PCC sees beside the supply', () => {
    const study = site({
      bank: { ratedV: 400 },
      study: { criteria: { rippleControlHz: 316.7, agreedKVA: 800 } },
    });
    const scan = scanImpedance(study, 'base', {
      bus: 'HV',
      sequence: 'positive',
      frequencyHz: Float64Array.of(316.7),
    });
    const h = 316.7 / 50;
    const z = 20_000 ** 2 / 250e6;
    const r = z / Math.sqrt(101);
    // 1/Z_site = 1/Z_pcc − 1/Z_supply.
    const y = (re: number, im: number): [number, number] => [
      re / (re * re + im * im),
      -im / (re * re + im * im),
    ];
    const [ga, ba] = y(scan.re[0] ?? 0, scan.im[0] ?? 0);
    const [gb, bb] = y(r * h, 10 * r * h);
    const [gc, bc] = y(r, 10 * r * h);
    const site1 = 1 / Math.hypot(ga - gb, ba - bb);
    const site2 = 1 / Math.hypot(ga - gc, ba - bc);
    const value = one(verdictsOf(study), 'ripple-signal').value ?? 0;
    const close = (ohm: number): number => Math.abs(value / (ohm / (20_000 ** 2 / 800e3)) - 1);
    expect(Math.min(close(site1), close(site2))).toBeLessThan(1e-6);
  });

  it('asks for the frequency, then for the agreed power; at 60 Hz and without correction it is silent', () => {
    expect(signal(undefined, 7)).toMatchObject({ verdict: 'unknown' });
    expect(signal(183.3, 7).mend).toMatch(/agreed power/);
    expect(of(verdictsOf(site({ study: { frequencyHz: 60 } })), 'ripple-signal')).toHaveLength(0);
    expect(of(verdictsOf(site({ bank: null })), 'ripple-signal')).toHaveLength(0);
  });
});

describe('energising a transformer beside correction', () => {
  const small = (more: StudyElement[] = []): Study['elements'] => [
    {
      id: 'T2',
      kind: 'transformer',
      from: 'LV',
      to: 'M',
      ratedKVA: 100,
      hvV: 400,
      lvV: 208,
      ukPercent: 4,
      loadLossKW: 1.5,
      vectorGroup: 'Dyn11',
    },
    ...more,
  ];
  const withBank = (bank: Parameters<typeof site>[0]): Study =>
    site({
      study: { buses: [...buses.slice(0, 2), { id: 'M', nominalV: 208 }] },
      more: small(),
      ...bank,
    });

  it('is watched where the bank resonates between the 2nd and the 4th, met where it lies higher', () => {
    const low = one(verdictsOf(withBank({ bank: { ratedV: 400, detuningPercent: 7 } })), 'energising', 'T2');
    expect(low).toMatchObject({ verdict: 'watch', screening: true, limit: 4 });
    expect(low.order).toBeGreaterThan(2);
    expect(low.order).toBeLessThan(4);
    const high = one(
      verdictsOf(withBank({ bank: { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 300 }] } })),
      'energising',
      'T2',
    );
    expect(high).toMatchObject({ verdict: 'pass' });
    expect(high.value).toBeGreaterThan(6.5);
  });

  it('says nothing of a transformer on a busbar without correction, and is quiet where no peak is near', () => {
    expect(of(verdictsOf(site()), 'energising')).toHaveLength(0);
    const tiny = verdictsOf(withBank({ bank: { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 20 }] } }));
    expect(one(tiny, 'energising', 'T2')).toMatchObject({ verdict: 'pass', value: null });
  });
});

describe('cable of a bank', () => {
  const fed = (ratedA: number | undefined, frequencyHz: 50 | 60): Study =>
    site({
      study: { buses, frequencyHz },
      bank: { bus: 'M', ratedV: 400, steps: [{ kvar: 100 }] },
      more: [
        {
          id: 'K',
          kind: 'cable',
          from: 'LV',
          to: 'M',
          lengthM: 10,
          resistanceOhmPerKm: 0.2,
          reactanceOhmPerKm: 0.08,
          ...(ratedA === undefined ? {} : { ratedA }),
        },
      ],
    });
  const ratedA = 100_000 / (Math.sqrt(3) * 400);

  it('needs 1.35 times the rated current at 60 Hz (NEC 460, second-hand), 1.43 times at 50 Hz', () => {
    const at60 = one(verdictsOf(fed(200, 60)), 'feeder', 'K');
    expect(at60.value).toBeCloseTo((1.35 * ratedA) / 200, 9);
    expect(at60).toMatchObject({ verdict: 'pass', source: { document: 'NEC 460' } });
    expect(one(verdictsOf(fed(200, 50)), 'feeder', 'K').verdict).toBe('fail');
    expect(one(verdictsOf(fed(undefined, 50)), 'feeder', 'K')).toMatchObject({ verdict: 'unknown' });
    expect(one(verdictsOf(fed(210, 50)), 'feeder', 'K').remarks[0]).toMatch(/206 to 217 A/);
  });

  it('a published 20 A capacitor takes a 27 A conductor (NEC 460, second-hand)', () => {
    const study = fed(27, 60);
    const kvar = (20 * Math.sqrt(3) * 400) / 1000;
    const bank = study.elements.map((part) => (part.kind === 'bank' ? { ...part, steps: [{ kvar }] } : part));
    expect(one(verdictsOf({ ...study, elements: bank }), 'feeder', 'K').value).toBeCloseTo(1, 9);
  });

  it('says nothing of a bank straight on a board', () => {
    expect(of(verdictsOf(site()), 'feeder')).toHaveLength(0);
  });
});
