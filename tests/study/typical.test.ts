import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Study } from '../../src/study/index.ts';
import {
  builtInSpectrum,
  cableSizes,
  checkStudy,
  converterTypes,
  filteredOrders,
  generatorReactances,
  networkBuilds,
  originOf,
  setTypical,
  stepSizes,
  type Typical,
  typicalBank,
  typicalCable,
  typicalConverter,
  typicalFilter,
  typicalGenerator,
  typicalMotor,
  typicalSteps,
  typicalSupply,
  typicalTransformer,
  typicalValues,
  usualSplits,
} from '../../src/study/index.ts';

function valuesOf<Values extends object>(typical: Typical<Values>): Values {
  if (!typical.ok) throw new Error(typical.error);
  return typical.values;
}

function errorOf(typical: Typical<object>): string {
  if (typical.ok) throw new Error('a value was given where none is known');
  return typical.error;
}

describe('Typical transformers', () => {
  it.each([
    // Regulation (EU) 548/2014, Annex I, Table I.1 (liquid) and I.2 (dry): kVA, tier, filling, P_k, P_0 in W.
    [1000, 2, 'liquid', 7600, 693],
    [630, 2, 'liquid', 4600, 540],
    [630, 1, 'liquid', 6500, 600],
    [3150, 1, 'liquid', 27_500, 2200],
    [25, 2, 'liquid', 600, 63],
    [1000, 2, 'dry', 9000, 1395],
    [400, 1, 'dry', 5500, 750],
  ] as const)('of %d kVA, tier %d, %s lose what the regulation allows', (kVA, tier, filling, pk, p0) => {
    const values = valuesOf(typicalTransformer(kVA, { tier, filling }));
    expect(1000 * values.loadLossKW).toBeCloseTo(pk, 6);
    expect(1000 * values.noLoadLossKW).toBeCloseTo(p0, 6);
  });

  it('between two ratings lose in proportion (Regulation (EU) 548/2014: linear interpolation)', () => {
    // 750 kVA lies 120/170 of the way from 630 kVA (4600 W) to 800 kVA (6000 W).
    const typical = typicalTransformer(750);
    expect(valuesOf(typical).loadLossKW).toBeCloseTo(4.6 + (1.4 * 120) / 170, 3);
    expect(typical.ok && typical.source).toContain('linear between ratings');
  });

  it.each([
    // IEC 60076-5, Table 1, from memory.
    [630, 4],
    [631, 5],
    [1250, 5],
    [1600, 6],
    [3150, 7],
  ])('of %d kVA have an impedance voltage of %d %%', (kVA, uk) => {
    expect(valuesOf(typicalTransformer(kVA)).ukPercent).toBe(uk);
  });

  it('outside the table are refused with the permitted range', () => {
    expect(errorOf(typicalTransformer(5000))).toMatch(/5.000 kVA.*allowed is 25 to 3.150 kVA/);
    expect(errorOf(typicalTransformer(40, { filling: 'dry' }))).toContain('allowed is 50 to');
    expect(errorOf(typicalTransformer(1000, { hvV: 33_000, lvV: 400 }))).toContain('up to 24 kV');
    expect(errorOf(typicalTransformer(Number.NaN))).toContain('allowed is');
  });

  it('of every rating can stand in a study: R stays below |Z|, G below |Y|', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 25, max: 3150, noNaN: true }),
        fc.constantFrom(1 as const, 2 as const),
        fc.constantFrom('liquid' as const, 'dry' as const),
        (kVA, tier, filling) => {
          const typical = typicalTransformer(kVA, { tier, filling });
          if (!typical.ok) return filling === 'dry' && kVA < 50;
          const { ukPercent, loadLossKW, noLoadLossKW, noLoadCurrentPercent } = typical.values;
          return (
            (100 * loadLossKW) / kVA < ukPercent && (100 * noLoadLossKW) / kVA < noLoadCurrentPercent + 1e-9
          );
        },
      ),
      { seed: 548 },
    );
  });
});

