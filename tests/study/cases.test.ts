import { describe, expect, it } from 'vitest';
import {
  busById,
  busName,
  casesOf,
  elementById,
  elementName,
  elementsAt,
  fullNameOf,
  isOn,
  newStudy,
  studyInCase,
} from '../../src/study/index.ts';
import { deepFrozen, exampleStudy } from './exampleStudies.ts';

describe('A case', () => {
  const study = deepFrozen(exampleStudy('1-detuned-400v'));

  it('replaces whole fields of its parts and leaves the base study alone', () => {
    const night = studyInCase(study, 'night');
    expect(elementById(night, 'drv')).toMatchObject({ kW: 30, powerFactor: 0.95 });
    expect(elementById(night, 'bank')).toMatchObject({ steps: [{ kvar: 50, on: false }], ratedV: 440 });
    expect(elementById(study, 'drv')).toMatchObject({ kW: 140 });
    const press = elementById(night, 'press');
    expect(press && isOn(press)).toBe(false);
  });

  it('keeps the identity of every part it does not change', () => {
    const night = studyInCase(study, 'night');
    expect(elementById(night, 'heat')).toBe(elementById(study, 'heat'));
    expect(studyInCase(study, 'base')).toBe(study);
  });

  it('is the same object when asked for again', () => {
    expect(studyInCase(study, 'night')).toBe(studyInCase(study, 'night'));
  });

  it('removes a field set to null', () => {
    const changed = {
      ...study,
      cases: [{ id: 'c', changes: [{ element: 'bank', set: { detuningPercent: null } }] }],
    };
    expect(elementById(studyInCase(changed, 'c'), 'bank')).not.toHaveProperty('detuningPercent');
  });

  it('takes a field named like an object’s own machinery for data', () => {
    const set = JSON.parse('{"__proto__": {"kW": 1}, "constructor": 2}') as Record<string, unknown>;
    const changed = studyInCase({ ...study, cases: [{ id: 'c', changes: [{ element: 'heat', set }] }] }, 'c');
    expect(elementById(changed, 'heat')).toMatchObject({ kW: 90 });
    expect(Object.getPrototypeOf(elementById(changed, 'heat'))).toBe(Object.prototype);
  });

  it('has a role, hours and a name even where the file leaves them out', () => {
    expect(casesOf(study).map(({ name, role, hoursPerDay }) => [name, role, hoursPerDay])).toEqual([
      ['Day', 'load', 24],
      ['Reactors bridged', 'load', 24],
      ['Night', 'light', 24],
    ]);
    expect(casesOf(newStudy())).toMatchObject([{ id: 'base', role: 'load', hoursPerDay: 24, changes: [] }]);
  });

  it('that does not exist is a programming error', () => {
    expect(() => studyInCase(study, 'dusk')).toThrow(RangeError);
  });
});

describe('Busbars and parts', () => {
  const study = exampleStudy('1-detuned-400v');
  it('are found by id and named by their name, or by id where they have none', () => {
    expect(busById(study, 'hall')?.nominalV).toBe(400);
    expect(busById(study, '__proto__')).toBeUndefined();
    expect(busName(study, 'hall')).toBe('Press hall');
    expect(elementName(study, 'bank')).toBe('bank');
    expect(busName(study, 'nowhere')).toBe('nowhere');
    const motor = elementById(study, 'press');
    expect(motor && fullNameOf(motor)).toBe('motor press');
  });
  it('know each other', () => {
    expect(elementsAt(study, 'dry').map((element) => element.id)).toEqual(['k1', 'heat']);
  });
});
