import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { figure, margin, ordinal, verdictWord } from '../../src/checks/index.ts';

describe('margin = (limit − value)/(limit − reference)', () => {
  it('a one-sided limit takes reference 0', () => {
    expect(margin(4, 8)).toBeCloseTo(0.5, 12);
    expect(margin(8, 8)).toBe(0);
    expect(margin(10, 8)).toBeCloseTo(-0.25, 12);
  });

  it('a voltage band is measured from nominal at both ends', () => {
    expect(margin(105, 110, 100, 'upper')).toBeCloseTo(0.5, 12);
    expect(margin(95, 90, 100, 'lower')).toBeCloseTo(0.5, 12);
    expect(margin(88, 90, 100, 'lower')).toBeCloseTo(-0.2, 12);
  });

  it('a power factor is measured from 1.0', () => {
    expect(margin(0.97, 0.95, 1, 'lower')).toBeCloseTo(0.4, 12);
    expect(margin(0.9, 0.95, 1, 'lower')).toBeCloseTo(-1, 12);
  });

  it('a lower one-sided limit turns the sign', () => {
    expect(margin(0.3, 0.15, 0, 'lower')).toBeCloseTo(1, 12);
    expect(margin(0.03, 0.15, 0, 'lower')).toBeCloseTo(-0.8, 12);
  });

  it('a limit equal to its reference is refused', () => {
    expect(() => margin(1, 1, 1)).toThrow(RangeError);
  });
});

describe('the word of a margin', () => {
  it('fails below 0, watches below 0.10, passes from there', () => {
    expect([-0.01, 0, 0.0999, 0.1].map((value) => verdictWord(value))).toEqual([
      'fail',
      'watch',
      'watch',
      'pass',
    ]);
  });

  it('a screening rule never fails', () => {
    expect([-5, -0.01, 0, 0.05, 1].map((value) => verdictWord(value, true))).toEqual([
      'watch',
      'watch',
      'pass',
      'pass',
      'pass',
    ]);
  });
});

describe('numbers in the working', () => {
  it('show four significant digits without exponent', () => {
    expect([541.2659, 17391.3, 0.035461, 1, 0, -2.5, 1e-7].map((value) => figure(value))).toEqual([
      '541.3',
      '17391',
      '0.03546',
      '1',
      '0',
      '−2.5',
      '0.0000001',
    ]);
  });

  it('stay within half a unit of the last digit shown', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (value) => {
        const text = figure(value);
        expect(text).toMatch(/^\d+(\.\d+)?$/);
        expect(Math.abs(Number(text) - value)).toBeLessThanOrEqual(
          Math.max(5.0001e-4 * value, value >= 1000 ? 0.5 : 0),
        );
        expect(text.replace('.', '').replace(/^0+/, '').length).toBeLessThanOrEqual(7);
      }),
      { seed: 4711 },
    );
  });

  it('refuse what is not finite', () => {
    expect(() => figure(Number.NaN)).toThrow(RangeError);
  });

  it('name orders as the trade speaks of them', () => {
    expect([2, 3, 5, 11, 12, 13, 21, 22, 23].map(ordinal)).toEqual([
      '2nd',
      '3rd',
      '5th',
      '11th',
      '12th',
      '13th',
      '21st',
      '22nd',
      '23rd',
    ]);
  });
});
