import { describe, expect, it } from 'vitest';
import type { Study, StudyElement } from '../../src/study/index.ts';
import { solveDense } from './denseOracle.ts';
import { solved, studyOf } from './study.ts';

/** Three small sites solved by dense complex algebra (mathjs) from matrices built independently. */
const buses = [
  { id: 'hv', nominalV: 11000 },
  { id: 'a', nominalV: 400 },
  { id: 'b', nominalV: 400 },
];

const common = (vectorGroup: string): StudyElement[] => [
  {
    id: 'grid',
    kind: 'supply',
    bus: 'hv',
    shortCircuitMVA: 150,
    xOverR: 7,
    z0OverZ1: 1.6,
    angleDeg: 12,
    setpointPercent: 103,
    background: [
      { h: 3, percent: 0.4, angleDeg: 50 },
      { h: 5, percent: 1.2, angleDeg: -70 },
    ],
  },
  {
    id: 't',
    kind: 'transformer',
    from: 'hv',
    to: 'a',
    ratedKVA: 800,
    hvV: 11000,
    lvV: 410,
    ukPercent: 5.5,
    loadLossKW: 7,
    vectorGroup,
    tapPercent: -2.5,
    noLoadLossKW: 1.1,
    noLoadCurrentPercent: 0.9,
    z0OverZ1: 0.9,
  },
  {
    id: 'k',
    kind: 'cable',
    from: 'a',
    to: 'b',
    lengthM: 300,
    resistanceOhmPerKm: 0.09,
    reactanceOhmPerKm: 0.08,
    capacitanceNFPerKm: 800,
    runs: 2,
  },
];

const spectrum = [
  { h: 2, percent: 3, angleDeg: 20 },
  { h: 3, percent: 40, angleDeg: 175 },
  { h: 5, percent: 30, angleDeg: -8 },
  { h: 7, percent: 12, angleDeg: 170 },
];

const sites: Record<string, Study> = {
  'a motor, a drive and a bank behind Dyn11': studyOf(
    buses,
    [
      ...common('Dyn11'),
      { id: 'm', kind: 'motor', bus: 'b', ratedKW: 90, count: 2 },
      { id: 'd', kind: 'converter', bus: 'a', kW: 120, powerFactor: 0.94, spectrum, filterCapacitanceUF: 50 },
      { id: 'c', kind: 'bank', bus: 'a', ratedV: 440, steps: [{ kvar: 100 }], detuningPercent: 7 },
    ],
    { maxOrder: 7 },
  ),
  'single-phase, pair and four-wire parts behind Dyn5': studyOf(
    buses,
    [
      ...common('Dyn5'),
      { id: 'l1', kind: 'load', bus: 'b', kW: 30, powerFactor: 0.9, connection: 'L1' },
      { id: 'l23', kind: 'load', bus: 'b', kW: 45, powerFactor: 0.7, connection: 'L2L3' },
      { id: 'lz', kind: 'load', bus: 'a', kW: 20, powerFactor: 0.95, connection: 'L2', model: 'impedance' },
      { id: 'it', kind: 'converter', bus: 'b', kW: 40, powerFactor: 0.98, leading: true, wires: 4, spectrum },
      { id: 'one', kind: 'converter', bus: 'b', kW: 9, powerFactor: 0.99, connection: 'L3', spectrum },
      { id: 'pair', kind: 'converter', bus: 'a', kW: 25, powerFactor: 0.9, connection: 'L3L1', spectrum },
      { id: 'three', kind: 'load', bus: 'b', kW: 60, powerFactor: 0.85, neutral: false },
      { id: 'm', kind: 'motor', bus: 'b', ratedKW: 45 },
      {
        id: 'pv',
        kind: 'converter',
        bus: 'b',
        kW: -35,
        powerFactor: 1,
        spectrum: [{ h: 5, percent: 2, angleDeg: 9 }],
      },
    ],
    { maxOrder: 7 },
  ),
  'earthed banks behind YNyn6 with a coupler': studyOf(
    [...buses, { id: 'z', nominalV: 400 }],
    [
      ...common('YNyn6'),
      { id: 'tie', kind: 'coupler', from: 'b', to: 'z' },
      {
        id: 'c',
        kind: 'bank',
        bus: 'z',
        ratedV: 415,
        steps: [{ kvar: 60 }, { kvar: 60, on: false }],
        connection: 'star-earthed',
      },
      { id: 'l', kind: 'load', bus: 'z', kW: 80, powerFactor: 0.8, connection: 'L1L2' },
      { id: 'w', kind: 'load', bus: 'a', kW: 70, powerFactor: 0.9, leading: true },
      { id: 'it', kind: 'converter', bus: 'z', kW: 55, powerFactor: 0.97, wires: 4, spectrum },
    ],
    { maxOrder: 7 },
  ),
};

describe('the engine against dense complex algebra', () => {
  it.each(Object.entries(sites))('agrees to 1e-9 on %s', (_, study) => {
    const want = solveDense(study);
    const got = solved(study);
    study.buses.forEach((bus, b) => {
      const largest = Math.max(...(want.v[b] ?? []).flat().map((v) => Math.hypot(v.re, v.im)));
      want.v[b]?.forEach((phases, order) => {
        phases.forEach((v, k) => {
          const at = (b * got.maxOrder + order) * 3 + k;
          const gap = Math.hypot((got.voltage.re[at] ?? 0) - v.re, (got.voltage.im[at] ?? 0) - v.im);
          expect(gap / largest, `${bus.id} h${order + 1} L${k + 1}`).toBeLessThan(1e-9);
        });
      });
    });
  });
});
