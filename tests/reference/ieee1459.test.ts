import { describe, expect, it } from 'vitest';
import { busReading, type CaseSolution, terminalReading } from '../../src/engine/index.ts';
import type { Load, StudyElement } from '../../src/study/index.ts';
import { printed, solved, stiffSupply, studyOf, terminalOf } from '../engine/study.ts';

/**
 * IEEE 1459-2010 (formulas from memory). The single-phase example's inputs and component results are
 * recalled from the standard's annex; what follows from them is computed. The three-phase vectors are
 * computed, with an independent check in sequence components.
 */
type Polar = readonly [number, number];
type Orders = Readonly<Record<number, readonly [Polar, Polar, Polar]>>;

/** A solved case of one busbar and one terminal with the given phasors, rms and degrees. */
function measured(maxOrder: number, fourWire: boolean, voltage: Orders, current: Orders): CaseSolution {
  const fill = (orders: Orders): { re: Float64Array; im: Float64Array } => {
    const array = { re: new Float64Array(3 * maxOrder), im: new Float64Array(3 * maxOrder) };
    for (const [h, phases] of Object.entries(orders))
      phases.forEach(([size, degrees]: Polar, k: number) => {
        const at = (Number(h) - 1) * 3 + k;
        array.re[at] = size * Math.cos((degrees * Math.PI) / 180);
        array.im[at] = size * Math.sin((degrees * Math.PI) / 180);
      });
    return array;
  };
  const [v, i] = [fill(voltage), fill(current)];
  const lineVoltage = v.re.map((_, at) => {
    const other = at % 3 === 2 ? at - 2 : at + 1;
    return Math.hypot((v.re[at] ?? 0) - (v.re[other] ?? 0), (v.im[at] ?? 0) - (v.im[other] ?? 0));
  });
  const sum = (x: Float64Array, h: number): number =>
    (x[3 * h] ?? 0) + (x[3 * h + 1] ?? 0) + (x[3 * h + 2] ?? 0);
  const neutralCurrent = Float64Array.from({ length: maxOrder }, (_, h) =>
    Math.hypot(sum(i.re, h), sum(i.im, h)),
  );
  const none = new Float64Array(0);
  return {
    caseId: 'measured',
    frequencyHz: 60,
    maxOrder,
    summation: 'phasor',
    converged: true,
    iterations: 0,
    buses: ['b'],
    terminals: [{ element: 'e', bus: 'b', fourWire }],
    deenergised: [],
    voltage: v,
    current: i,
    lineVoltage,
    neutralCurrent,
    judged: { voltage: none, lineVoltage: none, current: none, neutralCurrent: none, anglesUnknown: [] },
    warnings: [],
  };
}

/** The same phasor in all three phases, or as a positive- or negative-sequence set. */
function set(
  size: number,
  degrees: number,
  sequence: 'zero' | 'positive' | 'negative',
): [Polar, Polar, Polar] {
  const turn = { zero: 0, positive: -120, negative: 120 }[sequence];
  return [
    [size, degrees],
    [size, degrees + turn],
    [size, degrees + 2 * turn],
  ];
}

