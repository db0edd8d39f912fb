import { describe, expect, it } from 'vitest';
import {
  drivingPoints,
  scanImpedance,
  solveCase,
  solveStudy,
  terminalReading,
  voltagePhasor,
} from '../../src/engine/index.ts';
import type { Study, StudyElement } from '../../src/study/index.ts';
import { amps, busIndex, solved, stiffSupply, studyOf, terminalOf, volts } from './study.ts';

/** A supply of E = 1000 V between lines behind 1 Ω, almost pure reactance, and one load beyond a short tie. */
function stressed(kW: number, more: Partial<StudyElement> = {}): Study {
  return studyOf(
    [
      { id: 'near', nominalV: 1000 },
      { id: 'far', nominalV: 1000 },
    ],
    [
      { id: 'grid', kind: 'supply', bus: 'near', shortCircuitMVA: 1, xOverR: 1e6 },
      { id: 'tie', kind: 'coupler', from: 'near', to: 'far', resistanceMOhm: 1e-3, reactanceMOhm: 1e-3 },
      { id: 'heat', kind: 'load', bus: 'far', kW, powerFactor: 1, neutral: false, ...more } as StudyElement,
    ],
    { maxOrder: 3, scans: [{ bus: 'near', sequence: 'positive', fromHz: 50, toHz: 150, points: 3 }] },
  );
}

/**
 * Upper solution of U⁴ + (2PR − E²)·U² + P²·|Z|² = 0 at unity power factor, Z = R + jX of source and tie.
 * The nose is at P = E²/(2X) = 500 kW.
 */
function upperVolts(kW: number): number {
  const p = kW * 1e3;
  const [r, x] = [2e-6, 1 + 1e-6];
  const half = (1000 ** 2 - 2 * p * r) / 2;
  return Math.sqrt(half + Math.sqrt(half * half - p * p * (r * r + x * x)));
}

describe('constant power near what the network can carry (closed form of two busbars)', () => {
  it.each([100, 300, 400])('has the upper voltage at %i kW of 500 kW', (kW) => {
    expect(volts(solved(stressed(kW)), 'far', 1) * Math.sqrt(3)).toBeCloseTo(upperVolts(kW), 6);
  });

  it.each([490, 499, 499.9])('reaches the upper voltage at %d kW, where the fixed point gives up', (kW) => {
    const solution = solved(stressed(kW));
    expect(solution.iterations).toBeGreaterThan(100);
    expect((volts(solution, 'far', 1) * Math.sqrt(3)) / upperVolts(kW)).toBeCloseTo(1, 8);
  });

  it('reaches it in phase coordinates and for an unbalanced load as well', () => {
    const phase = solveCase(stressed(495), 'base', { coordinates: 'phase' });
    expect(phase.converged).toBe(true);
    expect((volts(phase, 'far', 1) * Math.sqrt(3)) / upperVolts(495)).toBeCloseTo(1, 8);
    // One pair sees 2 Ω behind 1000 V: nose at E²/(2·2X) = 250 kW.
    const pair = solved(stressed(248, { connection: 'L1L2' } as Partial<StudyElement>));
    const reading = terminalReading(pair, terminalOf(pair, 'heat'));
    expect(pair.iterations).toBeGreaterThan(100);
    expect(reading.kW).toBeCloseTo(248, 6);
  });

  it('says that the demand is too much beyond the limit, names the busbar, and still scans', () => {
    const results = solveStudy({
      ...stressed(505),
      cases: [
        { id: 'too-much', changes: [] },
        { id: 'less', changes: [{ element: 'heat', set: { kW: 200 } }] },
      ],
    });
    const [failed, other] = results.cases;
    expect(failed?.converged).toBe(false);
    expect(failed?.error).toMatch(/demand exceeds what the network can carry.*9[89]\.\d %.*bus far/);
    expect([failed?.buses, failed?.terminals, failed?.checks]).toEqual([[], [], []]);
    expect(failed?.scans[0]?.points).toHaveLength(3);
    expect(other?.converged).toBe(true);
  });

  it('never returns a voltage that is not a number', () => {
    const solution = solveCase(stressed(1e9), 'base');
    expect(solution.converged).toBe(false);
    expect(solution.voltage.re).toHaveLength(0);
    expect(() => voltagePhasor(solution, 0, 1, 0)).toThrow(RangeError);
  });
});

