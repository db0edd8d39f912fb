import { describe, expect, it } from 'vitest';
import { noteLetters, pinKey, pinSubject, subjectKey } from '../../src/charts/index.ts';
import { dropPlace } from '../../src/charts/notes/dropPlace.ts';
import { movedPin } from '../../src/charts/notes/movedPin.ts';
import { moveInColumn } from '../../src/charts/notes/noteKeys.ts';
import { readingText, verdictText } from '../../src/charts/notes/noteText.ts';
import type { Reading } from '../../src/charts/notes/Reading.ts';
import { readingNumbers, worstThd } from '../../src/charts/notes/readingNumbers.ts';
import {
  byMargin,
  groupedVerdicts,
  type VerdictNames,
  verdictCounts,
} from '../../src/charts/notes/verdictOrder.ts';
import {
  limitValue,
  marginWords,
  sourceWords,
  verdictHeadline,
  verdictValue,
} from '../../src/charts/notes/verdictWords.ts';
import type { Verdict } from '../../src/checks/types.ts';
import type { Pin } from '../../src/study/types.ts';

const bus = (id: string) => ({ kind: 'bus' as const, id });

function verdict(key: string, change: Partial<Verdict>): Verdict {
  return {
    key,
    check: 'bank-current',
    title: 'current',
    subject: { kind: 'element', id: 'C1' },
    caseId: 'base',
    value: 1.7248,
    limit: 1.3,
    unit: '',
    margin: -1.416,
    verdict: 'fail',
    screening: false,
    working: [{ equation: 'I_rms / I_N', numbers: '933 A / 541 A = 1.72' }],
    source: { document: 'IEC 60831-1', provenance: 'second-hand' },
    remarks: [],
    ...change,
  };
}

const names: VerdictNames = {
  subject: (one) => one.subject.id,
  case: ({ caseId }) => `case ${caseId}`,
};

describe('letters of notes', () => {
  it('run a, b, c … in reading order, one a subject', () => {
    const letters = noteLetters([bus('x'), bus('y'), bus('x'), { kind: 'element', id: 'x' }]);
    expect([...letters]).toEqual([
      ['bus:x', 'a'],
      ['bus:y', 'b'],
      ['element:x', 'c'],
    ]);
  });

  it('stay with their subject while others come and go', () => {
    const before = noteLetters([bus('x'), bus('y'), bus('z')]);
    const after = noteLetters([bus('new'), bus('z'), bus('x')], before);
    expect(after.get('bus:z')).toBe('c');
    expect(after.get('bus:x')).toBe('a');
    expect(after.get('bus:new')).toBe('b');
  });

  it('go on with two letters after z and never repeat', () => {
    const letters = noteLetters(Array.from({ length: 60 }, (_, i) => bus(String(i))));
    expect(letters.get('bus:25')).toBe('z');
    expect(letters.get('bus:26')).toBe('aa');
    expect(letters.get('bus:52')).toBe('ba');
    expect(new Set(letters.values()).size).toBe(60);
  });

  it('tie a current to its part and a voltage to its busbar', () => {
    const current: Pin = { quantity: 'current', element: 'T1', bus: 'main' };
    expect(subjectKey(pinSubject(current))).toBe('element:T1');
    expect(pinSubject({ quantity: 'voltage', bus: 'main' })).toEqual(bus('main'));
    expect(pinKey(current)).not.toBe(pinKey({ ...current, bus: 'intake' }));
  });
});

