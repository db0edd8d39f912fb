import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  casesOf,
  checkStudy,
  type Finding,
  fingerprint,
  readStudy,
  siteFindings,
  studyInCase,
  withDefaults,
  writeStudy,
} from '../../src/study/index.ts';
import { looseStudy, studyFiles, studyText } from './exampleStudies.ts';

type Container = Record<string, unknown> | unknown[];

function isContainer(value: unknown): value is Container {
  return typeof value === 'object' && value !== null;
}

/** Every place in the data: its container and key. */
function placesOf(data: unknown): [Container, string | number][] {
  if (!isContainer(data)) return [];
  const keys: (string | number)[] = Array.isArray(data) ? [...data.keys()] : Object.keys(data);
  return keys.flatMap((key) => [
    [data, key] as [Container, string | number],
    ...placesOf(valueIn(data, key)),
  ]);
}

function valueIn(container: Container, key: string | number): unknown {
  return Array.isArray(container) ? container[Number(key)] : container[key];
}

const strange = fc.oneof(
  fc.constantFrom<unknown>(
    null,
    true,
    '',
    'x',
    0,
    -1,
    1,
    2.5,
    1e308,
    Number.POSITIVE_INFINITY,
    Number.NaN,
    [],
    {},
    [null],
    { id: 1 },
    [[1]],
    '__proto__',
  ),
  fc.double(),
  fc.string({ maxLength: 6 }),
);

const mutation = fc.record({
  place: fc.nat(100_000),
  how: fc.constantFrom('replace', 'delete', 'append', 'double'),
  value: strange,
});

function mutate(data: unknown, { place, how, value }: { place: number; how: string; value: unknown }): void {
  const places = placesOf(data);
  const chosen = places[place % places.length];
  if (!chosen) return;
  const [container, key] = chosen;
  const inner = valueIn(container, key);
  if (how === 'replace') Object.assign(container, { [key]: value });
  else if (how === 'append' && Array.isArray(inner)) inner.push(value);
  else if (how === 'double' && Array.isArray(container)) container.push(structuredClone(inner));
  else if (Array.isArray(container)) container.splice(Number(key), 1);
  else delete container[key];
}

function expectWellSaid(findings: readonly Finding[]): void {
  for (const finding of findings) {
    expect(finding.path.startsWith('$'), finding.path).toBe(true);
    expect(finding.value, finding.message).toBeTypeOf('string');
    expect(finding.message).toMatch(/^.{10,}\.$/s);
    expect(finding.message).not.toMatch(/undefined|\[object/);
  }
}

describe('A mutated study', () => {
  it('is never a crash: it is refused with paths and values, or every later step accepts it', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...studyFiles),
        fc.array(mutation, { minLength: 1, maxLength: 4 }),
        (name, mutations) => {
          const data = looseStudy(name);
          for (const step of mutations) mutate(data, step);
          const { study, findings } = checkStudy(data);
          expectWellSaid(findings);
          const errors = findings.filter((finding) => finding.severity === 'error');
          expect(study === null).toBe(errors.length > 0);
          if (!study) return;
          for (const item of casesOf(study)) {
            const inCase = studyInCase(study, item.id);
            for (const element of inCase.elements) withDefaults(element, inCase);
          }
          expectWellSaid(siteFindings(study));
          expect(fingerprint(readStudy(writeStudy(study)).study!)).toBe(fingerprint(study));
        },
      ),
      { seed: 31, numRuns: 1500 },
    );
  }, 60_000);

  it('as cut or spliced text is read or refused in words', () => {
    const cut = fc.tuple(fc.constantFrom(...studyFiles), fc.nat(), fc.nat(40), fc.string({ maxLength: 4 }));
    fc.assert(
      fc.property(cut, ([name, at, length, insert]) => {
        const text = studyText(name);
        const start = at % text.length;
        const { findings } = readStudy(text.slice(0, start) + insert + text.slice(start + length));
        for (const finding of findings) expect(finding.path.startsWith('$')).toBe(true);
      }),
      { seed: 32, numRuns: 400 },
    );
  });

  it('from any data at all is refused, not thrown at', () => {
    fc.assert(
      fc.property(fc.anything(), (data) => {
        const { study, findings } = checkStudy(data);
        expect(study).toBeNull();
        expect(findings.length).toBeGreaterThan(0);
      }),
      { seed: 33, numRuns: 500 },
    );
  });
});
