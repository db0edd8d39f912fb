import { describe, expect, it } from 'vitest';
import { unitVoltages } from '../../src/checks/unitVoltages.ts';
import type { Bank, Study } from '../../src/study/index.ts';
import { one, site, verdictsOf } from './site.ts';

const common = { volts: 400, reactorOhm: 0, capacitorOhm: 1 };
const phase = 400 / Math.sqrt(3);

describe('voltages of a bank with units missing', () => {
  it.each([2, 3, 5, 10])('rise to 3n/(3n − 1) in an isolated star that lost one of %i units', (n) => {
    // Group of P parallel units, one series group, ungrounded star: 3P/(3P − 1), IEEE C37.99 (from memory).
    const [hit, second, third] = unitVoltages({ ...common, connection: 'star', shares: [(n - 1) / n, 1, 1] });
    expect(hit / phase).toBeCloseTo((3 * n) / (3 * n - 1), 9);
    expect(second).toBeCloseTo(third, 9);
    expect(second).toBeLessThan(phase);
  });

  it('are half the line voltage where a whole phase of an isolated star is out', () => {
    const [out, second, third] = unitVoltages({ ...common, connection: 'star', shares: [0, 1, 1] });
    expect(out).toBe(0);
    expect(second).toBeCloseTo(200, 9);
    expect(third).toBeCloseTo(200, 9);
  });

  it('stay what they were in an earthed star and in a plain delta', () => {
    for (const [connection, volts] of [
      ['star-earthed', phase],
      ['delta', 400],
    ] as const) {
      const across = unitVoltages({ ...common, connection, shares: [0.5, 1, 1] });
      for (const v of across) expect(v).toBeCloseTo(volts, 9);
    }
  });

  it('behind chokes are U/(1 − p) while the bank is whole, star and delta alike', () => {
    for (const connection of ['delta', 'star'] as const) {
      const across = unitVoltages({ ...common, connection, reactorOhm: 0.07, shares: [1, 1, 1] });
      const ratio = connection === 'delta' ? 400 : phase;
      for (const v of across) expect(v / ratio).toBeCloseTo(1 / 0.93, 9);
    }
  });
});

const bank = (more: Partial<Bank>): Study => site({ bank: { ratedV: 400, detuningPercent: 0, ...more } });

describe('one unit out', () => {
  it('fails in an isolated star of two units at their own voltage, passes in one of many at a higher', () => {
    const weak = one(verdictsOf(bank({ connection: 'star', unitsPerPhase: 2 })), 'lost-unit', 'C');
    expect(weak.verdict).toBe('fail');
    expect(weak.value).toBeGreaterThan(1.1);
    expect(weak.working[0]?.numbers).toMatch(/V whole/);
    const strong = one(
      verdictsOf(bank({ connection: 'star', unitsPerPhase: 12, ratedV: 480 })),
      'lost-unit',
      'C',
    );
    expect(strong.verdict).toBe('pass');
  });

  it('takes one unit for each step on where none is entered, and says so', () => {
    const verdict = one(verdictsOf(bank({ connection: 'star' })), 'lost-unit', 'C');
    expect(verdict.working[0]?.equation).toMatch(/one of 3 units per phase/);
    expect(verdict.remarks.join(' ')).toMatch(/not entered/);
  });

  it('tells the tuning that a detuned bank is left with', () => {
    const verdict = one(verdictsOf(site({ bank: { unitsPerPhase: 4 } })), 'lost-unit', 'C');
    const tuning = verdict.working.find(({ equation }) => equation.startsWith('tuning'));
    // Delta: a line keeps (1 + ¾)/2 of its capacitance, so 3.78 becomes 3.78/√0.875 = 4.04.
    expect(tuning?.numbers).toBe('3.78 → 4.04');
  });
});

describe('air at the capacitors', () => {
  const at = (more: Partial<Bank>) => one(verdictsOf(site({ bank: more })), 'capacitor-temperature', 'C');

  it('fails above the class, is watched within five degrees of it, passes below', () => {
    expect(at({ temperatureClass: 'B', cubicleAirC: 47 }).verdict).toBe('fail');
    expect(at({ temperatureClass: 'D', cubicleAirC: 52 }).verdict).toBe('watch');
    const good = at({ temperatureClass: 'D', cubicleAirC: 45 });
    expect(good.verdict).toBe('pass');
    expect(good.limit).toBe(55);
  });

  it('stays open without class or air, and still tells the losses to ventilate for', () => {
    const open = at({ temperatureClass: 'D' });
    expect(open.verdict).toBe('unknown');
    expect(open.remarks[0]).toMatch(/hottest air in the cubicle/);
    expect(open.working[0]?.numbers).toMatch(/W \+ .* W = .* W/);
  });
});

describe('surge from switching a large bank', () => {
  const works = (mvKvar: number, lv: Partial<Bank> = {}): Study =>
    site({
      bank: { ratedV: 400, detuningPercent: 0, steps: [{ kvar: 60 }], ...lv },
      more: [
        { id: 'M', kind: 'bank', bus: 'HV', ratedV: 20_000, steps: [{ kvar: mvKvar }], connection: 'star' },
      ],
    });
  const rowOf = (study: Study) =>
    verdictsOf(study).find(({ check, subject }) => check === 'magnification' && subject.id === 'C');

  it('is watched where both ring at nearly the same frequency and the large bank is much larger', () => {
    // 250 MVA/1000 kvar rings near 15.8, 1000 kVA of 6 % with 60 kvar near 16.7.
    const row = rowOf(works(1000));
    expect(row?.verdict).toBe('watch');
    expect(row?.value).toBeGreaterThan(0.9);
    expect(row?.screening).toBe(true);
  });

  it('passes where the frequencies lie apart, and is not asked of a detuned bank or a bank not much smaller', () => {
    expect(rowOf(works(6000))?.verdict).toBe('pass');
    expect(rowOf(works(1000, { detuningPercent: 7 }))).toBeUndefined();
    expect(rowOf(works(500, { steps: [{ kvar: 60 }] }))).toMatchObject({ verdict: 'pass', margin: null });
  });
});
