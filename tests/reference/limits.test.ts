import { describe, expect, it } from 'vitest';
import {
  currentLimits,
  limitChoices,
  limitSet,
  limitSets,
  thdLimit,
  voltageLimit,
} from '../../src/checks/index.ts';

const set = (id: string) => {
  const found = limitSet(id);
  if (!found) throw new Error(`no limit set ${id}`);
  return found;
};
const percent = (id: string, h: number, nominalV: number) =>
  voltageLimit(set(id), h, nominalV)?.value ?? null;

describe('voltage limits as their documents state them', () => {
  // IEC 61000-2-2 and -2-12, compatibility levels, Table 1. From memory.
  it.each([
    [5, 6],
    [7, 5],
    [11, 3.5],
    [13, 3],
    [17, 2],
    [25, (2.27 * 17) / 25 - 0.27],
    [49, (2.27 * 17) / 49 - 0.27],
    [3, 5],
    [9, 1.5],
    [15, 0.4],
    [21, 0.3],
    [27, 0.2],
    [45, 0.2],
    [2, 2],
    [4, 1],
    [6, 0.5],
    [8, 0.5],
    [10, 0.5],
    [50, 0.3],
  ])('IEC 61000-2-2 and -2-12 allow order %i with %f per cent', (h, limit) => {
    expect(percent('iec-61000-2-2', h, 400)).toBeCloseTo(limit, 12);
    expect(percent('iec-61000-2-12', h, 20_000)).toBeCloseTo(limit, 12);
  });

  // IEC 61000-2-4:2002, classes 1, 2, 3. From memory.
  it.each([
    [5, [3, 6, 8]],
    [7, [3, 5, 7]],
    [11, [3, 3.5, 5]],
    [13, [3, 3, 4.5]],
    [17, [2, 2, 4]],
    [19, [(2.27 * 17) / 19 - 0.27, (2.27 * 17) / 19 - 0.27, (4.5 * 17) / 19 - 0.5]],
    [3, [3, 5, 6]],
    [9, [1.5, 1.5, 2.5]],
    [15, [0.3, 0.4, 2]],
    [21, [0.2, 0.3, 1.75]],
    [33, [0.2, 0.2, 1]],
    [2, [2, 2, 3]],
    [4, [1, 1, 1.5]],
    [10, [0.5, 0.5, 1]],
    [20, [0.375, 0.375, 1]],
  ])('IEC 61000-2-4 classes 1 to 3 at order %i', (h, limits) => {
    limits.forEach((limit, index) => {
      expect(percent(`iec-61000-2-4-class-${index + 1}`, h, 400)).toBeCloseTo(limit, 12);
    });
  });

  it('IEC 61000-2-4 classes carry THD 5, 8 and 10 % (from memory)', () => {
    expect([1, 2, 3].map((n) => thdLimit(set(`iec-61000-2-4-class-${n}`), 400)?.value)).toEqual([5, 8, 10]);
  });

  // EN 50160, harmonic table. Second-hand: several instrument manuals quote it and agree.
  it.each([
    [3, 5],
    [5, 6],
    [7, 5],
    [9, 1.5],
    [11, 3.5],
    [13, 3],
    [15, 0.5],
    [17, 2],
    [19, 1.5],
    [21, 0.5],
    [23, 1.5],
    [25, 1.5],
    [2, 2],
    [4, 1],
    [6, 0.5],
    [24, 0.5],
  ])('EN 50160 allows order %i with %f per cent', (h, limit) => {
    expect(percent('en-50160', h, 400)).toBe(limit);
    expect(percent('en-50160', h, 20_000)).toBe(limit);
    expect(voltageLimit(set('en-50160'), h, 400)?.source.provenance).toBe('second-hand');
  });

  it('EN 50160 states no limit above the 25th and counts THD to the 40th', () => {
    expect(percent('en-50160', 29, 400)).toBeNull();
    expect(percent('en-50160', 27, 400)).toBeNull();
    expect(thdLimit(set('en-50160'), 400)).toMatchObject({ value: 8, toOrder: 40 });
  });

  // IEC TR 61000-3-6:2008, planning levels MV and HV-EHV. From memory.
  it.each([
    [5, 5, 2],
    [7, 4, 2],
    [11, 3, 1.5],
    [13, 2.5, 1.5],
    [17, 1.7, 1.2],
    [3, 4, 2],
    [9, 1.2, 1],
    [2, 1.8, 1.4],
    [6, 0.5, 0.4],
    [10, 0.47, 0.35],
  ])('IEC TR 61000-3-6 plans order %i with %f per cent at MV and %f per cent at HV', (h, mv, hv) => {
    expect(percent('iec-61000-3-6', h, 20_000)).toBeCloseTo(mv, 12);
    expect(percent('iec-61000-3-6', h, 110_000)).toBeCloseTo(hv, 12);
  });

  // IEEE 519 Table 1: the row up to 1 kV second-hand, the others from memory.
  it.each([
    [480, 5, 8, 'second-hand'],
    [12_470, 3, 5, 'memory'],
    [138_000, 1.5, 2.5, 'memory'],
    [230_000, 1, 1.5, 'memory'],
  ])('IEEE 519 at %i V: each order %f per cent, THD %f per cent', (nominalV, order, thd, provenance) => {
    for (const year of [2014, 2022]) {
      const limit = voltageLimit(set(`ieee-519-${year}`), 7, nominalV);
      expect(limit).toMatchObject({ value: order, source: { document: 'IEEE 519', provenance } });
      expect(thdLimit(set(`ieee-519-${year}`), nominalV)?.value).toBe(thd);
    }
  });

  it('is silent where the document does not reach: low-voltage levels at 20 kV, planning levels at 400 V', () => {
    expect(percent('iec-61000-2-2', 5, 20_000)).toBeNull();
    expect(percent('iec-61000-3-6', 5, 400)).toBeNull();
    expect(thdLimit(set('ansi-c84.1'), 480)).toBeNull();
  });

  it('refuses an order that is not an integer of at least 2', () => {
    expect(() => voltageLimit(set('en-50160'), 1, 400)).toThrow(RangeError);
    expect(() => voltageLimit(set('en-50160'), 5.5, 400)).toThrow(/5.5/);
  });
});

