import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  editText,
  elementKinds,
  fieldOf,
  fieldsOf,
  formatNumber,
  formatQuantity,
  hintOf,
  parseQuantity,
  readQuantity,
  type Unit,
  understoodAs,
} from '../../src/study/index.ts';

const read: [string, Unit, number][] = [
  ['0,4 kV', 'V', 400],
  ['400', 'V', 400],
  ['400 V', 'V', 400],
  ['0.4kv', 'V', 400],
  ['12.5 mΩ/km', 'Ω/km', 0.0125],
  ['12.5 mΩ/m', 'Ω/km', 12.5],
  ['0.12 ohm / km', 'Ω/km', 0.12],
  ['20 Ohm', 'Ω', 20],
  ['20 \u2126', 'Ω', 20],
  ['1.25k', 'V', 1250],
  ['1.25k', 'kVA', 1.25],
  ['1.6M', 'kVA', 1600],
  ['1.6 MVA', 'kVA', 1600],
  ['0.4 Mvar', 'kvar', 400],
  ['30 MVAr', 'kvar', 30_000],
  ['630 kva', 'kVA', 630],
  ['2e3', 'V', 2000],
  ['1e-6', 'µF', 1e-6],
  ['1 250,5', 'V', 1250.5],
  ['1\u2009250.5', 'V', 1250.5],
  ["1'250", 'V', 1250],
  ['1,250.5', 'V', 1250.5],
  ['1.250,5', 'V', 1250.5],
  ['1,250,000', 'V', 1_250_000],
  ['1,250', 'V', 1.25],
  ['.5', '%', 0.5],
  ['−5', '%', -5],
  ['- 5 %', '%', -5],
  ['3*55', 'kW', 165],
  ['3 x 50 kvar', 'kvar', 150],
  ['6×25', 'kvar', 150],
  ['(2+3)*25', 'kvar', 125],
  ['(2+3)*25 kvar', 'kvar', 125],
  ['50+25 kvar', 'kvar', 75],
  ['50 kvar + 25', 'kvar', 75],
  ['0.3+0.1 kV', 'V', 400],
  ['0.4 kV + 11 V', 'V', 411],
  ['100 − 2*10', 'kW', 80],
  ['2*3+4', '', 10],
  ['1500/5', '', 300],
  ['6.6 kV/6', 'V', 1100],
  ['400*sqrt(3)', 'V', 400 * Math.sqrt(3)],
  ['400/√3', 'V', 400 / Math.sqrt(3)],
  ['-(2+3)', '%', -5],
  ['30 uF', 'µF', 30],
  ['30 \u03bcF', 'µF', 30],
  ['0.03 mF', 'µF', 30],
  ['0.4m', 'mH', 0.4],
  ['400 µH', 'mH', 0.4],
  ['340 nF/km', 'nF/km', 340],
  ['0.34 µF/km', 'nF/km', 340],
  ['60 m', 'm', 60],
  ['2.2 km', 'm', 2200],
  ['200 ft', 'm', 60.96],
  ['5 min', 's', 300],
  ['8 h', 'h', 8],
  ['95 %', '', 0.95],
  ['0.06 pu', '%', 6],
  ['30 deg', '°', 30],
  ['30°', '°', 30],
  ['1 kHz', 'Hz', 1000],
  ['25 kA', 'A', 25_000],
  ['25', 'kA', 25],
];

describe('A quantity is read as a person types it', () => {
  it.each(read)('%s in a field of %s', (text, unit, value) => {
    const parsed = parseQuantity(text, unit);
    expect(parsed.ok).toBe(true);
    if (parsed.ok) expect(Math.abs(parsed.value - value)).toBeLessThanOrEqual(1e-14 * Math.abs(value));
  });

  it('one mechanical horsepower is 550 ft·lbf/s (0.3048 m and 4.4482216152605 N exactly)', () => {
    const parsed = parseQuantity('75 hp', 'kW');
    expect(parsed.ok && parsed.value).toBeCloseTo((75 * 550 * 0.3048 * 4.4482216152605) / 1000, 11);
  });

  const shown: [string, Unit, string | null][] = [
    ['0,4 kV', 'V', '= 400\u2009V'],
    ['1.6M', 'kVA', '= 1\u2009600\u2009kVA = 1.6\u2009MVA'],
    ['20000', 'V', '= 20\u2009kV'],
    ['1,250', 'V', '= 1.25\u2009V'],
    ['1 250', 'kVA', '= 1\u2009250\u2009kVA = 1.25\u2009MVA'],
    ['3*55', 'kW', '= 165\u2009kW'],
    ['400/1.73', 'V', '= 231.214\u2009V'],
    ['2*(75+15)', 'kW', '= 180\u2009kW'],
    ['0.0125', 'Ω/km', '= 12.5\u2009mΩ/km'],
    ['400', 'V', null],
    ['0.95', '', null],
    ['12 bananas', 'V', null],
    ['', 'V', null],
  ];
  it.each(shown)('%j in a field of %s is shown while it is typed as %j', (text, unit, words) => {
    expect(understoodAs(text, unit)).toBe(words);
  });
});

