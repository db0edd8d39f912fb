import { describe, expect, it } from 'vitest';
import { scanImpedance, solveCase, terminalReading } from '../../src/engine/index.ts';
import type { Study, StudyElement } from '../../src/study/index.ts';
import { amps, solved, stiffSupply, studyOf, terminalOf, volts } from './study.ts';

/** A delta-delta transformer: its low-voltage busbar has no zero-sequence path of its own. */
function unearthed(...parts: StudyElement[]): Study {
  return studyOf(
    [
      { id: 'hv', nominalV: 11000 },
      { id: 'lv', name: 'Board', nominalV: 400 },
    ],
    [
      stiffSupply('hv'),
      {
        id: 't',
        kind: 'transformer',
        from: 'hv',
        to: 'lv',
        ratedKVA: 500,
        hvV: 11000,
        lvV: 400,
        ukPercent: 4,
        loadLossKW: 5,
        vectorGroup: 'Dd0',
      },
      ...parts,
    ],
  );
}

const electronic = (more: Partial<StudyElement> = {}): StudyElement =>
  ({
    id: 'it',
    name: 'Desks',
    kind: 'converter',
    bus: 'lv',
    kW: 30,
    powerFactor: 0.98,
    wires: 4,
    spectrum: [
      { h: 3, percent: 60, angleDeg: 0 },
      { h: 5, percent: 30, angleDeg: 0 },
    ],
    ...more,
  }) as StudyElement;

describe('a busbar without a zero-sequence path', () => {
  it('is named once in a warning and has no zero-sequence voltage', () => {
    const solution = solved(
      unearthed({ id: 'w', kind: 'load', bus: 'lv', kW: 50, powerFactor: 0.9, connection: 'L1L2' }),
    );
    const named = solution.warnings.filter((text) =>
      text.includes('bus lv (Board) has no zero-sequence path'),
    );
    expect(named).toHaveLength(1);
    const zero = [0, 1, 2].reduce((sum, k) => sum + (solution.voltage.re[3 * 25 + k] ?? 0), 0);
    expect(Math.abs(zero)).toBeLessThan(1e-8);
    expect(amps(solution, 'w', 1)).toBeGreaterThan(100);
  });

  it('makes a four-wire converter three-wire, with a word: no triplen current flows', () => {
    const solution = solved(unearthed(electronic()));
    expect(
      solution.warnings.some((text) => text.includes('it (Desks)') && text.includes('treated as three-wire')),
    ).toBe(true);
    expect(amps(solution, 'it', 3)).toBeLessThan(1e-9);
    expect(amps(solution, 'it', 5)).toBeGreaterThan(1);
  });

  it('makes a constant-power load with neutral three-wire at the fundamental alone', () => {
    const load: StudyElement = { id: 'l', kind: 'load', bus: 'lv', kW: 30, powerFactor: 0.9, neutral: true };
    const solution = solved(unearthed(load, electronic()));
    expect(
      solution.warnings.some((text) => text.includes('load l') && text.includes('at the fundamental')),
    ).toBe(true);
    // At harmonics the load's admittance is the path, so triplens flow from the electronics into it.
    expect(amps(solution, 'it', 3)).toBeGreaterThan(1);
    expect(amps(solution, 'l', 3)).toBeCloseTo(amps(solution, 'it', 3), 9);
  });

  it('is the error of a single-phase demand to neutral, naming part and busbar', () => {
    const lamp: StudyElement = {
      id: 'lamp',
      kind: 'load',
      bus: 'lv',
      kW: 3,
      powerFactor: 1,
      connection: 'L2',
    };
    const solution = solveCase(unearthed(lamp), 'base');
    expect(solution.converged).toBe(false);
    expect(solution.error).toMatch(/load lamp on bus lv \(Board\)/);
    const span = { bus: 'lv', sequence: 'positive', fromHz: 50, toHz: 500, points: 4 } as const;
    expect(scanImpedance(unearthed(lamp), 'base', span).error).toBeUndefined();
  });

  it('does not count a cable’s or a bank’s capacitance as a path for a demand', () => {
    const bank: StudyElement = {
      id: 'c',
      kind: 'bank',
      bus: 'lv',
      ratedV: 400,
      connection: 'star-earthed',
      steps: [{ kvar: 20 }],
    };
    const lamp: StudyElement = {
      id: 'lamp',
      kind: 'load',
      bus: 'lv',
      kW: 3,
      powerFactor: 1,
      connection: 'L2',
    };
    expect(solveCase(unearthed(bank, lamp), 'base').error).toMatch(/lamp/);
    const solution = solved(unearthed(bank, electronic()));
    expect(solution.warnings.some((text) => text.includes('lv (Board) has no zero-sequence path'))).toBe(
      false,
    );
    expect(amps(solution, 'c', 3)).toBeCloseTo(amps(solution, 'it', 3), 9);
  });

  it('lets an impedance load to neutral earth it', () => {
    const heater: StudyElement = {
      id: 'h',
      kind: 'load',
      bus: 'lv',
      kW: 3,
      powerFactor: 1,
      connection: 'L1',
      model: 'impedance',
    };
    const lamp: StudyElement = {
      id: 'lamp',
      kind: 'load',
      bus: 'lv',
      kW: 0.5,
      powerFactor: 1,
      connection: 'L2',
    };
    const solution = solved(unearthed(heater, lamp));
    expect(terminalReading(solution, terminalOf(solution, 'lamp')).kW).toBeCloseTo(0.5, 9);
  });

  it('has no zero-sequence impedance to scan, and a positive one', () => {
    const scan = (sequence: 'zero' | 'positive') =>
      scanImpedance(unearthed(), 'base', { bus: 'lv', sequence, fromHz: 50, toHz: 500, points: 4 });
    expect(scan('zero').error).toContain('no zero-sequence path');
    expect(scan('positive').error).toBeUndefined();
  });

  it('passes zero sequence on through cable, reactor, coupler, branch and YNyn', () => {
    const buses = ['a', 'b', 'c', 'd', 'e', 'f'].map((id) => ({ id, nominalV: 400 }));
    const study = studyOf(buses, [
      { id: 's', kind: 'supply', bus: 'a', shortCircuitMVA: 20, xOverR: 5 },
      {
        id: '1',
        kind: 'cable',
        from: 'a',
        to: 'b',
        lengthM: 10,
        resistanceOhmPerKm: 0.1,
        reactanceOhmPerKm: 0.1,
      },
      { id: '2', kind: 'reactor', from: 'b', to: 'c', inductanceMH: 0.01 },
      { id: '3', kind: 'coupler', from: 'd', to: 'c' },
      { id: '4', kind: 'branch', from: 'd', to: 'e', arrangement: 'series', resistanceOhm: 0.01 },
      {
        id: '5',
        kind: 'transformer',
        from: 'e',
        to: 'f',
        ratedKVA: 100,
        hvV: 400,
        lvV: 400,
        ukPercent: 4,
        loadLossKW: 1,
        vectorGroup: 'YNyn0',
      },
      { id: 'lamp', kind: 'load', bus: 'f', kW: 3, powerFactor: 1, connection: 'L3' },
    ]);
    expect(solved(study).warnings).toEqual([]);
    expect(volts(solved(study), 'f', 1, 2)).toBeGreaterThan(200);
  });
});