describe('verdicts in the column', () => {
  const list = [
    verdict('p', { verdict: 'pass', margin: 0.4 }),
    verdict('u', { verdict: 'unknown', margin: null }),
    verdict('w', { verdict: 'watch', margin: 0.05 }),
    verdict('f1', { margin: -0.1 }),
    verdict('f2', { margin: -3 }),
  ];

  it('stand by severity, then by margin; missing data never before a watch', () => {
    expect([...list].sort(byMargin).map((one) => one.key)).toEqual(['f2', 'f1', 'w', 'u', 'p']);
  });

  it('are counted by word and filtered without losing any', () => {
    expect(verdictCounts(list)).toEqual({ fail: 2, watch: 1, unknown: 1, pass: 1 });
    const shown = groupedVerdicts(list, new Set(['fail', 'pass']), 'margin', names);
    expect(shown.flatMap((group) => group.verdicts.map((one) => one.key))).toEqual(['f2', 'f1', 'p']);
  });

  it('are gathered by part with the worst part first', () => {
    const two = [...list, verdict('b', { subject: bus('main'), verdict: 'fail', margin: -9 })];
    const groups = groupedVerdicts(two, new Set(['fail']), 'part', names);
    expect(groups.map((group) => group.title)).toEqual(['main', 'C1']);
  });

  it('of several cases are gathered by case, the worst case first', () => {
    const two = [...list, verdict('n', { caseId: 'night', verdict: 'fail', margin: -9 })];
    const groups = groupedVerdicts(two, new Set(['fail']), 'case', names);
    expect(groups.map(({ title, verdicts }) => [title, verdicts.length])).toEqual([
      ['case night', 1],
      [`case ${list[0]?.caseId}`, 2],
    ]);
  });

  it('say value, limit and margin with three digits and a true minus', () => {
    expect(verdictHeadline(verdict('f', {}), 'Bank C1')).toBe('Bank C1 · current 1.72, limit 1.30');
    expect(verdictValue(0.999, '')).toBe('0.999');
    expect(verdictValue(0.93, '')).toBe('0.93');
    expect(verdictValue(19.4, '%')).toBe('19.4 %');
    expect(limitValue(5, '%')).toBe('5 %');
    expect(limitValue(1, '')).toBe('1.00');
    expect(verdictValue(933, 'A')).toBe('933 A');
    expect(marginWords(0.231)).toBe('+0.23');
    expect(marginWords(-3.62)).toBe('−3.62');
    expect(marginWords(null)).toBe('not known');
  });

  it('leave out value and limit where data are missing', () => {
    const unknown = verdict('u', { value: null, limit: null, margin: null, verdict: 'unknown' });
    expect(verdictHeadline(unknown, 'Main board')).toBe('Main board · current');
    expect(verdictText(unknown, 'Main board', undefined)).toContain('no verdict: Main board');
  });

  it('name how well the source is known', () => {
    expect(
      sourceWords({ document: 'IEC 60831-1', edition: '2014', clause: 'clause 21', provenance: 'memory' }),
    ).toBe('IEC 60831-1:2014, clause 21 (from memory: check against the edition in force)');
    expect(sourceWords({ document: 'common practice', provenance: 'practice' })).toBe('common practice');
  });

  it('are copied with working, source, comparison and mend', () => {
    const text = verdictText(
      verdict('f', { withoutCorrection: { value: 0.4, verdict: 'pass' }, mend: 'detune by 7 %' }),
      'Bank C1',
      'Night shift',
    );
    expect(text.split('\n')).toEqual([
      'fails: Bank C1 · current 1.72, limit 1.30',
      'case\tNight shift',
      'value\t1.72',
      'limit\t1.30',
      'margin\t−1.42',
      'I_rms / I_N',
      '933 A / 541 A = 1.72',
      'source\tIEC 60831-1 (second-hand: read in a text quoting it)',
      'Without the correction: 0.40, passes.',
      'mend\tdetune by 7 %',
    ]);
  });
});