describe('Where the decimal mark is known', () => {
  const marked: [string, '.' | ',', number | null][] = [
    ['1,250', ',', 1.25],
    ['1,250', '.', 1250],
    ['1.250', ',', 1250],
    ['1.250', '.', 1.25],
    ['0,95', '.', null],
    ['0.95', ',', null],
    ['1.250,5', ',', 1250.5],
    ['1.250,5', '.', null],
    ['1\u202f250,5', ',', 1250.5],
    ["1'250.5", '.', 1250.5],
    ['1,25,000', '.', null],
    [',5', ',', 0.5],
    [',', ',', null],
  ];
  it.each(marked)('%j with %j is %j', (text, decimal, value) => {
    const parsed = parseQuantity(text, 'V', decimal);
    expect(parsed.ok ? parsed.value : null).toBe(value);
  });

  it('a number written with that mark and any thousands reads back, and never as another number', () => {
    const groups = fc.constantFrom('', ' ', '\u00a0', '\u2009', '\u202f', "'", '\u2019', 'other');
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 99_999_999 }),
        fc.integer({ min: 0, max: 999 }),
        fc.constantFrom<'.' | ','>('.', ','),
        groups,
        (whole, thousandths, decimal, group) => {
          const parting = group === 'other' ? (decimal === ',' ? '.' : ',') : group;
          const digits = String(whole).replace(/\B(?=(\d{3})+$)/g, parting);
          const text = `${digits}${decimal}${String(thousandths).padStart(3, '0')}`;
          const parsed = parseQuantity(text, 'kW', decimal);
          expect(parsed.ok && parsed.value, text).toBe(
            Number(`${whole}.${String(thousandths).padStart(3, '0')}`),
          );
        },
      ),
      { seed: 31, numRuns: 1000 },
    );
  });
});

describe('A number field says at its place', () => {
  const field = (owner: Parameters<typeof fieldOf>[0], key: string) => {
    const found = fieldOf(owner, key);
    if (found?.type !== 'number' && found?.type !== 'integer') throw new Error(`${key} is no number`);
    return found;
  };
  const hints: [Parameters<typeof fieldOf>[0], string, string][] = [
    ['transformer', 'ukPercent', 'up to 100 %, typical 4…8'],
    ['transformer', 'tapPercent', '−50…50 %, typical ±2.5, ±5'],
    ['transformer', 'loadLossKW', ''],
    ['supply', 'shortCircuitMVA', 'typical 100…500 MVA'],
    ['load', 'powerFactor', 'up to 1, typical 0.7…0.98'],
    ['bank', 'detuningPercent', '0…100 %, typical 0, 5.67, 7, 14'],
    ['filter', 'tunedOrder', 'above 1, typical 4.7 for the 5th'],
    ['converter', 'kW', ''],
  ];
  it.each(hints)('%s %s: %j', (owner, key, hint) => {
    expect(hintOf(field(owner, key))).toBe(hint);
  });

  it('what is typical of this very part where a table knows it', () => {
    expect(hintOf(field('transformer', 'loadLossKW'), '7.6')).toBe('typical 7.6 kW');
  });

  const refused: [Parameters<typeof fieldOf>[0], string, string, RegExp][] = [
    ['transformer', 'ratedKVA', '-5', /−5.kVA is not possible here; allowed is a number above 0 kVA/],
    ['motor', 'count', '2,5', /2\.5 is not possible here; allowed is a whole number from 1/],
    ['load', 'powerFactor', '85 %', /^$/],
    ['load', 'powerFactor', '85', /85 is not possible here; allowed is .*at most 1/],
    ['load', 'kW', '', /A value is needed/],
    ['load', 'kW', '3 kvar', /does not measure this field/],
  ];
  it.each(refused)('%s %s: %j is refused by value and range', (owner, key, typed, error) => {
    const read = readQuantity(typed, field(owner, key));
    expect(read.ok ? '' : read.error).toMatch(error);
  });

  it('nothing written falls back to the default where there is one', () => {
    expect(readQuantity('', field('motor', 'count'))).toEqual({ ok: true, value: undefined });
  });
});

