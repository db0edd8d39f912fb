import { describe, expect, it } from 'vitest';
import {
  canonicalJson,
  canonicalValue,
  fingerprint,
  newStudy,
  readStudy,
  writeStudy,
} from '../../src/study/index.ts';
import { exampleStudy, looseStudy, part, studyFiles, studyText } from './exampleStudies.ts';

describe('A study file', () => {
  it.each(studyFiles)('%s is read without a word and written back with the same data', (name) => {
    const { study, findings } = readStudy(studyText(name));
    expect(findings).toEqual([]);
    expect(JSON.parse(writeStudy(study!))).toEqual(JSON.parse(studyText(name)));
    expect(readStudy(writeStudy(study!)).study).toEqual(study);
  });

  it('keeps fields this version does not know, wherever they stand', () => {
    const loose = looseStudy('1-detuned-400v');
    loose.owner = { name: 'Aldbrook', 'odd key': [1, null] };
    part(loose, 'bank').maker = 'unknown';
    loose.buses[0]!.colour = 'blue';
    Object.assign(loose.scans[0]!, { colour: 1 });
    Object.assign(loose.cases[0]!, { colour: null });
    Object.assign((part(loose, 'bank').steps as object[])[0]!, { serial: '12' });
    const { study } = readStudy(JSON.stringify(loose));
    expect(JSON.parse(writeStudy(study!))).toEqual(loose);
  });

  it('may begin with a byte-order mark', () => {
    expect(readStudy(`\uFEFF${studyText('1-detuned-400v')}`).findings).toEqual([]);
  });

  it('accepts a case written without changes', () => {
    const { cases } = readStudy(JSON.stringify({ ...newStudy(), cases: [{ id: 'a' }] })).study!;
    expect(cases).toEqual([{ id: 'a', changes: [] }]);
  });

  const broken: [string, string, string][] = [
    ['an extra comma', '{"format": "varwright-study",\n "version": 1,\n}', 'line 3, column 1'],
    ['an end too early', '{"format": ', 'line 1, column 12'],
    ['a missing colon', '{"format" 1}', 'line 1, column 11'],
    ['two values', '{} {}', 'line 1, column 4'],
    ['a bare word', '[\n  1,\n  yes]', 'line 3, column 3'],
    ['a number with a comma', '{"a": 0,4}', 'line 1, column 9'],
    ['a leading zero', '[012]', 'line 1, column 2'],
    ['a text over two lines', '["a\nb"]', 'line 1, column 2'],
    ['nothing', '', 'line 1, column 1'],
    ['a mismatched bracket', '{"a": [1, 2}}', 'line 1, column 12'],
  ];
  it.each(broken)('with %s is refused at its line and column', (_title, text, place) => {
    const { study, findings } = readStudy(text);
    expect(study).toBeNull();
    expect(findings).toHaveLength(1);
    expect(findings[0]).toMatchObject({ code: 'json', path: '$' });
    expect(findings[0]?.message).toContain(place);
  });

  it('of 300 parts is read whole', () => {
    const loose = looseStudy('1-detuned-400v');
    for (let index = 0; loose.elements.length < 300; index += 1) {
      loose.elements.push({ ...loose.elements[3 + (index % 5)]!, id: `copy${index}` });
    }
    const { study } = readStudy(JSON.stringify(loose));
    expect(study?.elements).toHaveLength(300);
  });
});

describe('The fingerprint', () => {
  const study = exampleStudy('1-detuned-400v');

  it('is SHA-256: the one of an empty object is 44136fa3… (from memory, and as any sha256sum prints)', () => {
    expect(canonicalValue({})).toBe('{}');
    expect(fingerprint({} as never)).toBe('44136fa355b3678a1146ad16f7e8649e94fb4fc21fe77e8310c060f61caaff8a');
  });

  it('does not depend on the order of fields, on layout, or on the view', () => {
    const reversed = Object.fromEntries(Object.entries(study).reverse()) as unknown as typeof study;
    expect(fingerprint(reversed)).toBe(fingerprint(study));
    expect(fingerprint({ ...study, view: { focusBus: 'hall' } })).toBe(fingerprint(study));
    expect(fingerprint(readStudy(writeStudy(study)).study!)).toBe(fingerprint(study));
  });

  it('changes with any datum', () => {
    expect(fingerprint({ ...study, revision: 'B' })).not.toBe(fingerprint(study));
    expect(fingerprint({ ...study, elements: study.elements.toReversed() })).not.toBe(fingerprint(study));
  });

  it('is refused for a number that is not finite, naming its path', () => {
    expect(() => canonicalJson({ ...study, maxOrder: Number.NaN })).toThrow('$.maxOrder');
  });
});
