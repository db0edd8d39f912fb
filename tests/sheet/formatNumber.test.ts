import { describe, expect, it } from 'vitest';
import { entered, fixed, signed, significant } from '../../src/sheet/document/formatNumber.ts';

describe('numbers on the sheet', () => {
  it('keep their significant digits at every size', () => {
    expect([0.012345, 0.9996, 9.996, 99.96, 999.6, 12345].map((value) => significant(value, 3))).toEqual([
      '0.0123',
      '1.00',
      '10.0',
      '100',
      '1000',
      '12\u202f345',
    ]);
  });

  it('print rounding noise of a solution as nothing', () => {
    expect(significant(3e-13, 4)).toBe('0');
    expect(fixed(-0.001, 2)).toBe('0.00');
  });

  it('carry a true minus and a sign on margins', () => {
    expect(significant(-12.5, 3)).toBe('−12.5');
    expect(signed(0.154, 2)).toBe('+0.15');
    expect(signed(-0.154, 2)).toBe('−0.15');
  });

  it('show data as they were entered', () => {
    expect([0.0902, 11_000, 100, -2.5].map(entered)).toEqual(['0.0902', '11\u202f000', '100', '−2.5']);
  });

  it('refuse what is no number', () => {
    expect(() => fixed(Number.NaN, 2)).toThrow(RangeError);
    expect(() => significant(Number.POSITIVE_INFINITY)).toThrow(RangeError);
  });
});