describe('Every field of the catalogue', () => {
  const owners = [...elementKinds, 'bus', 'criteria', 'step', 'controller', 'harmonicRow'] as const;
  const numbers = owners.flatMap((owner) =>
    fieldsOf(owner).flatMap((field) => (field.type === 'number' || field.type === 'integer' ? [field] : [])),
  );
  it.each([...new Set(numbers.map(({ unit }) => unit))])(
    'takes its own unit behind the number: %j',
    (unit) => {
      expect(parseQuantity(`12.5 ${unit}`, unit)).toEqual({ ok: true, value: 12.5 });
    },
  );
});

describe('A sentence says what is wrong with', () => {
  const refused: [string, Unit, RegExp][] = [
    ['', 'V', /Give a number in V/],
    ['abc', 'V', /no number/],
    ['12 apples', 'V', /no unit known here/],
    ['1 kW', 'kvar', /does not measure this field/],
    ['1 kVA', 'kW', /does not measure this field/],
    ['5 V', '%', /does not measure this field/],
    ['1 mva', 'kVA', /capital M for mega/],
    ['1 mW', 'kW', /capital M for mega/],
    ['2*(3', 'V', /closing parenthesis/],
    ['2+', 'V', /number is missing/],
    ['1/0', '', /Division by zero/],
    ['2 V * 3 V', 'V', /cannot be multiplied/],
    ['2 / 3 V', 'V', /cannot be divided/],
    ['sqrt(-1)', '', /root of a negative/],
    ['1.2.3', 'V', /no number/],
    ['1,25,3', 'V', /no number/],
    ['3 4', 'V', /not understood/],
    ['1e999', 'V', /./],
    ['(1 kV) V', 'V', /both inside and behind/],
  ];
  it.each(refused)('%j in a field of %s', (text, unit, error) => {
    const parsed = parseQuantity(text, unit);
    expect(parsed.ok).toBe(false);
    if (!parsed.ok) expect(parsed.error).toMatch(error);
  });
});

describe('Any text', () => {
  const pieces = fc.constantFrom(
    '1',
    '25',
    '0,4',
    '1 250',
    '3.5',
    'k',
    'M',
    'm',
    'kV',
    'Ω',
    '%',
    '+',
    '-',
    '*',
    '/',
    'x',
    '(',
    ')',
    'sqrt',
    ' ',
    'e3',
    ',',
    '.',
    'ü',
  );
  it('gives a finite value or a sentence, and never throws', () => {
    fc.assert(
      fc.property(
        fc.array(pieces, { maxLength: 12 }),
        fc.constantFrom<Unit>('V', 'kVA', 'Ω/km', '%', '', 'mH', 'm', 'h'),
        (parts, unit) => {
          const parsed = parseQuantity(parts.join(''), unit);
          if (parsed.ok) expect(Number.isFinite(parsed.value)).toBe(true);
          else expect(parsed.error.length).toBeGreaterThan(5);
        },
      ),
      { seed: 4711, numRuns: 3000 },
    );
  });

  it('written for a text field reads back to the same number', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        const parsed = parseQuantity(editText(value), 'V');
        expect(parsed.ok && parsed.value === value).toBe(true);
      }),
      { seed: 12, numRuns: 2000 },
    );
  });
});

describe('A number is written', () => {
  const written: [number, Parameters<typeof formatNumber>[1], string][] = [
    [0, {}, '0'],
    [-0, {}, '0'],
    [400, {}, '400'],
    [1250, {}, '1\u2009250'],
    [17391.3, {}, '17\u2009391'],
    [1234567.8, {}, '1\u2009234\u2009568'],
    [7.6, {}, '7.6'],
    [7.6, { fixed: true }, '7.600'],
    [7.6, { digits: 3, fixed: true }, '7.60'],
    [0.35484, { digits: 3 }, '0.355'],
    [-3.5, {}, '\u22123.5'],
    [-0.0004, { decimals: 2 }, '0.00'],
    [0.12345, { decimals: 2 }, '0.12'],
    [12.5, { decimalMark: ',' }, '12,5'],
    [0.1 + 0.2, {}, '0.3'],
    [99999.9, {}, '100\u2009000'],
    [1e-6, {}, '1·10⁻⁶'],
    [-2.5e9, {}, '\u22122.5·10⁹'],
  ];
  it.each(written)('%d with %j', (value, style, text) => {
    expect(formatNumber(value, style)).toBe(text);
  });

  it('with its unit, a degree sign close to it, and a ratio bare', () => {
    expect(formatQuantity(1250, 'kVA')).toBe('1\u2009250\u2009kVA');
    expect(formatQuantity(30, '°')).toBe('30°');
    expect(formatQuantity(0.95, '')).toBe('0.95');
  });

  it('never where there is none', () => {
    expect(() => formatNumber(Number.NaN)).toThrow(RangeError);
    expect(() => formatNumber(Number.POSITIVE_INFINITY)).toThrow(RangeError);
  });
});
