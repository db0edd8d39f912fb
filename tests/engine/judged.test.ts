import { describe, expect, it } from 'vitest';
import type { HarmonicRow, Study, StudyElement } from '../../src/study/index.ts';
import { amps, solved, studyOf, volts } from './study.ts';

/** Two drives and a supply with distortion, whose angles are known or not. */
function site(
  rows: { one: HarmonicRow; two: HarmonicRow; grid: HarmonicRow },
  more: Partial<Study> = {},
): Study {
  const drive = (id: string, row: HarmonicRow): StudyElement => ({
    id,
    kind: 'converter',
    bus: 'lv',
    kW: 50,
    powerFactor: 0.95,
    spectrum: [row],
  });
  return studyOf(
    [{ id: 'lv', nominalV: 400 }],
    [
      { id: 'grid', kind: 'supply', bus: 'lv', shortCircuitMVA: 20, xOverR: 5, background: [rows.grid] },
      drive('one', rows.one),
      drive('two', rows.two),
    ],
    more,
  );
}

const known = { h: 5, percent: 30, angleDeg: 180 };
const against = { h: 5, percent: 30, angleDeg: 0 };
const unknown = { h: 5, percent: 30 };
const quiet = { h: 5, percent: 0, angleDeg: 0 };
const background = { h: 5, percent: 2 };
const at5 = 4 * 3;

describe('magnitudes the checks judge', () => {
  it('are the solution’s where every angle is known: two opposed drives cancel', () => {
    const solution = solved(site({ one: known, two: against, grid: quiet }));
    expect(solution.judged.anglesUnknown[4]).toBe(false);
    expect(solution.judged.voltage[at5]).toBeCloseTo(volts(solution, 'lv', 5), 12);
    expect(volts(solution, 'lv', 5)).toBeLessThan(1e-9);
  });

  it('add the groups’ magnitudes where one drive’s angle is unknown, each solved by itself', () => {
    const both = solved(site({ one: known, two: unknown, grid: quiet }));
    const one = solved(site({ one: known, two: quiet, grid: quiet }));
    const two = solved(site({ one: quiet, two: unknown, grid: quiet }));
    expect(both.judged.anglesUnknown[4]).toBe(true);
    expect(both.judged.voltage[at5]).toBeCloseTo(volts(one, 'lv', 5) + volts(two, 'lv', 5), 9);
    const grid = both.terminals.findIndex(({ element }) => element === 'grid');
    expect(both.judged.current[(grid * both.maxOrder + 4) * 3]).toBeCloseTo(
      amps(one, 'grid', 5) + amps(two, 'grid', 5),
      9,
    );
    expect(both.judged.lineVoltage[at5]).toBeCloseTo(Math.sqrt(3) * (both.judged.voltage[at5] ?? 0), 9);
  });

  it('leave the solution itself as if absent angles were 0', () => {
    const absent = solved(site({ one: known, two: unknown, grid: quiet }));
    const zero = solved(site({ one: known, two: against, grid: quiet }));
    expect(volts(absent, 'lv', 5)).toBeCloseTo(volts(zero, 'lv', 5), 9);
  });

  it('take the background as a group of its own, and a single group as it stands', () => {
    const mixed = solved(site({ one: known, two: quiet, grid: background }));
    const alone = solved(site({ one: quiet, two: quiet, grid: background }));
    expect(mixed.judged.anglesUnknown[4]).toBe(true);
    expect(alone.judged.anglesUnknown[4]).toBe(false);
    expect(alone.judged.voltage[at5]).toBeCloseTo(volts(alone, 'lv', 5), 12);
    const drive = solved(site({ one: known, two: quiet, grid: quiet }));
    expect(mixed.judged.voltage[at5]).toBeCloseTo(volts(alone, 'lv', 5) + volts(drive, 'lv', 5), 9);
  });

  it('are the solution’s under the summation law, source by source with α of IEC 61000-3-6 (from memory)', () => {
    const alpha = { summation: 'alpha' } as const;
    const both = solved(site({ one: known, two: against, grid: background }, alpha));
    const parts = [
      solved(site({ one: known, two: quiet, grid: quiet })),
      solved(site({ one: quiet, two: against, grid: quiet })),
      solved(site({ one: quiet, two: quiet, grid: background })),
    ];
    const law = parts.reduce((sum, part) => sum + volts(part, 'lv', 5) ** 1.4, 0) ** (1 / 1.4);
    expect(both.voltage.re[at5]).toBeCloseTo(law, 9);
    expect(both.voltage.im[at5]).toBe(0);
    expect(both.judged.voltage[at5]).toBe(both.voltage.re[at5]);
    expect(both.judged.anglesUnknown[4]).toBe(false);
  });

  it.each([
    [3, 1],
    [7, 1.4],
    [11, 2],
  ] as const)('use the exponent of order %i: %d', (h, exponent) => {
    const row = (angleDeg: number): HarmonicRow => ({ h, percent: 10, angleDeg });
    const off = { h, percent: 0 };
    const wired = (study: Study): Study => ({
      ...study,
      elements: study.elements.map((e) => (e.kind === 'converter' ? { ...e, wires: 4 } : e)),
    });
    const both = solved(wired(site({ one: row(0), two: row(90), grid: off }, { summation: 'alpha' })));
    const single = solved(wired(site({ one: row(0), two: off, grid: off })));
    expect(both.voltage.re[(h - 1) * 3]).toBeCloseTo(volts(single, 'lv', h) * 2 ** (1 / exponent), 9);
  });
});
