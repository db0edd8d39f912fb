import { describe, expect, it } from 'vitest';
import { inflowAt, judgeStudy, SolvedCase } from '../../src/checks/index.ts';
import { solveCase } from '../../src/engine/index.ts';
import { quickSite } from '../../src/sizing/index.ts';
import type { SiteAnswers, Study } from '../../src/study/index.ts';

/** kW, kvar and cos φ drawn at the intake of a drawn site without its bank. */
function atIntake(answers: SiteAnswers) {
  const { study } = quickSite(answers).drawn;
  const bare: Study = { ...study, elements: study.elements.filter(({ kind }) => kind !== 'bank'), view: {} };
  const inflow = inflowAt(bare, new SolvedCase(solveCase(bare, 'base')), 'intake');
  if (!inflow) throw new Error('nothing feeds the intake');
  return inflow;
}

describe('the quick start', () => {
  // Q = P·(tan φ1 − tan φ2), published examples read second-hand; E_r/E = tan φ1.
  const published = [
    { kW: 100, pf1: 0.75, pf2: 0.95, kvar: 55.3 }, // factor 0.882 − 0.329, printed 55 kvar
    { kW: 620, pf1: 0.65, pf2: 0.9, kvar: 424.6 }, // factor 0.685, printed 425 kvar
    { kW: 164.6, pf1: 0.86, pf2: 0.95, kvar: 43.6 }, // factor 0.593 − 0.328, printed 44 kvar
  ];
  for (const { kW, pf1, pf2, kvar } of published) {
    it(`asks ${kvar} kvar for ${kW} kW from cos φ ${pf1} to ${pf2}`, () => {
      const activeKWh = 300 * kW;
      const reactiveKvarh = activeKWh * Math.tan(Math.acos(pf1));
      const site = quickSite({ ratedKVA: 1000, activeKWh, reactiveKvarh, hours: 300, targetPF: pf2 });
      expect(site.figures.kW).toBeCloseTo(kW, 9);
      expect(site.kvar).toBeCloseTo(kvar, 1);
    });
  }

  it('shows its working from bill to bank', () => {
    const { working } = quickSite({ activeKWh: 192_000, reactiveKvarh: 144_000, hours: 400 });
    expect(working.map(({ numbers }) => numbers)).toEqual([
      '192000 kWh / 400 h = 480 kW',
      '144000 kvarh / 192000 kWh = 0.75, cos φ = 0.8',
      '480 kW · (0.75 − 0.3287) = 202.2 kvar',
      expect.stringMatching(/^\d × \d+ kvar · \(400 V \/ 440 V\)² \/ \(1 − 0(\.07)?\) = [\d.]+ kvar$/),
    ]);
  });

  const sites: SiteAnswers[] = [
    {},
    { ratedKVA: 630, activeKWh: 180_000, reactiveKvarh: 110_000, hours: 450 },
    {
      ratedKVA: 2500,
      system: '480-60',
      activeKWh: 600_000,
      reactiveKvarh: 450_000,
      peakKW: 1500,
      drivesPercent: 60,
      driveKind: 'no-choke',
    },
    { drivesPercent: 90, reactiveKvarh: 204_000 },
    { ratedKVA: 100, system: '415-50', driveKind: 'low-harmonic' },
    { ratedKVA: 3150, peakKW: 2600, activeKWh: 900_000, reactiveKvarh: 900_000, drivesPercent: 0 },
  ];
  for (const answers of sites) {
    it(`draws a site that takes the bill's power again: ${JSON.stringify(answers)}`, () => {
      const { figures } = quickSite(answers);
      const { kW, kvar, displacementPF } = atIntake(answers);
      expect(Math.abs(kW / figures.kW - 1)).toBeLessThan(0.01);
      expect(Math.abs(kvar / figures.kvar - 1)).toBeLessThan(0.015);
      expect(Math.abs((displacementPF ?? 0) - figures.cosPhi)).toBeLessThan(0.004);
    });
  }

  it('meets the target with the suggested bank, on the strong and on the weak supply', () => {
    const verdicts = judgeStudy(quickSite({}).drawn.study, { screening: false });
    const target = verdicts.filter(({ check }) => check === 'target-pf');
    expect(target.map(({ caseId }) => caseId).toSorted()).toEqual(['base', 'weak']);
    for (const { value } of target) expect(value).toBeGreaterThanOrEqual(0.95);
    expect(verdicts.filter(({ verdict }) => verdict === 'fail')).toEqual([]);
  });

  it('lets the worse of both supplies govern: distortion is higher on the weak one', () => {
    const thd = judgeStudy(quickSite({}).drawn.study, { screening: false }).filter(
      ({ check, subject }) => check === 'bus-thd' && subject.id === 'main',
    );
    const [first] = thd;
    expect(thd).toHaveLength(2);
    expect(first?.caseId).toBe('weak');
  });
});
