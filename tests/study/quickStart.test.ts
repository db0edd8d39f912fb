import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  answerFields,
  answerIssues,
  assumptionsOf,
  checkStudy,
  drawSite,
  driveKinds,
  elementById,
  figuresOf,
  newStudy,
  quickStartEdit,
  type SiteAnswers,
  siteSystems,
  type Transformer,
  updateElement,
  withTyped,
} from '../../src/study/index.ts';

const bill: SiteAnswers = {
  ratedKVA: 1000,
  ukPercent: 6,
  activeKWh: 192_000,
  reactiveKvarh: 144_000,
  hours: 400,
  drivesPercent: 25,
  driveKind: 'choke',
};

describe('the bill', () => {
  it('gives P = E/h, tan φ = E_r/E and its cos φ', () => {
    const { kW, kvar, tanPhi, cosPhi, hours } = figuresOf(bill);
    expect(kW).toBe(480);
    expect(tanPhi).toBe(0.75);
    expect(cosPhi).toBeCloseTo(0.8, 12);
    expect(kvar).toBe(360);
    expect(hours).toBe(400);
  });

  it('gives the peak its demand where one is stated, and then tells the hours of use', () => {
    const { kW, hours } = figuresOf({ ...bill, peakKW: 600 });
    expect(kW).toBe(600);
    expect(hours).toBe(320);
  });

  it('is assumed at 60 % of the transformer, cos φ 0.85 and 400 h where nothing is known', () => {
    const { activeKWh, reactiveKvarh, kW, given } = figuresOf({});
    expect(activeKWh).toBe(204_000); // 1000 kVA · 0.6 · 0.85 · 400 h
    expect(reactiveKvarh).toBe(126_000); // 204 000 kWh · tan(acos 0.85) = 126 429, to three digits
    expect(kW).toBe(510);
    expect([...given]).toEqual([]);
  });

  it('follows a stated peak where its energy is not known', () => {
    expect(figuresOf({ peakKW: 300 }).activeKWh).toBe(120_000);
  });
});

describe('the load below the transformer', () => {
  // 480 kW and 360 kvar are 600 kVA, β² = 0.36. Regulation (EU) 548/2014, tier 2, 1000 kVA: P_k 7600 W,
  // P_0 693 W; i_0 0.6 %; u_x = √(0.06² − 0.0076²) = 0.0595167.
  const { transformer, drives, motors, others } = drawSite(figuresOf(bill), 0).shares;

  it('leaves the transformer its own loss and kvar', () => {
    expect(transformer.kW).toBeCloseTo((693 + 7600 * 0.36) / 1000, 9);
    expect(transformer.kvar).toBeCloseTo(1000 * (0.006 + 0.0595167 * 0.36), 3);
  });

  it('gives drives their share at the cos φ of their kind', () => {
    expect(drives.kW).toBeCloseTo(0.25 * (480 - 3.429), 6);
    expect(drives.kW / Math.hypot(drives.kW, drives.kvar)).toBeCloseTo(0.96, 9);
  });

  it('gives motors the kvar that are left, and no more kW than there are', () => {
    expect(transformer.kvar + drives.kvar + motors.kvar + others.kvar).toBeCloseTo(360, 9);
    expect(transformer.kW + drives.kW + motors.kW + others.kW).toBeCloseTo(480, 9);
    expect(others.kW).toBeGreaterThanOrEqual(0);
    // 297.8 kvar at cos φ 0.80 would be 397 kW; 357.4 kW are left, so the motors run worse than that.
    expect(motors.kW).toBeCloseTo(0.75 * (480 - 3.429), 6);
  });

  it('lets drives run better than their kind where the bill is better', () => {
    const { shares } = drawSite(figuresOf({ ...bill, reactiveKvarh: 20_000, drivesPercent: 90 }), 0);
    expect(shares.drives.kvar).toBeLessThan(shares.drives.kW * Math.tan(Math.acos(0.96)));
    expect(shares.motors.kvar).toBeGreaterThanOrEqual(0);
  });
});

