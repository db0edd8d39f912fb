import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { withOriginWord } from '../../../src/drawing/slip/OriginMark.tsx';
import { changedRow, nextOrder } from '../../../src/drawing/slip/RowsTable.tsx';
import { findingsAt, refusalOf, storedValue, variantCase } from '../../../src/drawing/slip/SlipScope.ts';
import { slipSections } from '../../../src/drawing/slip/slipFields.ts';
import { stepValue } from '../../../src/drawing/slip/stepValue.ts';
import {
  elementKinds,
  fieldOf,
  fieldsOf,
  isInside,
  type NumberField,
  parseRows,
  parseSteps,
  stepsFromLines,
  stepsText,
  updateElement,
} from '../../../src/study/index.ts';
import { exampleStudy } from '../../study/exampleStudies.ts';

function numberField(owner: Parameters<typeof fieldOf>[0], key: string): NumberField {
  const field = fieldOf(owner, key);
  if (field?.type !== 'number' && field?.type !== 'integer') throw new Error(`${key} is no number`);
  return field;
}

describe('Steps are read as they are spoken of', () => {
  const spoken: [string, number[]][] = [
    ['6x25', [25, 25, 25, 25, 25, 25]],
    ['2 × 12,5 + 1x25 kvar', [12.5, 12.5, 25]],
    ['25; 25; 50', [25, 25, 50]],
    ['2*0.05 Mvar', [50, 50]],
    ['50', [50]],
  ];
  it.each(spoken)('%s', (text, kvar) => {
    const parsed = parseSteps(text);
    expect(parsed.ok && parsed.steps.map((step) => step.kvar)).toEqual(kvar);
  });

  it.each(['', '6x', 'x25', '3x-5', '3x0', '0x25', '100x5', '6 x 25 V'])(
    'and "%s" is refused in a sentence',
    (text) => {
      const parsed = parseSteps(text);
      expect(parsed.ok).toBe(false);
      if (!parsed.ok) expect(parsed.error).toMatch(/\.$/);
    },
  );

  it('and written back so that they read the same, those switched off as well', () => {
    expect(stepsText([{ kvar: 25 }, { kvar: 25, on: false }, { kvar: 50 }])).toBe('25 + 25 off + 50');
    const kvar = fc.constantFrom(6.25, 12.5, 25, 50, 100);
    const step = fc.tuple(kvar, fc.boolean());
    fc.assert(
      fc.property(fc.array(step, { minLength: 1, maxLength: 20 }), (values) => {
        const steps = values.map(([value, off]) => (off ? { kvar: value, on: false } : { kvar: value }));
        expect(parseSteps(stepsText(steps))).toEqual({ ok: true, steps });
      }),
      { seed: 5 },
    );
  });
});

describe('Steps copied from a sheet', () => {
  it.each([
    ['25\n25\n50\n', '25; 25; 50', 3],
    ['kvar\n12,5\n25', '12,5; 25', 2],
    ['number\tkvar\n2\t12.5\n4\t25', '2 × 12.5; 4 × 25', 6],
    ['6x25', '6x25', 6],
  ] as const)('%j are the steps %j', (text, typed, count) => {
    expect(stepsFromLines(text)).toBe(typed);
    const parsed = parseSteps(typed);
    expect(parsed.ok && parsed.steps.length).toBe(count);
  });
});

