import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { judgeStudy, type Verdict } from '../../src/checks/index.ts';
import { scanImpedance, solveCase, terminalReading } from '../../src/engine/index.ts';
import { casesOf, readStudy, type Study } from '../../src/study/index.ts';

function sample(id: string): { study: Study; verdicts: Verdict[] } {
  const text = readFileSync(new URL(`../../public/samples/${id}.json`, import.meta.url), 'utf8');
  const { study, findings } = readStudy(text);
  if (!study) throw new Error(findings.map(({ message }) => message).join('\n'));
  expect(findings).toEqual([]);
  return { study, verdicts: judgeStudy(study) };
}

const failing = (verdicts: readonly Verdict[], caseId: string) =>
  verdicts.filter((one) => one.caseId === caseId && one.verdict === 'fail');

/** The strongest parallel resonance a busbar sees. */
function peak(study: Study, caseId: string, bus: string): number {
  const span = { bus, sequence: 'positive', fromHz: 125, toHz: 1250, points: 2000 } as const;
  const { resonances } = scanImpedance(study, caseId, span);
  const parallel = resonances.filter(({ kind }) => kind === 'parallel').toSorted((a, b) => b.ohm - a.ohm);
  return parallel[0]?.order ?? Number.NaN;
}

/** Phase and neutral current of a part, rms of all orders. */
function currents(study: Study, caseId: string, element: string, bus: string) {
  const solution = solveCase(study, caseId);
  const at = solution.terminals.findIndex((one) => one.element === element && one.bus === bus);
  const { rmsA, neutralRmsA } = terminalReading(solution, at);
  return { phase: Math.max(...rmsA), neutral: neutralRmsA };
}

describe('Brackwater cold store', () => {
  const { study, verdicts } = sample('cold-store');

  it('is clear with every step on, and fails with two of three', () => {
    expect(failing(verdicts, 'day')).toEqual([]);
    expect(failing(verdicts, 'two').map(({ order }) => order)).toContain(11);
  });

  it('meets the 11th with two of three steps', () => {
    expect(peak(study, 'two', 'main')).toBeCloseTo(11, 1);
    expect(Math.abs(peak(study, 'day', 'main') - 11)).toBeGreaterThan(1.5);
  });
});

describe('Harrow Lane offices', () => {
  const { study } = sample('office-tower');

  it('load the neutral of the riser more than its phases, and the delta keeps it from the main board', () => {
    const riser = currents(study, 'day', 'w1', 'riser');
    expect(riser.neutral).toBeGreaterThan(riser.phase);
    const above = currents(study, 'day', 't2', 'main');
    expect(above.neutral).toBeLessThan(0.01 * above.phase);
  });
});

describe('Tarnwell waterworks', () => {
  const { study, verdicts } = sample('waterworks');

  it('is clear with its boards apart, on the weakest supply, at night and on the generator', () => {
    for (const id of ['base', 'weak', 'night', 'gen']) expect(failing(verdicts, id), id).toEqual([]);
  });

  it('meets the 11th with both banks on one transformer, between the orders of either alone', () => {
    expect(peak(study, 'tied', 'b')).toBeCloseTo(11, 1);
    expect(peak(study, 'base', 'b')).toBeLessThan(9.6);
    const eleventh = failing(verdicts, 'tied').find(
      ({ check, order }) => check === 'bus-order' && order === 11,
    );
    expect(eleventh?.value).toBeGreaterThan(10);
    const mixed = verdicts.find(({ check, caseId }) => check === 'mixed-bank' && caseId === 'tied');
    expect(mixed?.verdict).toBe('watch');
  });
});

describe('every sample', () => {
  for (const id of ['cold-store', 'office-tower', 'waterworks']) {
    it(`leaves no more than one verdict a case open for want of data, and names its sources: ${id}`, () => {
      const { study, verdicts } = sample(id);
      for (const one of casesOf(study)) {
        const open = verdicts.filter(({ caseId, verdict }) => caseId === one.id && verdict === 'unknown');
        expect(open.length, open.map(({ title }) => title).join(', ')).toBeLessThanOrEqual(1);
      }
      for (const [path, { origin, note }] of Object.entries(study.origins ?? {}))
        expect(note, `${path}, ${origin}`).toBeTruthy();
    });
  }
});