describe('a network in parts', () => {
  const study = studyOf(
    [
      { id: 'a', nominalV: 400 },
      { id: 'b', name: 'Workshop', nominalV: 400 },
      { id: 'c', nominalV: 400 },
    ],
    [
      stiffSupply('a'),
      { id: 'tie', kind: 'coupler', from: 'a', to: 'b', on: false },
      { id: 'load', kind: 'load', bus: 'b', kW: 20, powerFactor: 0.9 },
      { id: 'set', kind: 'generator', bus: 'c', ratedKVA: 100, xdSubtransientPercent: 15, angleDeg: 40 },
      { id: 'own', kind: 'load', bus: 'c', kW: 30, powerFactor: 0.9 },
    ],
  );

  it('names a busbar without a path to a source, gives it zero voltage, and solves the rest', () => {
    const solution = solved(study);
    expect(solution.deenergised).toEqual(['b']);
    expect(solution.warnings).toContain('bus b (Workshop) has no path to a source');
    expect(volts(solution, 'b', 1)).toBe(0);
    expect(amps(solution, 'load', 1)).toBe(0);
    const reading = terminalReading(solution, terminalOf(solution, 'load'));
    expect(reading).toMatchObject({ kW: 0, kVA: 0, displacementPF: null, truePF: null });
  });

  it('solves every island of its own', () => {
    const solution = solved(study);
    expect(terminalReading(solution, terminalOf(solution, 'set')).kW).toBeCloseTo(-30, 6);
    expect(terminalReading(solution, terminalOf(solution, 'own')).kW).toBeCloseTo(30, 6);
  });

  it('has no impedance to scan on a busbar without a source, and marks it among the driving points', () => {
    const scan = scanImpedance(study, 'base', {
      bus: 'b',
      sequence: 'positive',
      fromHz: 50,
      toHz: 500,
      points: 5,
    });
    expect(scan.error).toContain('bus b (Workshop) has no path to a source');
    expect(scan.frequencyHz).toHaveLength(0);
    expect([...drivingPoints(study, 'base', 5).present]).toEqual([1, 0, 1]);
  });

  it('solves a study without any source: nothing is energised', () => {
    const dark = { ...study, elements: study.elements.filter(({ id }) => id !== 'grid' && id !== 'set') };
    const solution = solved(dark);
    expect(solution.deenergised).toEqual(['a', 'b', 'c']);
    expect([...solution.voltage.re].every((v) => v === 0)).toBe(true);
  });
});

describe('a generator without a given angle', () => {
  const ring = (generator: Partial<StudyElement>, supplyOn = true): Study =>
    studyOf(
      [
        { id: 'hv', nominalV: 11000 },
        { id: 'lv', nominalV: 400 },
      ],
      [
        {
          id: 'grid',
          kind: 'supply',
          bus: 'hv',
          shortCircuitMVA: 150,
          xOverR: 8,
          angleDeg: 20,
          on: supplyOn,
        },
        {
          id: 't',
          kind: 'transformer',
          from: 'hv',
          to: 'lv',
          ratedKVA: 1000,
          hvV: 11000,
          lvV: 400,
          ukPercent: 6,
          loadLossKW: 8,
          vectorGroup: 'Dyn11',
        },
        {
          id: 'g',
          kind: 'generator',
          bus: 'lv',
          ratedKVA: 500,
          xdSubtransientPercent: 15,
          ...generator,
        } as StudyElement,
      ],
    );

  it('takes the no-load angle of its busbar, so that no current flows (supply 20°, Dyn11: 50°)', () => {
    const solution = solved(ring({}));
    expect(amps(solution, 'g', 1)).toBeLessThan(1e-6);
    const angle = voltagePhasor(solution, busIndex(solution, 'lv'), 1, 0).arg();
    expect((angle * 180) / Math.PI).toBeCloseTo(50, 9);
  });

  it('stands at 0° when it is its island’s only source', () => {
    const solution = solved(ring({}, false));
    expect(voltagePhasor(solution, busIndex(solution, 'lv'), 1, 0).arg()).toBeCloseTo(0, 9);
  });

  it('follows another generator with an angle where there is no supply', () => {
    const study = ring({ angleDeg: -10 }, false);
    const pair: Study = {
      ...study,
      elements: [
        { id: 'g0', kind: 'generator', bus: 'hv', ratedKVA: 500, xdSubtransientPercent: 15 },
        ...study.elements,
      ],
    };
    const solution = solved(pair);
    expect(amps(solution, 'g0', 1)).toBeLessThan(1e-6);
    const angle = voltagePhasor(solution, busIndex(solution, 'hv'), 1, 0).arg();
    expect((angle * 180) / Math.PI).toBeCloseTo(-40, 9);
  });
});
