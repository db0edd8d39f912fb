import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { judgeCase } from '../../../src/checks/index.ts';
import { solveCase } from '../../../src/engine/index.ts';
import {
  defaultFamilies,
  defaultTolerances,
  statesOf,
  type ToleranceSettings,
  type WorstResult,
  worstOver,
} from '../../../src/sizing/index.ts';
import { casesOf, readStudy, type Study } from '../../../src/study/index.ts';
import { benchmarkSite, withDrives } from '../../reference/benchmarkSite.ts';

const sample = (name: string): Study => {
  const url = new URL(`../../../public/samples/${name}.json`, import.meta.url);
  const { study } = readStudy(readFileSync(url, 'utf8'));
  if (!study) throw new Error(`${name} does not open`);
  return study;
};

function run(study: Study, tolerances: ToleranceSettings | null, families = defaultFamilies) {
  const steps = worstOver(study, { states: statesOf(study, families).states ?? [], tolerances });
  const progress: number[] = [];
  for (let next = steps.next(); ; next = steps.next()) {
    if (next.done) return { result: next.value, progress };
    progress.push(next.value.done);
  }
}

const marginOf = ({ verdicts }: WorstResult, key: string): number =>
  verdicts.find((verdict) => verdict.key === key)?.margin ?? Number.NaN;

describe('worst over states and tolerances', () => {
  const study = sample('cold-store');
  const own = { ...defaultFamilies, steps: false };
  const atRated = run(study, null, own).result;
  const overTolerances = run(study, defaultTolerances, own).result;

  it('with the cases alone, at rated values, is the worst verdict of the cases', () => {
    const solutions = casesOf(study).map(({ id }) => solveCase(study, id));
    const all = solutions.flatMap((solution) =>
      judgeCase(study, solution, { screening: false, otherCases: solutions }),
    );
    for (const { key, margin, governing } of atRated.verdicts) {
      if (margin === null) continue;
      const margins = all.filter((verdict) => verdict.key === key).flatMap((verdict) => verdict.margin ?? []);
      expect(margin, key).toBe(Math.min(...margins));
      expect(governing.rated).toBe(true);
    }
    expect(new Set(atRated.verdicts.map(({ key }) => key))).toEqual(new Set(all.map(({ key }) => key)));
  });

  it('is never better over tolerances than without, and names state and point', () => {
    for (const { key, margin, check } of atRated.verdicts) {
      if (margin === null) continue;
      // Of the orders of a busbar only the nearest has a row; at the worst point that may be another one.
      const listed = overTolerances.verdicts.some((verdict) => verdict.key === key);
      if (listed || !check.endsWith('-order'))
        expect(marginOf(overTolerances, key), key).toBeLessThanOrEqual(margin + 1e-12);
    }
    const bank = overTolerances.verdicts.find(({ key }) => key === 'bank-current|c1');
    expect(bank?.governing.point).toMatch(/capacitance of Bank C1/);
    expect(bank?.working[0]?.numbers).toMatch(/kvar/);
    expect(overTolerances.points).toBeGreaterThan(50);
    expect(overTolerances.bound).toBeLessThan(1e-3);
  });

  it('reports every state as it is done, and gives the same twice', () => {
    const again = run(study, defaultTolerances, own);
    expect(again.progress.slice(0, 3)).toEqual([1, 2, 3]);
    expect(again.result).toEqual(overTolerances);
  });

  it('a state without a solution is told, with its reason', () => {
    const weak = {
      ...study,
      elements: study.elements.map((part) =>
        part.kind === 'supply' ? { ...part, shortCircuitMVA: 0.5, shortCircuitMVAMin: 0.4 } : part,
      ),
    };
    const { unsolved, verdicts } = run(weak, null, own).result;
    expect(unsolved.length).toBeGreaterThan(0);
    expect(unsolved[0]?.error).toMatch(/carry/);
    expect(verdicts.some(({ caseId }) => caseId === unsolved[0]?.stateId)).toBe(false);
  });
});

describe('step combinations', () => {
  it('one of them resonates though the full bank is clear, and the power factor is judged with the case’s own steps', () => {
    const plain = withDrives(
      benchmarkSite({ steps: Array.from({ length: 4 }, () => ({ kvar: 100 })), tolerancePercent: [-5, 10] }),
    );
    const { verdicts } = run(plain, null).result;
    const bank = verdicts.find(({ key }) => key === 'bank-current|bank');
    const full = judgeCase(plain, solveCase(plain, 'base')).find(({ key }) => key === 'bank-current|bank');
    expect(bank?.governing.stateName).toMatch(/at [123]00 kvar/);
    expect(bank?.margin ?? 0).toBeLessThan(full?.margin ?? 0);
    expect(verdicts.find(({ check }) => check === 'target-pf')?.governing.stateName).toBe('Base');
  });
});
