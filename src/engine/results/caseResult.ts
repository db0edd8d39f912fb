import type { CaseSolution, ComplexArray, ImpedanceScan, ResultsCase, ResultsCheck } from '../types.ts';
import { busReading } from './busReading.ts';
import { terminalReading } from './terminalReading.ts';

/**
 * One case of the results file, fields in the format's own order. A failed case has its error and no
 * buses, terminals or checks; its scans still stand.
 */
export function caseResult(
  solution: CaseSolution,
  scans: readonly ImpedanceScan[],
  checks: readonly ResultsCheck[],
): ResultsCase {
  const { caseId, converged, iterations, error } = solution;
  return {
    id: caseId,
    converged,
    iterations,
    ...(error === undefined ? {} : { error }),
    buses: converged ? busRows(solution) : [],
    terminals: converged ? terminalRows(solution) : [],
    checks: converged ? [...checks] : [],
    scans: scans.map(scanResult),
  };
}

function busRows(solution: CaseSolution): ResultsCase['buses'] {
  return solution.buses.map((id, index) => ({
    id,
    orders: threePhases(solution.voltage, index, solution.maxOrder).map((V, k) => ({ h: k + 1, V })),
    ...busReading(solution, index),
  }));
}

function terminalRows(solution: CaseSolution): ResultsCase['terminals'] {
  return solution.terminals.map(({ element, bus }, index) => ({
    element,
    bus,
    orders: threePhases(solution.current, index, solution.maxOrder).map((I, k) => ({ h: k + 1, I })),
    ...terminalReading(solution, index),
  }));
}

function threePhases({ re, im }: ComplexArray, row: number, maxOrder: number): [number, number][][] {
  return Array.from({ length: maxOrder }, (_, order) =>
    [0, 1, 2].map((k): [number, number] => {
      const at = (row * maxOrder + order) * 3 + k;
      return [re[at] ?? 0, im[at] ?? 0];
    }),
  );
}

function scanResult(scan: ImpedanceScan): ResultsCase['scans'][number] {
  const { bus, sequence, error, frequencyHz, re, im, resonances } = scan;
  return {
    bus,
    sequence,
    ...(error === undefined ? {} : { error }),
    points: Array.from(frequencyHz, (f, k): [number, number, number] => [f, re[k] ?? 0, im[k] ?? 0]),
    resonances: resonances.map(({ order, kind, ohm, q }) => ({ order, kind, ohm, q })),
  };
}
