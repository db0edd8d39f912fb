import { phasorSpectrum, type Reading } from '../../charts/index.ts';
import { orderTable, pccBusesOf, thdLimit, voltageSetFor } from '../../checks/index.ts';
import { busReading, type CaseSolution, terminalReading } from '../../engine/index.ts';
import {
  busById,
  busName,
  elementById,
  nameOf,
  type Pin,
  phaseNamesOf,
  type Study,
} from '../../study/index.ts';

function titleOf(study: Study, pin: Pin): string {
  if (pin.quantity === 'voltage') return `${busName(study, pin.bus)} · voltage`;
  const part = elementById(study, pin.element);
  if (!part) return `${pin.element} · current`;
  if (part.kind === 'supply' || part.kind === 'generator') {
    return `${busName(study, pin.bus)} · current from ${nameOf(part)}`;
  }
  const where = 'from' in part ? ` at ${busName(study, pin.bus)}` : '';
  return `${nameOf(part)} · current${where}`;
}

function absence(study: Study, solution: CaseSolution, pin: Pin): string | undefined {
  if (!solution.converged) return solution.error ?? 'This case has no solution.';
  if (!solution.buses.includes(pin.bus)) return 'The busbar is no longer in the study.';
  if (solution.deenergised.includes(pin.bus)) return `${busName(study, pin.bus)} has no path to a source.`;
  if (pin.quantity === 'current' && terminalIndex(solution, pin) < 0) return 'Out of service in this case.';
  return undefined;
}

function terminalIndex(solution: CaseSolution, pin: Pin): number {
  if (pin.quantity !== 'current') return -1;
  return solution.terminals.findIndex((one) => one.element === pin.element && one.bus === pin.bus);
}

function thdLimitPercent(study: Study, busId: string): number | null {
  const bus = busById(study, busId);
  const choice = voltageSetFor(study, pccBusesOf(study).has(busId));
  return bus && 'set' in choice ? (thdLimit(choice.set, bus.nominalV)?.value ?? null) : null;
}

/** Everything the notes show of one pinned quantity, or why there is nothing to show. */
export function readingOf(study: Study, solution: CaseSolution, pin: Pin): Reading {
  const { frequencyHz, maxOrder, summation, judged } = solution;
  const frame = {
    pin,
    title: titleOf(study, pin),
    frequencyHz,
    maxOrder,
    summation,
    phaseNames: phaseNamesOf(study),
  };
  const absent = absence(study, solution, pin);
  const nothing = { voltage: null, current: null, judged: null, bus: null, terminal: null };
  if (absent !== undefined) return { ...frame, ...nothing, anglesUnknown: judged.anglesUnknown, absent };

  const bus = solution.buses.indexOf(pin.bus);
  const voltage = phasorSpectrum(solution.voltage, bus, maxOrder);
  const span = (place: number): [number, number] => [place * maxOrder * 3, (place + 1) * maxOrder * 3];
  const shared = { ...frame, voltage, anglesUnknown: judged.anglesUnknown, bus: busReading(solution, bus) };
  if (pin.quantity === 'voltage') {
    const limits = orderTable(study, solution, pin.bus).flatMap(({ h, limit }) =>
      limit === null ? [] : [{ h, limit }],
    );
    const thd = thdLimitPercent(study, pin.bus);
    return {
      ...shared,
      current: null,
      terminal: null,
      judged: judged.voltage.subarray(...span(bus)),
      limits,
      ...(thd !== null && { thdLimit: thd }),
    };
  }
  const terminal = terminalIndex(solution, pin);
  const kind = elementById(study, pin.element)?.kind;
  return {
    ...shared,
    current: phasorSpectrum(solution.current, terminal, maxOrder),
    terminal: terminalReading(solution, terminal),
    judged: judged.current.subarray(...span(terminal)),
    reversed: kind === 'supply' || kind === 'generator',
  };
}
