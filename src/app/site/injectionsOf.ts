import type { Injection } from '../../charts/index.ts';
import type { CaseSolution } from '../../engine/index.ts';
import { elementById, isOn, nameOf, type Study, studyInCase } from '../../study/index.ts';

const LEAST_AMPERES = 1e-6;

/** What converters inject, by order, and what the supplies bring as background, in the case solved. */
export function injectionsOf(study: Study, solution: CaseSolution): Injection[] {
  if (!solution.converged) return [];
  const here = studyInCase(study, solution.caseId);
  const { maxOrder, judged } = solution;
  const injected: Injection[] = [];
  solution.terminals.forEach((terminal, place) => {
    const part = elementById(here, terminal.element);
    if (part?.kind !== 'converter') return;
    for (let h = 2; h <= maxOrder; h += 1) {
      const at = (place * maxOrder + h - 1) * 3;
      const amps = Math.max(...judged.current.subarray(at, at + 3));
      if (amps > LEAST_AMPERES) injected.push({ h, amps, name: nameOf(part) });
    }
  });
  for (const part of here.elements) {
    if (part.kind !== 'supply' || !isOn(part)) continue;
    for (const { h, percent } of part.background ?? []) {
      if (h <= maxOrder && percent > 0)
        injected.push({ h, amps: 0, name: nameOf(part), backgroundPercent: percent });
    }
  }
  return injected;
}
