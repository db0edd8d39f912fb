import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { DutyMargins, judgeDuties, NOT_FORMED } from '../../../src/checks/index.ts';
import { solveCase } from '../../../src/engine/index.ts';
import { casesOf, readStudy, type Study } from '../../../src/study/index.ts';

const fileAt = (path: string): Study => {
  const { study } = readStudy(readFileSync(new URL(path, import.meta.url), 'utf8'));
  if (!study) throw new Error(`${path} does not open`);
  return study;
};

const files = [
  '../../../public/samples/cold-store.json',
  '../../../public/samples/office-tower.json',
  '../../reference/studies/1-detuned-400v.json',
  '../../reference/studies/2-four-wire-480v.json',
  '../../reference/studies/3-filters-6k6-alpha.json',
];

/** The study with capacitors 8 % up, chokes 4 % down and the transformers' uk 10 % up. */
function deviated(study: Study): Study {
  return {
    ...study,
    elements: study.elements.map((part) => {
      if (part.kind === 'transformer') return { ...part, ukPercent: part.ukPercent * 1.1 };
      if (part.kind !== 'bank') return part;
      const steps = part.steps.map((step) => ({ ...step, kvar: step.kvar * 1.08 }));
      return { ...part, steps, detuningPercent: (part.detuningPercent ?? 0) * 1.08 * 0.96 };
    }),
  };
}

it.each(files)(
  'numbers alone give the margins of the worded verdicts, at the rated point and off it: %s',
  (file) => {
    const study = fileAt(file);
    for (const { id } of casesOf(study)) {
      const rated = solveCase(study, id);
      const margins = new DutyMargins(study, rated);
      for (const { actual, frequencyFactor } of [
        { actual: study, frequencyFactor: 1 },
        { actual: deviated(study), frequencyFactor: 1.01 },
      ]) {
        const solution = solveCase(actual, id, { frequencyFactor });
        expect(margins.read(solution, actual, frequencyFactor)).toBe(true);
        const byKey = new Map(margins.measures.map(({ key }, k) => [key, margins.margins[k]]));
        const worded = judgeDuties(study, solution, { actual, frequencyFactor, comparison: false });
        const deciding = worded.filter(
          ({ screening, margin, key }) => !screening && margin !== null && !key.endsWith('|leading'),
        );
        expect(deciding.length).toBeGreaterThan(4);
        for (const { key, margin } of deciding) {
          expect(byKey.has(key), key).toBe(true);
          expect(byKey.get(key), key).toBeCloseTo(margin ?? Number.NaN, 9);
        }
        const failing = margins.measures
          .filter((_, k) => (margins.margins[k] ?? 0) < 0)
          .map(({ key }) => key);
        const said = new Set(worded.filter(({ verdict }) => verdict === 'fail').map(({ key }) => key));
        expect(failing.filter((key) => !said.has(key))).toEqual([]);
      }
    }
  },
);

it('a point without a solution forms no margin and says so', () => {
  const study = fileAt(files[0] ?? '');
  const caseId = casesOf(study)[0]?.id ?? '';
  const margins = new DutyMargins(study, solveCase(study, caseId));
  const collapsed = {
    ...study,
    elements: study.elements.map((part) =>
      part.kind === 'supply' ? { ...part, shortCircuitMVA: 0.4 } : part,
    ),
  };
  expect(margins.read(solveCase(collapsed, caseId), collapsed)).toBe(false);
  expect([...margins.margins].every((margin) => margin === NOT_FORMED)).toBe(true);
});
