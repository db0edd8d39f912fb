import { describe, expect, it } from 'vitest';
import { backgroundShares } from '../../src/checks/backgroundDuty.ts';
import { stepCurrent } from '../../src/checks/controllerSetting.ts';
import { bankAdmittance } from '../../src/checks/correctionBranch.ts';
import { kvarGiven } from '../../src/checks/deliveredKvar.ts';
import { dischargeLimitOhm, dischargeSeconds } from '../../src/checks/dischargeTime.ts';
import { backToBackPeakA, isolatedPeakA, neededHenry } from '../../src/checks/inrushPeak.ts';
import { harmonicVoltageFactor } from '../../src/checks/motorHvf.ts';
import { pfCeilingOf } from '../../src/checks/pfCeiling.ts';
import { motorCapacitorKvar } from '../../src/checks/selfExcitation.ts';
import { crossingShare, highestTuning } from '../../src/checks/tuningOrder.ts';
import type { Bank } from '../../src/study/index.ts';

// "Computed twice" marks values worked out independently from the closed form.

describe('detuning', () => {
  it.each([
    [0.0567, 210, 252],
    [0.07, 189, 226.8],
    [0.14, 133.6, 160.4],
  ])(
    'p = %f tunes to %f Hz at 50 Hz and %f Hz at 60 Hz (computed twice; 7 %% second-hand)',
    (p, at50, at60) => {
      const n = highestTuning(p, 0, 0, 0);
      expect(50 * n).toBeCloseTo(at50, p === 0.14 ? 1 : 0);
      expect(60 * n).toBeCloseTo(at60, 0);
    },
  );

  it('7 % with C −5/+10 % and L ±5 % lies between 3.52 and 3.98; with L ±3 % between 3.55 and 3.94 (computed twice)', () => {
    expect(highestTuning(0.07, 0.05, 0.05, 0)).toBeCloseTo(3.98, 2);
    expect(highestTuning(0.07, -0.05, -0.1, 0)).toBeCloseTo(3.52, 2);
    expect(highestTuning(0.07, 0.03, 0.05, 0)).toBeCloseTo(3.94, 2);
    expect(highestTuning(0.07, -0.03, -0.1, 0)).toBeCloseTo(3.55, 2);
  });

  it('5.67 % meets the 5th when the capacitance has fallen to 0.705 (computed twice)', () => {
    expect(crossingShare(0.0567, 5)).toBeCloseTo(0.7055, 4);
    expect(highestTuning(0.0567, 0, 0, 1 - crossingShare(0.0567, 5))).toBeCloseTo(5, 10);
  });

  it.each([
    [0.0567, 424],
    [0.07, 430],
    [0.14, 465],
  ])('p = %f puts %f V on a capacitor of a 400 V busbar (computed twice)', (p, volts) => {
    expect(400 / (1 - p)).toBeCloseTo(volts, 0);
    // The capacitor gives Q_N at its own voltage, and 1/(1 − p) of it reaches the busbar.
    expect(kvarGiven(100, 400 / (1 - p), 400, p)).toBeCloseTo(100 * (1 - p), 9);
  });
});

describe('bank current by supply distortion', () => {
  const bus = { id: 'LV', nominalV: 400 };
  const sizeOver1 = (detuningPercent: number): ((h: number) => number) => {
    const bank: Bank = {
      id: 'C',
      kind: 'bank',
      bus: 'LV',
      ratedV: 400,
      steps: [],
      detuningPercent,
      reactorQ: 1e9,
      lossWPerKvar: 0,
    };
    const y = bankAdmittance(bank, bus, 100);
    return (h) => Math.hypot(y(h).re, y(h).im) / Math.hypot(y(1).re, y(1).im);
  };

  it.each([
    [0, 5],
    [5.67, 11.3],
    [7, 6.2],
    [14, 1.7],
  ])('p = %f %% draws I_5/I_1 = %f times u_5 (computed twice)', (p, ratio) => {
    expect(sizeOver1(p)(5)).toBeCloseTo(ratio, p === 0 ? 6 : 1);
  });

  it('the levels as a set are scaled to a THD of 8 %, never raised to it', () => {
    const levels = [
      { h: 5, value: 12 },
      { h: 7, value: 16 },
    ];
    const found = backgroundShares(
      (h) => h,
      levels,
      () => true,
    );
    expect(found.alone).toEqual({ h: 7, ratio: 1.12 });
    expect(found.aloneRms).toBeCloseTo(Math.hypot(1, 1.12), 12);
    expect(found.setRms).toBeCloseTo(Math.hypot(1, 0.4 * 0.6, 0.4 * 1.12), 12);
    const small = backgroundShares(
      (h) => h,
      [{ h: 5, value: 1 }],
      () => true,
    );
    expect(small.setRms).toBeCloseTo(Math.hypot(1, 0.05), 12);
    expect(
      backgroundShares(
        (h) => h,
        levels,
        () => false,
      ).setRms,
    ).toBe(1);
  });
});