describe('A pasted spectrum', () => {
  it('may come with a head, decimal commas, per-cent signs and unknown angles', () => {
    expect(parseRows('order\tpercent\tangle\n5\t38,2 %\t174\r\n7\t14.1\t-\n\nh=11; 6')).toEqual({
      ok: true,
      rows: [
        { h: 5, percent: 38.2, angleDeg: 174 },
        { h: 7, percent: 14.1 },
        { h: 11, percent: 6 },
      ],
      said: '',
    });
  });
  it('may have heads with digits in them, a row of units, and two columns alone', () => {
    expect(parseRows('Order h\t% of I1\n-\t%\n5\t38.2\n7\t14,1')).toMatchObject({
      ok: true,
      rows: [
        { h: 5, percent: 38.2 },
        { h: 7, percent: 14.1 },
      ],
    });
  });
  it('in amperes is brought to per cent of its fundamental, and that is said', () => {
    expect(parseRows('h\tA\n1\t250\n5\t95,5\n7\t35.25')).toEqual({
      ok: true,
      rows: [
        { h: 5, percent: 38.2 },
        { h: 7, percent: 14.1 },
      ],
      said: 'Order 1 is 250, so the rows are taken as amperes and brought to per cent of it.',
    });
    expect(parseRows('1\t100\n5\t38.2')).toMatchObject({ rows: [{ h: 5, percent: 38.2 }] });
  });
  it.each([
    ['5 20\n5 10', /Line 2: order 5 stands there twice/],
    ['5.5 20', /no whole order/],
    ['5 -1', /no percentage/],
    ['5 20 north', /no angle/],
    ['nothing here', /No rows were found/],
    ['5\t20\nTHD\t44', /Line 2: "THD" is no whole order/],
    ['5\t20\nremark', /Line 2: "remark" is no whole order/],
    ['5\t250\t20\t174', /Line 1: 4 columns stand there/],
    ['1\t0\n5\t20', /fundamental/],
  ] as const)('%j is refused with its line', (text, error) => {
    const parsed = parseRows(text);
    expect(!parsed.ok && parsed.error).toMatch(error);
  });
  it('of any text loses no line unsaid: a head before the first row, a row, or a refusal', () => {
    const cell = fc.constantFrom(
      '5',
      '7',
      '11',
      '1',
      'h = 13',
      '38,2',
      '14 %',
      '-',
      '',
      '174',
      'THD',
      '−30',
      '250',
    );
    fc.assert(
      fc.property(
        fc.array(fc.array(cell, { minLength: 1, maxLength: 4 }), { maxLength: 6 }),
        fc.constantFrom('\t', ';'),
        (lines, separator) => {
          const parsed = parseRows(lines.map((line) => line.join(separator)).join('\n'));
          if (!parsed.ok) return parsed.error.endsWith('.');
          const filled = lines.filter((line) => line.some((one) => one !== ''));
          const isRow = (line: string[]) =>
            /\d/.test(line[0] ?? '') || line.some((one) => /^[−-]?\d/.test(one));
          const first = filled.findIndex(isRow);
          const read = filled.length - Math.max(0, first);
          const fundamental = parsed.said === '' ? 0 : 1;
          return parsed.rows.length + fundamental === read;
        },
      ),
      { seed: 12, numRuns: 1000 },
    );
  });
  it('grows by the next odd order, and an emptied angle is unknown, not zero', () => {
    expect(nextOrder([])).toBe(3);
    expect(nextOrder([{ h: 5, percent: 1 }])).toBe(7);
    expect(nextOrder([{ h: 4, percent: 1 }])).toBe(5);
    expect(changedRow({ h: 5, percent: 1, angleDeg: 3 }, 'angleDeg', undefined)).toEqual({
      h: 5,
      percent: 1,
    });
  });
});

describe('The arrow keys step a value', () => {
  const stepped: [number, 1 | -1, boolean, number][] = [
    [1000, 1, false, 1100],
    [1000, -1, false, 990],
    [990, 1, false, 1000],
    [55, 1, false, 56],
    [5.67, 1, false, 5.7],
    [5.67, -1, false, 5.6],
    [440, 1, true, 500],
    [7, -1, false, 6.9],
  ];
  it.each(stepped)('%d by %d, coarse %s, to %d', (value, direction, coarse, next) => {
    expect(stepValue(value, direction, numberField('load', 'kW'), coarse)).toBe(next);
  });
  it('whole numbers by one, ratios by hundredths, never out of range', () => {
    expect(stepValue(1, -1, numberField('motor', 'count'), false)).toBe(1);
    expect(stepValue(3, 1, numberField('motor', 'count'), false)).toBe(4);
    expect(stepValue(0.95, 1, numberField('load', 'powerFactor'), false)).toBe(0.96);
    expect(stepValue(1, 1, numberField('load', 'powerFactor'), false)).toBe(1);
    expect(stepValue(0, -1, numberField('bank', 'detuningPercent'), false)).toBe(0);
    expect(stepValue(0, 1, numberField('bank', 'detuningPercent'), false)).toBe(1);
  });
  it('and stay inside the range of every field of every kind', () => {
    const fields = elementKinds
      .flatMap((kind) => fieldsOf(kind))
      .filter((field): field is NumberField => field.type === 'number');
    fc.assert(
      fc.property(
        fc.constantFrom(...fields),
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.constantFrom<1 | -1>(1, -1),
        fc.boolean(),
        (field, value, direction, coarse) => {
          fc.pre(isInside(value, field));
          expect(isInside(stepValue(value, direction, field, coarse), field)).toBe(true);
        },
      ),
      { seed: 8, numRuns: 1000 },
    );
  });
});