describe('IEEE 1459 single-phase example, each phase of a three-phase set', () => {
  const sequenceOf = (h: number): 'zero' | 'positive' | 'negative' =>
    h % 3 === 0 ? 'zero' : h % 3 === 1 ? 'positive' : 'negative';
  const orders = (rows: readonly (readonly [number, number, number])[]): Orders =>
    Object.fromEntries(rows.map(([h, size, degrees]) => [h, set(size, degrees, sequenceOf(h))]));
  const solution = measured(
    7,
    true,
    orders([
      [1, 100, 0],
      [3, 8, -70],
      [5, 15, 140],
      [7, 5, 20],
    ]),
    orders([
      [1, 100, -30],
      [3, 20, -165],
      [5, 15, 233],
      [7, 10, 288],
    ]),
  );
  const reading = terminalReading(solution, 0);
  const bus = busReading(solution, 0);

  it('has P1 8660.25 W, Q1 5000 var and PF1 0.86603', () => {
    expect((reading.kW * 1e3) / 3).toBeCloseTo(8660.254, 3);
    expect((reading.kvar * 1e3) / 3).toBeCloseTo(5000, 6);
    expect(reading.displacementPF).toBeCloseTo(0.86603, 5);
  });

  it('has V 101.5579 V and I 103.5616 A, S 10 517.493 VA, THD 17.7200 and 26.9258 %', () => {
    expect(bus.rmsV[0]).toBeCloseTo(101.5579, 4);
    expect(reading.rmsA[0]).toBeCloseTo(103.5616, 4);
    expect(bus.rmsV[1] * reading.rmsA[1]).toBeCloseTo(10517.493, 3);
    expect(bus.thdPercent[2]).toBeCloseTo(17.72004514666935, 9);
    expect(reading.thdPercent[0]).toBeCloseTo(26.925824035672488, 9);
  });

  it('has P 8632.789 W over all orders, so PF 0.82080 on S', () => {
    const watts = ((reading.truePF ?? 0) * reading.kVA * 1e3) / 3;
    expect(watts).toBeCloseTo(8632.789, 3);
    expect(watts / (bus.rmsV[0] * reading.rmsA[0])).toBeCloseTo(0.8208, 5);
  });
});

describe('IEEE 1459 three-phase vectors, four-wire', () => {
  const v1: [Polar, Polar, Polar] = [
    [231, 0],
    [220, -121],
    [238, 119],
  ];
  const i1: [Polar, Polar, Polar] = [
    [100, -30],
    [60, -160],
    [80, 100],
  ];

  it('gives Se 56 743.60 VA, PFe 0.850601 and PF⁺ 0.878827 without harmonics', () => {
    const reading = terminalReading(measured(1, true, { 1: v1 }, { 1: i1 }), 0);
    expect(printed(reading.kVA, 7)).toBe(56.7436);
    expect(reading.kW).toBeCloseTo(48.26619, 5);
    expect(reading.kvar).toBeCloseTo(26.05585, 5);
    expect(reading.neutralRmsA).toBeCloseTo(18.3009, 4);
    expect(reading.truePF).toBeCloseTo(0.850601, 6);
    expect(reading.displacementPF).toBeCloseTo(0.878827, 6);
  });

  it('gives Se 71 608.49 VA, P 47 734.39 W and PF 0.666602 with 3rd and 5th harmonics', () => {
    const solution = measured(
      5,
      true,
      { 1: v1, 5: set(9, 40, 'negative') },
      { 1: i1, 5: set(20, -150, 'negative'), 3: set(30, -60, 'zero') },
    );
    const reading = terminalReading(solution, 0);
    expect(printed(reading.kVA, 7)).toBe(71.60849);
    expect((reading.truePF ?? 0) * reading.kVA).toBeCloseTo(47.73439, 5);
    expect(reading.truePF).toBeCloseTo(0.666602, 6);
  });
});

describe('power factor of a single resistor (closed form)', () => {
  const resistor = (connection: Load['connection']): StudyElement => ({
    id: 'r',
    kind: 'load',
    bus: 'b',
    kW: 1,
    powerFactor: 1,
    model: 'impedance',
    connection: connection ?? 'L1L2L3',
  });
  const reading = (connection: Load['connection']): ReturnType<typeof terminalReading> => {
    const solution = solved(studyOf([{ id: 'b', nominalV: 400 }], [stiffSupply('b'), resistor(connection)]));
    return terminalReading(solution, terminalOf(solution, 'r'));
  };

  it('is 1/√2 between two lines of a three-wire supply', () => {
    expect(reading('L1L2').truePF).toBeCloseTo(Math.SQRT1_2, 6);
  });

  it('is 1/√6 from one line to neutral of a four-wire supply', () => {
    expect(reading('L3').truePF).toBeCloseTo(1 / Math.sqrt(6), 6);
  });

  it('is 1 on all three lines', () => {
    expect(reading('L1L2L3').truePF).toBeCloseTo(1, 9);
  });
});