describe('Typical cables', () => {
  it.each([
    // IEC 60228, Table 2, class 2, 20 °C, second-hand.
    [240, 'copper', 0.0754],
    [240, 'aluminium', 0.125],
    [1.5, 'copper', 12.1],
    [630, 'aluminium', 0.0469],
  ] as const)('of %d mm² %s have the resistance of the standard at 20 °C', (mm2, conductor, ohm) => {
    expect(valuesOf(typicalCable(mm2, conductor, 20)).resistanceOhmPerKm).toBeCloseTo(ohm, 6);
  });

  it('are corrected to their operating temperature with 1 + 0.004·(T − 20)', () => {
    expect(valuesOf(typicalCable(240, 'copper', 70)).resistanceOhmPerKm).toBeCloseTo(0.0754 * 1.2, 5);
    expect(valuesOf(typicalCable(150, 'aluminium', 90)).resistanceOhmPerKm).toBeCloseTo(0.206 * 1.28, 4);
  });

  it('have 0.08 Ω/km at 50 Hz and six fifths of it at 60 Hz (common practice, from memory)', () => {
    expect(valuesOf(typicalCable(95, 'copper', 70)).reactanceOhmPerKm).toBe(0.08);
    expect(valuesOf(typicalCable(95, 'copper', 70, { frequencyHz: 60 })).reactanceOhmPerKm).toBe(0.096);
  });

  it('lose resistance with every larger cross-section', () => {
    for (const conductor of ['copper', 'aluminium'] as const) {
      const ohms = cableSizes(conductor).map(
        (size) => valuesOf(typicalCable(size, conductor, 20)).resistanceOhmPerKm,
      );
      expect(ohms).toEqual(ohms.toSorted((a, b) => b - a));
    }
  });

  it('never guess what they carry', () => {
    expect(Object.keys(valuesOf(typicalCable(95, 'copper', 70)))).not.toContain('ratedA');
  });

  it('of other sizes or temperatures are refused with what is allowed', () => {
    expect(errorOf(typicalCable(100, 'copper', 70))).toMatch(/allowed is 1\.5, 2\.5.*630 mm²/);
    expect(errorOf(typicalCable(95, 'copper', 300))).toContain('allowed is -20 to 120 °C');
  });
});

describe('Typical motors', () => {
  it.each([
    // Regulation (EU) 2019/1781, Annex I: kW, poles, class, Hz, efficiency in per unit.
    [7.5, 4, 'IE3', 50, 0.904],
    [200, 2, 'IE3', 50, 0.958],
    [0.12, 8, 'IE3', 50, 0.507],
    [75, 4, 'IE4', 50, 0.96],
    [55, 4, 'IE3', 60, 0.954],
  ] as const)(
    'of %d kW, %d poles, %s at %d Hz reach their class',
    (kW, poles, efficiencyClass, frequencyHz, eta) => {
      expect(valuesOf(typicalMotor(kW, { poles, efficiencyClass, frequencyHz })).efficiency).toBeCloseTo(
        eta,
        6,
      );
    },
  );

  it('between two ratings stay within 0.2 point of the regulation’s formula for IE3 at 50 Hz', () => {
    // η = A·x³ + B·x² + C·x + D, x = log10(P): coefficients of 4 poles in Regulation (EU) 2019/1781, formula from memory.
    for (const kW of [0.9, 3.5, 6, 13, 26, 50, 80, 145, 180]) {
      const x = Math.log10(kW);
      const percent = 0.0773 * x ** 3 - 1.8951 * x ** 2 + 9.2984 * x + 83.7025;
      expect(Math.abs(100 * valuesOf(typicalMotor(kW)).efficiency - percent)).toBeLessThan(0.2);
    }
  });

  it('outside the table are refused with the permitted range', () => {
    expect(errorOf(typicalMotor(500))).toMatch(/500 kW.*allowed is 0\.12 to 200 kW/);
    expect(errorOf(typicalMotor(0.5, { efficiencyClass: 'IE4' }))).toContain('allowed is 0.75 to 200 kW');
    expect(errorOf(typicalMotor(55, { efficiencyClass: 'IE4', frequencyHz: 60 }))).toContain('allowed');
  });
});