describe('current limits of IEEE 519', () => {
  // Table 2 (120 V to 69 kV): numbers second-hand from the 1992 table, said to be unchanged.
  it.each([
    [10, [4, 2, 1.5, 0.6, 0.3], 5],
    [20, [7, 3.5, 2.5, 1, 0.5], 8],
    [49.9, [7, 3.5, 2.5, 1, 0.5], 8],
    [50, [10, 4.5, 4, 1.5, 0.7], 12],
    [100, [12, 5.5, 5, 2, 1], 15],
    [1000, [15, 7, 6, 2.5, 1.4], 20],
  ])('Table 2 at Isc/I_L = %f', (ratio, byBand, tdd) => {
    const limits = currentLimits(set('ieee-519-2014'), 12_470, ratio);
    expect([5, 11, 17, 23, 35].map((h) => limits?.order(h)?.value)).toEqual(byBand);
    expect(limits?.tdd.value).toBe(tdd);
  });

  it('holds half of Table 2 between 69 and 161 kV (from memory)', () => {
    expect(currentLimits(set('ieee-519-2022'), 138_000, 60)?.order(5)?.value).toBe(5);
    expect(currentLimits(set('ieee-519-2022'), 138_000, 60)?.tdd.value).toBe(6);
  });

  it('above 161 kV has its own spans of Isc/I_L (Table 4, from memory)', () => {
    expect(currentLimits(set('ieee-519-2022'), 230_000, 24)?.tdd.value).toBe(1.5);
    expect(currentLimits(set('ieee-519-2022'), 230_000, 25)?.tdd.value).toBe(2.5);
    expect(currentLimits(set('ieee-519-2022'), 230_000, 50)?.order(13)?.value).toBe(1.5);
  });

  // Even orders, second-hand: 2014 a quarter of the odd limit; 2022 half up to the 6th, the whole above.
  it('judges even orders at a quarter in 2014; at half up to the 6th and in full above in 2022', () => {
    const at = (year: number, h: number) => currentLimits(set(`ieee-519-${year}`), 480, 10)?.order(h)?.value;
    expect([at(2014, 2), at(2014, 6), at(2014, 8), at(2014, 12)]).toEqual([1, 1, 1, 0.5]);
    expect([at(2022, 2), at(2022, 6), at(2022, 8), at(2022, 12)]).toEqual([2, 2, 4, 2]);
  });

  it('says nothing above the 50th', () => {
    expect(currentLimits(set('ieee-519-2022'), 480, 10)?.order(51)).toBeNull();
  });
});

describe('the list of limit sets', () => {
  it('ships every document once, with unique ids', () => {
    const ids = limitSets.map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    expect(ids).toEqual(
      expect.arrayContaining([
        'iec-61000-2-2',
        'iec-61000-2-4-class-1',
        'iec-61000-2-4-class-2',
        'iec-61000-2-4-class-3',
        'iec-61000-2-12',
        'iec-61000-3-6',
        'en-50160',
        'ieee-519-2014',
        'ieee-519-2022',
        'ansi-c84.1',
        'iec-60831-1',
        'iec-60871-1',
        'ieee-18',
      ]),
    );
  });

  it('is plain data: a copy through JSON is equal', () => {
    expect(JSON.parse(JSON.stringify(limitSets))).toEqual(limitSets);
  });

  it('offers each choice only sets that can serve it', () => {
    expect(limitChoices('current').map(({ id }) => id)).toEqual(['ieee-519-2014', 'ieee-519-2022']);
    expect(limitChoices('capacitor').map(({ id }) => id)).toEqual(['iec-60831-1', 'iec-60871-1', 'ieee-18']);
    expect(limitChoices('pcc').map(({ id }) => id)).not.toContain('ieee-18');
  });

  it('never claims to have read a standard: no value is marked published', () => {
    expect(JSON.stringify(limitSets)).not.toContain('"published"');
  });
});
