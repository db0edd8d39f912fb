import {
  type BusReading,
  busReading,
  type CaseSolution,
  type TerminalReading,
  terminalReading,
} from '../../engine/index.ts';

/** Reading of a busbar by id; undefined where the solution has no such busbar or it is dead. */
export function readBus(solution: CaseSolution, bus: string): BusReading | undefined {
  const index = solution.buses.indexOf(bus);
  return index < 0 || solution.deenergised.includes(bus) ? undefined : busReading(solution, index);
}

/** Reading of a terminal by its index in the solution. */
export const readTerminal = (solution: CaseSolution, index: number): TerminalReading =>
  terminalReading(solution, index);

/** |V1| of the three phases to neutral, volts; undefined where the busbar is missing or dead. */
export function fundamentalVolts(solution: CaseSolution, bus: string): number[] | undefined {
  const index = solution.buses.indexOf(bus);
  if (index < 0 || solution.deenergised.includes(bus)) return undefined;
  const first = index * solution.maxOrder * 3;
  return [0, 1, 2].map((k) =>
    Math.hypot(solution.voltage.re[first + k] ?? 0, solution.voltage.im[first + k] ?? 0),
  );
}

/** Largest of the values that are there; undefined where none is. */
export function largest(values: readonly (number | null | undefined)[]): number | undefined {
  const present = values.filter(
    (value): value is number => typeof value === 'number' && Number.isFinite(value),
  );
  return present.length === 0 ? undefined : Math.max(...present);
}
