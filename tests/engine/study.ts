import { expect } from 'vitest';
import { type CaseSolution, currentPhasor, solveCase, voltagePhasor } from '../../src/engine/index.ts';
import type { Bus, Study, StudyElement } from '../../src/study/index.ts';

/** A study of the given busbars and parts, 50 Hz and 25 orders unless said otherwise. */
export function studyOf(buses: Bus[], elements: StudyElement[], more: Partial<Study> = {}): Study {
  return {
    format: 'varwright-study',
    version: 1,
    title: 'A site made for a test',
    frequencyHz: 50,
    maxOrder: 25,
    buses,
    elements,
    ...more,
  };
}

/** A supply without losses to speak of, its fault level so high that it fixes the voltage. */
export function stiffSupply(bus: string, more: Partial<StudyElement> = {}): StudyElement {
  return { id: 'grid', kind: 'supply', bus, shortCircuitMVA: 1e7, xOverR: 10, ...more } as StudyElement;
}

export function solved(study: Study, caseId = 'base'): CaseSolution {
  const solution = solveCase(study, caseId);
  expect(solution.error).toBeUndefined();
  expect(solution.converged).toBe(true);
  return solution;
}

export function terminalOf(solution: CaseSolution, element: string, bus?: string): number {
  const index = solution.terminals.findIndex(
    (t) => t.element === element && (bus === undefined || t.bus === bus),
  );
  expect(index, `terminal of ${element}`).toBeGreaterThanOrEqual(0);
  return index;
}

export function busIndex(solution: CaseSolution, bus: string): number {
  return solution.buses.indexOf(bus);
}

/** |I| of L1 (or another phase) of a terminal. */
export function amps(solution: CaseSolution, element: string, h: number, phase = 0, bus?: string): number {
  return currentPhasor(solution, terminalOf(solution, element, bus), h, phase).abs();
}

/** |V| of L1 (or another phase) of a bus. */
export function volts(solution: CaseSolution, bus: string, h: number, phase = 0): number {
  return voltagePhasor(solution, busIndex(solution, bus), h, phase).abs();
}

/** Rounds to significant digits, as a source prints them. */
export function printed(value: number, digits: number): number {
  return Number(value.toPrecision(digits));
}