describe('the suggested bank', () => {
  it('is detuned above 15 % of harmonic kVA, and its steps give the kvar behind p at the busbar', () => {
    const { bank } = drawSite(figuresOf({ ...bill, drivesPercent: 40 }), 202.2);
    expect(bank).toMatchObject({ detuningPercent: 7, ratedV: 440 });
    // Q = Q_N·(U/U_N)²/(1 − p), 5 % in reserve: Q_N ≥ 1.05·202.2·0.93·1.21 = 238.9 kvar.
    const rated = (bank?.steps ?? 0) * (bank?.stepKvar ?? 0);
    expect(rated).toBe(240);
    expect(bank?.givesKvar).toBeCloseTo(240 / 1.21 / 0.93, 9);
  });

  it('is plain with few drives, and with low-harmonic ones', () => {
    expect(drawSite(figuresOf({ ...bill, drivesPercent: 5 }), 200).bank?.detuningPercent).toBe(0);
    const low: SiteAnswers = { ...bill, drivesPercent: 80, driveKind: 'low-harmonic' };
    expect(drawSite(figuresOf(low), 200).bank?.detuningPercent).toBe(0);
  });

  it('is not drawn where the bill meets its target', () => {
    const { bank, study } = drawSite(figuresOf(bill), -10);
    expect(bank).toBeNull();
    expect(study.elements.some(({ kind }) => kind === 'bank')).toBe(false);
  });
});

describe('an unknown fault level', () => {
  it('makes a strong and a weak case, 500 and 100 MVA, and judges the PCC by the weak one', () => {
    const { study } = drawSite(figuresOf(bill), 200);
    expect(study.cases?.map(({ changes }) => changes)).toEqual([
      [],
      [{ element: 'supply', set: { shortCircuitMVA: 100 } }],
    ]);
    expect(elementById(study, 'supply')).toMatchObject({ shortCircuitMVA: 500, shortCircuitMVAMin: 100 });
    expect(study.criteria?.shortCircuitMVAAtPcc).toBe(100);
  });

  it('is one case once it is known', () => {
    const { study } = drawSite(figuresOf({ ...bill, faultLevelMVA: 250 }), 200);
    expect(study.cases).toHaveLength(1);
    expect(study.criteria?.shortCircuitMVAAtPcc).toBe(250);
  });
});

describe('what is assumed', () => {
  const paths = (answers: SiteAnswers) =>
    assumptionsOf(drawSite(figuresOf(answers), 200).study).map(({ path }) => path);

  it('names every answer nobody gave, and none that was given', () => {
    expect(paths({})).toEqual(
      expect.arrayContaining([
        'elements.supply.shortCircuitMVA',
        'elements.t1.ratedKVA',
        'elements.t1.ukPercent',
        'buses.main.nominalV',
      ]),
    );
    const told = paths({ ...bill, system: '400-50', faultLevelMVA: 250 });
    for (const path of [
      'elements.supply.shortCircuitMVA',
      'elements.t1.ratedKVA',
      'elements.t1.ukPercent',
      'buses.main.nominalV',
    ])
      expect(told).not.toContain(path);
  });

  it('says why at each of them', () => {
    for (const { origin, path } of assumptionsOf(drawSite(figuresOf({}), 200).study))
      expect(origin.note, path).toMatch(/\w{3}/);
  });

  it('shrinks when a value is corrected', () => {
    const { study } = drawSite(figuresOf({}), 200);
    const corrected = updateElement(study, 't1', { loadLossKW: 9.1 }).apply(study);
    expect(assumptionsOf(corrected)).toHaveLength(assumptionsOf(study).length - 1);
    expect(corrected.origins?.['elements.t1.loadLossKW']).toBeUndefined();
  });

  it('leaves out what belongs to a part that is gone', () => {
    const { study } = drawSite(figuresOf({}), 200);
    const without = { ...study, elements: study.elements.filter(({ id }) => id !== 'drives') };
    expect(assumptionsOf(without).some(({ path }) => path.includes('.drives.'))).toBe(false);
  });
});