describe('Typical generators and bank steps', () => {
  it('give the subtransient reactance with its range (IEEE 141, second-hand)', () => {
    const typical = typicalGenerator('salient-12');
    expect(valuesOf(typical).xdSubtransientPercent).toBe(16);
    expect(typical.ok && typical.source).toContain('between 10 and 24 %');
    for (const { low, percent, high } of Object.values(generatorReactances))
      expect(low < percent && percent < high).toBe(true);
  });

  it('make up a bank in equal steps, of a usual size where one fits', () => {
    expect(valuesOf(typicalSteps(300)).steps).toEqual(Array.from({ length: 6 }, () => ({ kvar: 50 })));
    expect(valuesOf(typicalSteps(240)).steps).toHaveLength(6);
    expect(stepSizes).toContain(valuesOf(typicalSteps(180)).steps[0]?.kvar);
    const odd = typicalSteps(137);
    expect(valuesOf(odd).steps.reduce((sum, step) => sum + step.kvar, 0)).toBeCloseTo(137, 9);
    expect(odd.ok && odd.source).toContain('no usual size fits');
    expect(errorOf(typicalSteps(5000))).toContain('allowed is 5 to 960 kvar');
  });
});

describe('Typical capacitors, filters, supplies and converters', () => {
  it.each([
    // U_C = U/(1 − p), 7 % and 400 V: 430 V; with the supply at +10 % 473 V, the next usual rating 480 V (common practice).
    [400, 0, 440],
    [400, 5.67, 480],
    [400, 7, 480],
    [400, 14, 525],
    [480, 0, 525],
    [690, 7, 830],
    [230, 0, 260],
    [208, 0, 240],
    [11_000, 0, 12_000],
  ])('at %d V behind p = %d %% the capacitors are rated %d V', (nominalV, p, ratedV) => {
    const typical = typicalBank([{ kvar: 50 }], nominalV, p);
    expect(valuesOf(typical).ratedV).toBe(ratedV);
    expect(valuesOf(typical).detuningPercent).toBe(p);
  });

  it('say what the kvar at the rated voltage give at the busbar: Q·(U/U_N)²/(1 − p)', () => {
    const typical = typicalBank(
      Array.from({ length: 6 }, () => ({ kvar: 50 })),
      400,
      7,
    );
    // 300·(400/480)²/0.93 = 224.0
    expect(typical.ok && typical.source).toMatch(/300.kvar rated at 480.V give 224.kvar at 400.V/);
  });

  it('split a bank into usual steps only where that is asked for', () => {
    const steps = [{ kvar: 300 }];
    expect(valuesOf(typicalBank(steps, 400, 7))).not.toHaveProperty('steps');
    expect(valuesOf(typicalBank(steps, 400, 7, 6)).steps).toEqual(
      Array.from({ length: 6 }, () => ({ kvar: 50 })),
    );
    expect(valuesOf(typicalBank(steps, 400, 7, 7))).not.toHaveProperty('steps');
    expect(usualSplits(300).every(({ count, kvar }) => count * kvar === 300)).toBe(true);
  });

  it('tune a filter below its order, and rate its capacitors for U·n²/(n² − 1)', () => {
    // 4.7 for the 5th (IEEE 1531, from memory); 4.7²/(4.7² − 1) = 1.0474, 1.1·400·1.0474 = 460.9 V, 460 V within 1 %.
    expect(valuesOf(typicalFilter(5, 'single-tuned', 400))).toEqual({
      tunedOrder: 4.7,
      qFactor: 40,
      ratedV: 460,
    });
    for (const order of filteredOrders)
      expect(valuesOf(typicalFilter(order, 'single-tuned', 400)).tunedOrder / order).toBeCloseTo(0.94, 2);
    expect(valuesOf(typicalFilter(5, 'c-type', 400)).ratedV).toBe(440);
  });

  it('never guess a fault level', () => {
    for (const build of ['substation', 'medium', 'transformer', 'feeder'] as const) {
      expect(Object.keys(valuesOf(typicalSupply(build)))).toEqual(['xOverR']);
      const { low, xOverR, high } = networkBuilds[build];
      expect(low < xOverR && xOverR < high).toBe(true);
    }
  });

  it('take a converter’s spectrum from the built-in ones, with its source and what is known of it', () => {
    for (const build of Object.keys(converterTypes) as (keyof typeof converterTypes)[]) {
      const typical = typicalConverter(build);
      if (build === 'active') {
        expect(errorOf(typical)).toContain('measured spectrum');
        continue;
      }
      const { spectrum } = valuesOf(typical);
      expect(builtInSpectrum(spectrum)).toBeDefined();
      expect(typical.ok && typical.origins.spectrum).toEqual({
        origin: 'typical',
        note: builtInSpectrum(spectrum)?.origin,
      });
    }
  });

  it('never state a typical number without its source', () => {
    const all: Typical<object>[] = [
      typicalTransformer(1000),
      typicalCable(95, 'copper', 70),
      typicalMotor(55),
      typicalGenerator('salient-12'),
      typicalSupply('medium'),
      typicalConverter('choke-3'),
      typicalBank([{ kvar: 300 }], 400, 7, 6),
      typicalFilter(7, 'high-pass', 690),
    ];
    for (const typical of all) {
      const keys = Object.keys(valuesOf(typical)).filter((key) => key !== 'wires');
      expect(typical.ok && Object.keys(typical.origins).toSorted()).toEqual(keys.toSorted());
    }
  });
});

