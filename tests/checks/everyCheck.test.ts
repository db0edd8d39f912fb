import { describe, expect, it } from 'vitest';
import { judgeStudy, type Verdict } from '../../src/checks/index.ts';
import type { Study, StudyElement } from '../../src/study/index.ts';
import { site } from './site.ts';

// Invented studies that between them fail, pass and leave open each check.
const dead = [
  { id: 'HV', nominalV: 20_000, pcc: true },
  { id: 'LV', nominalV: 400 },
  { id: 'X', nominalV: 400 },
];
const plain = { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 320 }] };
const welder: StudyElement = {
  id: 'W',
  kind: 'load',
  bus: 'LV',
  kW: 500,
  powerFactor: 0.6,
  connection: 'L1L2',
};
const filter = (ratedV: number, id = 'F', bus = 'LV'): StudyElement => ({
  id,
  kind: 'filter',
  bus,
  type: 'single-tuned',
  kvar: 150,
  tunedOrder: 4.7,
  qFactor: 40,
  ratedV,
});
const cable = (ratedA?: number): StudyElement => ({
  id: 'K',
  kind: 'cable',
  from: 'LV',
  to: 'X',
  lengthM: 50,
  resistanceOhmPerKm: 0.2,
  reactanceOhmPerKm: 0.08,
  ...(ratedA === undefined ? {} : { ratedA }),
});
const cabled = (ratedA?: number): Study =>
  site({
    study: { buses: dead },
    more: [cable(ratedA), { id: 'LX', kind: 'load', bus: 'X', kW: 80, powerFactor: 0.9 }],
  });
const ieee = { frequencyHz: 60 as const, criteria: { demandCurrentA: 20, shortCircuitMVAAtPcc: 250 } };

const studies: Study[] = [
  site(),
  site({ study: ieee }),
  site({ study: { frequencyHz: 60 } }),
  site({
    bank: null,
    drive: {
      kW: 700,
      spectrum: [
        { h: 5, percent: 60 },
        { h: 7, percent: 40 },
      ],
    },
    study: ieee,
  }),
  site({ loadKW: 100, drive: { kW: 500 }, bank: plain }),
  site({ loadKW: 900, supply: { setpointPercent: 113 }, more: [welder] }),
  site({ transformer: { on: false } }),
  site({ supply: { on: false } }),
  site({ study: { limits: { capacitor: 'none-such', internal: 'none-such' } } }),
  site({ drive: { kW: -900, powerFactor: 1 } }),
  site({ bank: null, more: [filter(400), filter(600, 'F2')] }),
  cabled(400),
  cabled(60),
  cabled(),
];

describe('every check', () => {
  const seen = new Map<string, Set<Verdict['verdict']>>();
  const screens = new Set<string>();
  for (const study of studies) {
    for (const { check, verdict, screening } of judgeStudy(study)) {
      seen.set(check, (seen.get(check) ?? new Set()).add(verdict));
      if (screening && check !== 'bus-thd' && check !== 'bus-order') screens.add(check);
    }
  }

  it.each([
    'target-pf',
    'bus-voltage',
    'bus-thd',
    'bus-order',
    'pcc-tdd',
    'bank-current',
    'bank-voltage',
    'bank-kvar',
    'filter-duty',
    'transformer-load',
    'cable-load',
  ])('%s fails, passes and leaves open in turn', (check) => {
    expect([...(seen.get(check) ?? [])]).toEqual(expect.arrayContaining(['fail', 'pass', 'unknown']));
  });

  it('unbalance fails and passes; a busbar without a source is left to bus-voltage', () => {
    expect([...(seen.get('unbalance') ?? [])]).toEqual(expect.arrayContaining(['fail', 'pass']));
    expect(seen.get('unbalance')?.has('unknown')).toBe(false);
  });

  it.each(['resonance-distance', 'amplification'])(
    '%s, a screen, is not met, passes and leaves open, and never fails',
    (check) => {
      expect([...(seen.get(check) ?? [])].sort()).toEqual(['pass', 'unknown', 'watch']);
      expect(screens).toContain(check);
    },
  );
});