describe('inrush (IEC 60831-1 annex, from memory; computed here from the circuit)', () => {
  const xs = 0.4 ** 2 / 15.6253;
  const xc = 400 ** 2 / 50_000;

  it('a 50 kvar step on 15.6253 MVA at 400 V draws 1804.2 A, 25.00 times its rated current', () => {
    const peak = isolatedPeakA(400, xc, xs);
    expect(peak).toBeCloseTo(1804.2, 1);
    expect(peak / 72.1688).toBeCloseTo(25, 2);
    expect(peak / 72.1688).toBeCloseTo(Math.SQRT2 * Math.sqrt(15_625.3 / 50), 4);
  });

  it('a reactor of 7 % holds it to √(2·Xc/(Xs + X_L)) times its rated current', () => {
    expect(isolatedPeakA(400, xc, xs, 0.07 * xc) / 72.1688).toBeCloseTo(
      Math.sqrt((2 * xc) / (xs + 0.07 * xc)),
      4,
    );
  });

  it('the step onto five others over 1.2 µH draws 8583.9 A, 118.9 times its rated current', () => {
    const c = 50_000 / (2 * Math.PI * 50 * 400 ** 2);
    const equivalent = (c * 5 * c) / (6 * c);
    const peak = backToBackPeakA(400, equivalent, 1.2e-6);
    expect(peak).toBeCloseTo(8583.9, 1);
    expect(peak / 72.1688).toBeCloseTo(118.9, 1);
    expect(neededHenry(400, equivalent, peak)).toBeCloseTo(1.2e-6, 15);
  });

  it('refuses a circuit without reactance', () => {
    expect(() => isolatedPeakA(400, xc, 0)).toThrow(RangeError);
    expect(() => backToBackPeakA(400, 0, 1e-6)).toThrow(RangeError);
    expect(() => neededHenry(400, 1e-3, 0)).toThrow(RangeError);
  });
});

describe('discharge (IEC 60831-1 annex, from memory; NEC 460 second-hand)', () => {
  const farad = 50_000 / (3 * 2 * Math.PI * 50 * 400 ** 2);

  it('50 kvar, 400 V, delta: 331.57 µF a unit, 268.67 kΩ for 75 V in 180 s, 74.59 kΩ for 50 V in 60 s', () => {
    expect(farad * 1e6).toBeCloseTo(331.57, 2);
    expect(dischargeLimitOhm(180, farad, 400, 75) / 1000).toBeCloseTo(268.67, 2);
    expect(dischargeLimitOhm(60, farad, 400, 50) / 1000).toBeCloseTo(74.59, 2);
  });

  it('with the first the wait before re-energising at 10 % of U_N is 236 s (computed twice)', () => {
    expect(dischargeSeconds(268_670, farad)).toBeCloseTo(236, 0);
  });

  it('refuses a rated voltage below the residual one', () => {
    expect(() => dischargeLimitOhm(60, farad, 30, 50)).toThrow(RangeError);
    expect(() => dischargeSeconds(0, farad)).toThrow(RangeError);
  });
});

describe('controller, motor and ceiling', () => {
  it('C/k of 60 kvar at 400 V behind 500/5 is 0.866; of a 440 V rating 0.7157 (second-hand)', () => {
    expect(stepCurrent(60, 400, 100)).toBeCloseTo(0.866, 4);
    expect(stepCurrent(60 * (400 / 440) ** 2, 400, 100)).toBeCloseTo(0.7157, 4);
  });

  it('I_0 of 18 A at 400 V allows 11.22 kvar behind the motor switch (IEC 60831-1, from memory)', () => {
    expect(motorCapacitorKvar(400, 18)).toBeCloseTo(11.22, 2);
  });

  it('HVF of 6, 5, 3.5 and 3 % at the 5th, 7th, 11th and 13th is 0.03546 (computed here)', () => {
    const perUnit = new Array<number>(13).fill(0);
    perUnit[4] = 0.06;
    perUnit[6] = 0.05;
    perUnit[10] = 0.035;
    perUnit[12] = 0.03;
    expect(harmonicVoltageFactor(perUnit, true)).toBeCloseTo(0.03546, 5);
    perUnit[1] = 0.02;
    perUnit[2] = 0.05;
    expect(harmonicVoltageFactor(perUnit, true)).toBeCloseTo(0.03546, 5);
    expect(harmonicVoltageFactor(perUnit, false)).toBeCloseTo(Math.hypot(0.035461, 0.02 / Math.SQRT2), 5);
  });

  it('a current THD of 100 % holds the true power factor to 1/√2', () => {
    expect(pfCeilingOf(1)).toBeCloseTo(Math.SQRT1_2, 12);
    expect(pfCeilingOf(0)).toBe(1);
  });
});