const reading: Reading = {
  pin: { quantity: 'current', element: 'S', bus: 'intake' },
  title: 'Intake · current into the site',
  frequencyHz: 50,
  maxOrder: 1,
  summation: 'phasor',
  voltage: { re: [230, -115, -115], im: [0, -199.2, 199.2] },
  current: { re: [-10, 5, 5], im: [5, 6.2, -11.2] },
  judged: [11.2, 8, 12.3],
  anglesUnknown: [false],
  bus: null,
  terminal: {
    rmsA: [11.2, 11.2, 11.2],
    neutralRmsA: 0,
    thdPercent: [null, 12.34, 8],
    kW: -642.4,
    kvar: 23.1,
    kVA: 788,
    displacementPF: -0.9994,
    truePF: -0.81,
  },
  reversed: true,
};

describe('numbers of a reading', () => {
  const by = (label: string) => readingNumbers(reading).find((one) => one.label === label);

  it('turn the powers of a supply so that the site draws them, with lagging or leading in words', () => {
    expect(by('P')?.parts).toEqual({ number: '642', unit: 'kW' });
    expect(by('Q')).toMatchObject({ parts: { number: '23.1', unit: 'kvar' }, words: 'leading' });
    expect(by('cos φ')).toMatchObject({ parts: { number: '0.999', unit: '' }, words: 'leading' });
    expect(by('PF')?.parts.number).toBe('0.810');
  });

  it('say that a part feeds in when its power is negative', () => {
    const inverter = readingNumbers({ ...reading, reversed: false });
    expect(inverter.find((one) => one.label === 'P')).toMatchObject({
      parts: { number: '−642' },
      words: 'feeding in',
    });
  });

  it('take the worst phase of the THD and leave out phases without a fundamental', () => {
    expect(worstThd([null, 12.34, 8])).toBe(12.34);
    expect(worstThd([null, null, null])).toBeNull();
    expect(by('THD(I)')?.parts).toEqual({ number: '12.3', unit: '%' });
  });

  it('give no crest where there are no angles', () => {
    const alpha = readingNumbers({ ...reading, summation: 'alpha' }).find((one) => one.label === 'crest');
    expect(alpha).toMatchObject({ parts: { number: '—' }, words: 'no angles' });
  });

  it('say why there is nothing to read', () => {
    const absent = { ...reading, absent: 'Drives board has no path to a source.' };
    expect(readingNumbers(absent)).toEqual([]);
    expect(readingText(absent, 'a')).toBe(
      'a  Intake · current into the site\nDrives board has no path to a source.',
    );
  });
});

describe('walking the column by keyboard', () => {
  it('goes from note to note and stops at both ends', () => {
    const visited: string[] = [];
    const go = (key: string, from: string) =>
      moveInColumn(key, ['r', 'v1', 'v2'], from, (note) => visited.push(note));
    expect(go('ArrowDown', 'r')).toBe(true);
    expect(go('ArrowDown', 'v2')).toBe(true);
    expect(go('ArrowUp', 'r')).toBe(true);
    expect(go('End', 'r')).toBe(true);
    expect(go('x', 'r')).toBe(false);
    expect(visited).toEqual(['v1', 'v2']);
  });

  it('drops a dragged note after the middles it has passed', () => {
    const middles = [50, 150, 250];
    expect(dropPlace(middles, 0, 60)).toBe(0);
    expect(dropPlace(middles, 0, 160)).toBe(1);
    expect(dropPlace(middles, 0, 999)).toBe(2);
    expect(dropPlace(middles, 2, 140)).toBe(-1);
    expect(dropPlace(middles, 2, 10)).toBe(-2);
    expect(dropPlace(middles, 1, 150)).toBe(0);
  });

  it('moves a pin one place and refuses beyond the ends', () => {
    const pins: Pin[] = ['a', 'b', 'c'].map((id) => ({ quantity: 'voltage', bus: id }));
    expect(movedPin(pins, 0, 1)?.map((pin) => pin.bus)).toEqual(['b', 'a', 'c']);
    expect(movedPin(pins, 2, -1)?.map((pin) => pin.bus)).toEqual(['a', 'c', 'b']);
    expect(movedPin(pins, 0, -1)).toBeNull();
    expect(movedPin(pins, 2, 1)).toBeNull();
  });
});