describe('drawing the site', () => {
  it('is one edit that keeps a title and notes already given; undo and redo are exact', () => {
    const empty = { ...newStudy({ title: 'Mill Lane' }), preparedBy: 'R. Aldous', notes: 'First visit.' };
    const edit = quickStartEdit(drawSite(figuresOf(bill), 200));
    const drawn = edit.apply(empty);
    expect(drawn).toMatchObject({ title: 'Mill Lane', preparedBy: 'R. Aldous' });
    expect(drawn.notes).toMatch(/^First visit\.\n\nDrawn by the quick start/);
    expect(edit.apply(empty)).toEqual(drawn);
    expect(empty.elements).toEqual([]);
  });

  it('titles a study that has no title of its own', () => {
    expect(quickStartEdit(drawSite(figuresOf(bill), 200)).apply(newStudy({ title: 'New study' })).title).toBe(
      'Site behind one transformer of 1 000 kVA',
    );
  });

  const answers: fc.Arbitrary<SiteAnswers> = fc.record(
    {
      system: fc.constantFrom(...siteSystems.map(({ id }) => id)),
      ratedKVA: fc.integer({ min: 25, max: 3150 }),
      ukPercent: fc.double({ min: 2.5, max: 20, noNaN: true }),
      faultLevelMVA: fc.integer({ min: 5, max: 10_000 }),
      reactiveKvarh: fc.integer({ min: 0, max: 2_000_000 }),
      peakKW: fc.integer({ min: 1, max: 4000 }),
      drivesPercent: fc.integer({ min: 0, max: 100 }),
      driveKind: fc.constantFrom(...(Object.keys(driveKinds) as (keyof typeof driveKinds)[])),
      targetPF: fc.double({ min: 0.7, max: 1, noNaN: true }),
    },
    { requiredKeys: [] },
  );

  it('gives a sound study for any answers that fit together', () => {
    fc.assert(
      fc.property(answers, fc.double({ min: -100, max: 3000, noNaN: true }), (some, kvar) => {
        fc.pre(answerIssues(some).every(({ severity }) => severity !== 'error'));
        const { findings } = checkStudy(drawSite(figuresOf(some), kvar).study);
        expect(findings.filter(({ severity }) => severity === 'error')).toEqual([]);
      }),
      { seed: 20_261, numRuns: 200 },
    );
  });
});

describe('answers that do not fit together', () => {
  it('are said at the field that mends them', () => {
    const overloaded = answerIssues({ ratedKVA: 250, peakKW: 480 });
    expect(overloaded).toMatchObject([{ key: 'peakKW', severity: 'error' }]);
    expect(overloaded[0]?.message).toContain('226\u2009%'); // 480 kW at cos φ 0.85 are 565 kVA
    expect(answerIssues({ ...bill, ratedKVA: 500 })).toMatchObject([{ key: 'peakKW', severity: 'warning' }]);
    expect(answerIssues({ ...bill, activeKWh: 10_000, peakKW: 1 })[0]).toMatchObject({ severity: 'error' });
    const exchanged = answerIssues({ ...bill, activeKWh: 36_000, reactiveKvarh: 144_000 });
    expect(exchanged).toMatchObject([{ key: 'reactiveKvarh', severity: 'error' }]);
    expect(answerIssues({})).toEqual([]);
  });
});

describe('what is being typed', () => {
  it('is followed in trade units, with decimal comma, prefixes and arithmetic', () => {
    expect(withTyped({}, 'ratedKVA', '1,6 MVA')).toEqual({ ratedKVA: 1600 });
    expect(withTyped({}, 'activeKWh', '180 MWh')).toEqual({ activeKWh: 180_000 });
    expect(withTyped({}, 'reactiveKvarh', '3*40 000')).toEqual({ reactiveKvarh: 120_000 });
  });

  it('is a peak in kW or hours of use in h on the same line', () => {
    expect(withTyped({ hours: 400 }, 'peakKW', '0.48 MW')).toEqual({ peakKW: 480 });
    expect(withTyped({ peakKW: 480 }, 'peakKW', '350 h')).toEqual({ hours: 350 });
  });

  it('is left alone while it is no quantity of the field, and taken out when emptied', () => {
    expect(withTyped({ ratedKVA: 630 }, 'ratedKVA', '4000')).toBeNull(); // above the typical data
    expect(withTyped({}, 'ratedKVA', 'big')).toBeNull();
    expect(withTyped({ ratedKVA: 630 }, 'ratedKVA', ' ')).toEqual({});
  });

  it('has at most eight fields besides the two typical values', () => {
    const shown = Object.keys(answerFields).filter(
      (key) => !['hours', 'ukPercent', 'targetPF'].includes(key),
    );
    expect(shown).toHaveLength(8);
  });
});

it('the drawn transformer carries typical losses with their source', () => {
  const { study } = drawSite(figuresOf({ ratedKVA: 630 }), 100);
  const t1 = elementById(study, 't1') as Transformer;
  expect(t1).toMatchObject({ loadLossKW: 4.6, noLoadLossKW: 0.54, ukPercent: 4 });
  expect(study.origins?.['elements.t1.loadLossKW']?.note).toContain('548/2014');
});
