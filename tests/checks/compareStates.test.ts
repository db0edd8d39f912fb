import { describe, expect, it } from 'vitest';
import {
  type ComparedRow,
  comparedText,
  compareStates,
  judgeCase,
  passingInBoth,
  type StateNumbers,
} from '../../src/checks/index.ts';
import { scanImpedance, solveCase } from '../../src/engine/index.ts';
import { baseStateId, casesOf, type Study, studyInCase, withBaseState } from '../../src/study/index.ts';
import { exampleStudy } from '../study/exampleStudies.ts';
import { soundSite } from '../study/findings/soundSite.ts';

const axis = Float64Array.from({ length: 1200 }, (_, i) => 25 + 2 * i);

function state(study: Study, caseId: string, bus = 'main'): StateNumbers {
  const based = withBaseState(study);
  const solution = solveCase(based, caseId);
  return {
    study: caseId === baseStateId ? study : studyInCase(study, caseId),
    solution,
    verdicts: judgeCase(based, solution, {
      otherCases: casesOf(study).map(({ id }) => solveCase(study, id)),
    }),
    scan: scanImpedance(based, caseId, { bus, sequence: 'positive', frequencyHz: axis }),
  };
}

const site = soundSite();
const day = state(site, 'day');
const night = state(site, 'night');
const weak = state(site, 'weak');

function row(rows: readonly ComparedRow[], title: string): ComparedRow {
  const found = rows.find((one) => one.title === title);
  if (!found) throw new Error(`no row ${title}: ${rows.map((one) => one.title).join(', ')}`);
  return found;
}

describe('Two cases side by side', () => {
  const rows = compareStates(site, day, night);

  it('read power, voltage, distortion, bank and resonance off the solution of each', () => {
    const power = row(rows, 'Intake · active power into the site');
    const { solution } = night;
    const grid = solution.terminals.findIndex(({ element }) => element === 'grid');
    const [v, i] = [solution.buses.indexOf('intake') * solution.maxOrder * 3, grid * solution.maxOrder * 3];
    let watts = 0;
    for (let k = 0; k < 3; k += 1) {
      watts -= (solution.voltage.re[v + k] ?? 0) * (solution.current.re[i + k] ?? 0);
      watts -= (solution.voltage.im[v + k] ?? 0) * (solution.current.im[i + k] ?? 0);
    }
    expect(power.b.value).toBeCloseTo(watts / 1000, 9);
    expect(power).toMatchObject({ unit: 'kW', group: 'pcc', subject: { kind: 'bus', id: 'intake' } });
    expect(row(rows, 'Main board · voltage').a.value).toBeGreaterThan(380);
    expect(row(rows, 'Bank C1 · current of rated').unit).toBe('%');
    expect(row(rows, 'T1 · load of rated').a.value).toBeGreaterThan(10);
    const peak = day.scan?.resonances.find(({ kind }) => kind === 'parallel');
    expect(row(rows, 'Main board · parallel resonance 1, order').a.value).toBe(peak?.order);
  });

  it('tell the change as printed with its sign, and nothing where both read the same', () => {
    const power = row(rows, 'Intake · active power into the site');
    expect(power.difference.startsWith('\u2212')).toBe(true);
    expect(power.change).toBeGreaterThan(0.2);
    const same = compareStates(site, day, day);
    expect(same.every(({ change, difference }) => change === 0 && difference === '')).toBe(true);
  });

  it('leave out a part that is in neither, and show a dash where one has it', () => {
    const out: Study = {
      ...site,
      cases: [
        ...(site.cases ?? []),
        { id: 'out', name: 'Bank out', changes: [{ element: 'c1', set: { on: false } }] },
      ],
    };
    const withOut = compareStates(out, state(out, 'day'), state(out, 'out'));
    const current = row(withOut, 'Bank C1 · current');
    expect(current.b).toEqual({ text: '–', value: null });
    expect(current).toMatchObject({ change: 1, difference: '' });
    const both = compareStates(out, state(out, 'out'), state(out, 'out'));
    expect(both.some(({ subject }) => subject.id === 'c1')).toBe(false);
  });

  it('list every verdict that does not pass in both, the turned ones heaviest', () => {
    const verdicts = compareStates(site, day, weak).filter(({ group }) => group === 'verdict');
    for (const one of verdicts)
      expect([one.a.word, one.b.word].some((word) => word && word !== 'pass')).toBe(true);
    for (const one of verdicts)
      expect(one.change > 1).toBe(one.change > 0 && (one.a.word ?? 'pass') !== (one.b.word ?? 'pass'));
    expect(passingInBoth(day.verdicts, weak.verdicts)).toBeGreaterThan(5);
  });

  it('do not call a nameplate verdict a difference because it is said in the first case alone', () => {
    const discharge = day.verdicts.filter(({ check }) => check === 'discharge');
    expect(discharge).toHaveLength(1);
    expect(night.verdicts.filter(({ check }) => check === 'discharge')).toEqual([]);
    expect(rows.some(({ key }) => key.startsWith('discharge'))).toBe(false);
  });

  it('are copied as tab-separated numbers a spreadsheet takes', () => {
    const lines = comparedText(rows, 'Day', 'Night').split('\n');
    expect(lines).toHaveLength(rows.length + 1);
    expect(new Set(lines.map((line) => line.split('\t').length))).toEqual(new Set([9]));
    const power = lines.find((line) => line.startsWith('Intake · active power'))?.split('\t') ?? [];
    expect(Number(power[2])).toBeCloseTo(row(rows, 'Intake · active power into the site').a.value ?? 0, 1);
    expect(Number(power[8])).toBeLessThan(0);
    expect(lines.join('')).not.toMatch(/[\u2009\u2212]/);
  });
});

describe('The base study', () => {
  it('stands beside a case though no case is in its state', () => {
    const cases = (site.cases ?? []).filter(({ changes }) => changes.length > 0);
    const bare: Study = { ...site, cases };
    const rows = compareStates(bare, state(bare, baseStateId), state(bare, 'night'));
    expect(row(rows, 'Intake · active power into the site').a.value).toBeCloseTo(
      row(compareStates(site, day, night), 'Intake · active power into the site').a.value ?? 0,
      9,
    );
  });

  it('of a four-wire site with ties is compared as well', () => {
    const study = exampleStudy('2-four-wire-480v');
    const [first, second] = casesOf(study);
    const rows = compareStates(study, state(study, first!.id, 'mv'), state(study, second!.id, 'mv'));
    expect(rows.length).toBeGreaterThan(10);
    expect(new Set(rows.map(({ key }) => key)).size).toBe(rows.length);
  });
});
