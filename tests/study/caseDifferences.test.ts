import { describe, expect, it } from 'vitest';
import { caseDifferences, differencesBetween, type Study, studyInCase } from '../../src/study/index.ts';
import { exampleStudy } from './exampleStudies.ts';
import { soundSite, withParts } from './findings/soundSite.ts';

const told = (study: Study, caseId: string) =>
  caseDifferences(study, caseId).map(({ element, label, baseWords, caseWords, mark }) => [
    element.id,
    label,
    baseWords,
    caseWords,
    mark,
  ]);

const inCase = (changes: NonNullable<Study['cases']>[number]['changes'], study = soundSite()): Study => ({
  ...study,
  cases: [{ id: 'c', changes }],
});

describe('What a case has otherwise than the base study', () => {
  it('is told part by part, in trade units, with a mark for the drawing', () => {
    expect(told(soundSite(), 'night')).toEqual([
      ['heat', 'active power, total', '120\u2009kW', '20\u2009kW', '20\u2009kW'],
      ['c1', 'steps', '2 × 50 kvar, all in', '2 × 50 kvar, 1 of 2 in', '1 of 2 steps'],
    ]);
    expect(told(soundSite(), 'day')).toEqual([]);
  });

  it('says in and out of service, open and closed, load in per cent, against the default where none is given', () => {
    const study = inCase(
      [
        { element: 'heat', set: { on: false } },
        { element: 'fans', set: { loadPercent: 60 } },
        { element: 'k1', set: { on: true } },
        { element: 't1', set: { hvV: 20_500 } },
      ],
      withParts(soundSite(), { id: 'k1', kind: 'coupler', from: 'main', to: 'mill', on: false }),
    );
    expect(told(study, 'c')).toEqual([
      ['t1', 'rated high voltage', '20\u2009kV', '20.5\u2009kV', '20.5\u2009kV'],
      ['heat', 'in service', 'in service', 'out of service', 'off'],
      ['fans', 'load', '75\u2009%', '60\u2009%', '60\u2009% load'],
      ['k1', 'in service', 'out of service', 'in service', 'closed'],
    ]);
  });

  it('leaves out what repeats the base study, by its value or by its default, and parts that are gone', () => {
    const study = inCase([
      { element: 'heat', set: { kW: 120, on: true } },
      { element: 'fans', set: { loadPercent: 75 } },
      { element: 'gone', set: { kW: 1 } },
    ]);
    expect(told(study, 'c')).toEqual([]);
  });

  it('is told for a field taken away, and for one nobody knows', () => {
    const study = inCase([{ element: 'c1', set: { detuningPercent: null, serial: 7 } }]);
    expect(told(study, 'c')).toEqual([
      ['c1', 'detuning p', '7\u2009%', '0\u2009%', '0\u2009%'],
      ['c1', 'serial', 'not given', '7', 'serial 7'],
    ]);
  });

  it('is the same list when asked for again', () => {
    const study = soundSite();
    expect(caseDifferences(study, 'night')).toBe(caseDifferences(study, 'night'));
  });

  it('is told between any two cases', () => {
    const study = exampleStudy('1-detuned-400v');
    const between = differencesBetween(study, studyInCase(study, 'night'), studyInCase(study, 'base'));
    expect(between.length).toBeGreaterThan(0);
    expect(between.map(({ baseWords, caseWords }) => [caseWords, baseWords])).toEqual(
      caseDifferences(study, 'night').map(({ baseWords, caseWords }) => [baseWords, caseWords]),
    );
  });
});