describe('Setting typical values', () => {
  const study: Study = {
    format: 'varwright-study',
    version: 1,
    title: 'One transformer',
    frequencyHz: 50,
    buses: [
      { id: 'hv', nominalV: 20_000 },
      { id: 'lv', nominalV: 400 },
    ],
    elements: [
      { id: 's', kind: 'supply', bus: 'hv', shortCircuitMVA: 250, xOverR: 10 },
      {
        id: 't1',
        name: 'T1',
        kind: 'transformer',
        from: 'hv',
        to: 'lv',
        ...typicalValues('transformer', { nominalV: 20_000, frequencyHz: 50 }),
      },
    ],
    origins: { 'elements.t1.loadLossKW': { origin: 'nameplate' } },
  };

  it('is one labelled edit that marks each value typical with its source', () => {
    const typical = typicalTransformer(1000, { filling: 'dry' });
    if (!typical.ok) throw new Error(typical.error);
    const edit = setTypical(study, 't1', typical);
    expect(edit.words).toBe('set typical values of transformer T1');
    const after = edit.apply(study);
    const t1 = after.elements[1];
    expect(t1).toMatchObject({ ukPercent: 5, loadLossKW: 9, noLoadLossKW: 1.395 });
    for (const field of ['ukPercent', 'loadLossKW', 'noLoadLossKW', 'noLoadCurrentPercent'])
      expect(t1 && originOf(after, t1, field)?.origin).toBe('typical');
    expect(t1 && originOf(after, t1, 'loadLossKW')?.note).toContain('Regulation (EU) 548/2014');
    expect(checkStudy(after).findings.filter(({ severity }) => severity === 'error')).toEqual([]);
  });

  it('leaves other parts and their marks alone, and a part that is gone', () => {
    const typical = typicalTransformer(1000);
    if (!typical.ok) throw new Error(typical.error);
    const edit = setTypical(study, 't1', typical);
    expect(edit.apply(study).elements[0]).toBe(study.elements[0]);
    const without = { ...study, elements: study.elements.slice(0, 1) };
    expect(edit.apply(without)).toBe(without);
  });
});