describe('The slip', () => {
  const study = exampleStudy('1-detuned-400v');

  it.each(elementKinds)(
    'shows every field of a %s once, but name, service and what other places edit',
    (kind) => {
      const { essential, more, groups } = slipSections(fieldsOf(kind));
      const shown = [...essential, ...more, ...groups].map((field) => field.key);
      const expected = fieldsOf(kind).filter(
        (field) => field.type !== 'opaque' && field.key !== 'name' && field.key !== 'on',
      );
      expect(shown.toSorted()).toEqual(expected.map((field) => field.key).toSorted());
    },
  );

  it('leads with what the result hangs on, in the order of a nameplate', () => {
    const keys = (kind: Parameters<typeof fieldsOf>[0]) =>
      slipSections(fieldsOf(kind)).essential.map((field) => field.key);
    expect(keys('transformer')).toEqual([
      'ratedKVA',
      'ukPercent',
      'loadLossKW',
      'vectorGroup',
      'hvV',
      'lvV',
      'tapPercent',
    ]);
    expect(keys('load')).toEqual(['kW', 'powerFactor']);
    expect(keys('motor')).toEqual(['ratedKW', 'count', 'loadPercent', 'powerFactor', 'efficiency']);
    expect(keys('converter')).toEqual(['kW', 'powerFactor', 'spectrum']);
    expect(keys('bank')).toEqual(['steps', 'ratedV', 'detuningPercent']);
    expect(keys('cable')).toEqual(['lengthM', 'resistanceOhmPerKm', 'reactanceOhmPerKm', 'runs', 'ratedA']);
  });

  it('keeps note and date when the origin changes, and drops them with it', () => {
    expect(withOriginWord(undefined, 'nameplate')).toEqual({ origin: 'nameplate' });
    expect(withOriginWord({ origin: 'nameplate', note: 'plate photo' }, 'measured')).toEqual({
      origin: 'measured',
      note: 'plate photo',
    });
    expect(withOriginWord({ origin: 'assumed', date: '2026-01' }, '')).toBeNull();
  });

  it('leaves a default out of the file', () => {
    expect(storedValue('delta', 'delta')).toBeUndefined();
    expect(storedValue('star', 'delta')).toBe('star');
  });

  it('asks whether to write a case only where one differs from the base', () => {
    expect(variantCase(study, 'base')).toBeUndefined();
    expect(variantCase(study, 'night')?.name).toBe('Night');
  });

  it('refuses what would make the study, or one of its cases, unsound', () => {
    expect(
      refusalOf(study, updateElement(study, 'bank', { detuningPercent: 5.67 }), 'capacitor bank bank'),
    ).toBeNull();
    expect(refusalOf(study, updateElement(study, 't1', { ukPercent: 0.5 }), 'transformer t1')).toMatch(
      /^Load loss 7.2 kW makes R larger/,
    );
  });

  it('finds the findings of a field, its rows and the record', () => {
    const finding = (path: string) => ({ code: 'x', severity: 'warning' as const, path, message: 'M.' });
    const all = [
      '$.elements[1]',
      '$.elements[1].steps[0].kvar',
      '$.elements[1].steps',
      '$.elements[1].stepsMore',
      '$.elements[11].steps',
    ].map(finding);
    expect(findingsAt(all, '$.elements[1]', 'steps').map((item) => item.path)).toEqual([
      '$.elements[1].steps[0].kvar',
      '$.elements[1].steps',
    ]);
    expect(findingsAt(all, '$.elements[1]', null)).toHaveLength(1);
  });
});
