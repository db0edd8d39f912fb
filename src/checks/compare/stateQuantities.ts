import { busReading, type CaseSolution, type ImpedanceScan, terminalReading } from '../../engine/index.ts';
import {
  type Bank,
  type Bus,
  busById,
  type Filter,
  isOn,
  nameOf,
  type Study,
  type StudyElement,
} from '../../study/index.ts';
import { inflowAt } from '../inflow.ts';
import { meteredBusesOf, pccBusesOf } from '../pcc.ts';
import { SolvedCase } from '../SolvedCase.ts';
import type { Verdict } from '../types.ts';

/** What a comparison is told by, in the order it is read. */
export type QuantityGroup = 'pcc' | 'busbar' | 'correction' | 'series' | 'resonance';

/** One number of a state that can stand beside the same number of another. */
export interface StateQuantity {
  key: string;
  group: QuantityGroup;
  subject: Verdict['subject'];
  /** "Main board · voltage". */
  title: string;
  unit: string;
  /** Decimals instead of significant digits. */
  decimals?: number;
  value: number;
}

/** A state's numbers as the worker gives them. */
export interface StateNumbers {
  /** The study as it stands in the state. */
  study: Study;
  solution: CaseSolution;
  verdicts: readonly Verdict[];
  /** Impedance seen at the busbar looked at, with the correction in. */
  scan: ImpedanceScan | null;
}

/**
 * Power, voltage, distortion, duty and resonances of a solved state. What the state does not have (a part out
 * of service, a busbar without voltage) is left out; a state without a solution has its resonances alone.
 */
export function stateQuantities(state: StateNumbers): StateQuantity[] {
  const peaks = state.scan ? resonances(state.study, state.scan) : [];
  if (!state.solution.converged) return peaks;
  const solved = new SolvedCase(state.solution);
  return [
    ...meteredBuses(state.study).flatMap((bus) => powerAt(state, solved, bus)),
    ...state.study.buses.flatMap((bus) => voltageAt(state.solution, bus)),
    ...state.study.elements.flatMap((part) => dutyOf(state, solved, part)),
    ...peaks,
  ];
}

function meteredBuses(study: Study): Bus[] {
  const pcc = pccBusesOf(study);
  const ids = new Set([...pcc, ...meteredBusesOf(study, pcc)]);
  return study.buses.filter(({ id }) => ids.has(id));
}

function largest(values: readonly (number | null)[]): number | null {
  const known = values.filter((value) => value !== null);
  return known.length === 0 ? null : Math.max(...known);
}

type Told = Omit<StateQuantity, 'key' | 'group' | 'subject' | 'title'> & { what: string };

function quantities(
  group: QuantityGroup,
  subject: Verdict['subject'],
  name: string,
  told: readonly (Omit<Told, 'value'> & { value: number | null | undefined })[],
): StateQuantity[] {
  return told.flatMap(({ what, value, ...rest }) =>
    value === null || value === undefined || !Number.isFinite(value)
      ? []
      : [
          {
            key: `${group}|${subject.id}|${what}`,
            group,
            subject,
            title: `${name} · ${what}`,
            value,
            ...rest,
          },
        ],
  );
}

function powerAt({ study, solution }: StateNumbers, solved: SolvedCase, bus: Bus): StateQuantity[] {
  const inflow = inflowAt(study, solved, bus.id);
  if (!inflow) return [];
  const [only, more] = inflow.terminals;
  const meter = only !== undefined && more === undefined ? terminalReading(solution, only) : null;
  return quantities('pcc', { kind: 'bus', id: bus.id }, nameOf(bus), [
    { what: 'active power into the site', unit: 'kW', value: inflow.kW },
    { what: 'reactive power, lagging positive', unit: 'kvar', value: inflow.kvar },
    { what: 'cos φ', unit: '', decimals: 3, value: inflow.displacementPF },
    // The meter's terminal points into the source; the site sees the other sign.
    { what: 'true power factor', unit: '', decimals: 3, value: meter?.truePF && -meter.truePF },
    { what: 'current', unit: 'A', value: meter && Math.max(...meter.rmsA) },
    { what: 'THD(I)', unit: '%', value: meter && largest(meter.thdPercent) },
  ]);
}

function voltageAt(solution: CaseSolution, bus: Bus): StateQuantity[] {
  const index = solution.buses.indexOf(bus.id);
  if (index < 0 || solution.deenergised.includes(bus.id)) return [];
  const at = index * solution.maxOrder * 3;
  const lines = solution.lineVoltage.subarray(at, at + 3);
  return quantities('busbar', { kind: 'bus', id: bus.id }, nameOf(bus), [
    { what: 'voltage', unit: 'V', value: lines.reduce((sum, volts) => sum + volts, 0) / 3 },
    { what: 'THD(U)', unit: '%', value: largest(busReading(solution, index).thdPercent) },
  ]);
}

function dutyOf({ study, solution }: StateNumbers, solved: SolvedCase, part: StudyElement): StateQuantity[] {
  const subject = { kind: 'element', id: part.id } as const;
  const at = (bus: string) => {
    const terminal = isOn(part) ? solved.terminal(part.id, bus) : undefined;
    return terminal === undefined ? null : terminalReading(solution, terminal);
  };
  switch (part.kind) {
    case 'bank':
    case 'filter': {
      const meter = at(part.bus);
      const rated = ratedAmpere(study, part);
      const current = meter && Math.max(...meter.rmsA);
      return quantities('correction', subject, nameOf(part), [
        { what: 'current', unit: 'A', value: current },
        { what: 'current of rated', unit: '%', value: current && rated && (100 * current) / rated },
        { what: 'reactive power delivered', unit: 'kvar', value: meter && -meter.kvar },
      ]);
    }
    case 'transformer': {
      const meter = at(part.to);
      return quantities('series', subject, nameOf(part), [
        { what: 'load of rated', unit: '%', value: meter && (100 * meter.kVA) / part.ratedKVA },
      ]);
    }
    case 'cable': {
      const meter = at(part.from);
      return quantities('series', subject, nameOf(part), [
        { what: 'current', unit: 'A', value: meter && Math.max(...meter.rmsA) },
      ]);
    }
    default:
      return [];
  }
}

/** √3-rated current of the steps that are in, or of a filter's kvar at its busbar. */
function ratedAmpere(study: Study, part: Bank | Filter): number | null {
  if (part.kind === 'filter') {
    const volts = busById(study, part.bus)?.nominalV;
    return volts === undefined ? null : (part.kvar * 1000) / (Math.sqrt(3) * volts);
  }
  const kvar = part.steps.reduce((sum, step) => sum + (step.on === false ? 0 : step.kvar), 0);
  return kvar === 0 ? null : (kvar * 1000) / (Math.sqrt(3) * part.ratedV);
}

/** Parallel resonances seen at the busbar, from the lowest up: each stands beside the other state's of its rank. */
function resonances(study: Study, scan: ImpedanceScan): StateQuantity[] {
  const bus = busById(study, scan.bus);
  if (!bus) return [];
  return scan.resonances
    .filter(({ kind }) => kind === 'parallel')
    .toSorted((a, b) => a.order - b.order)
    .flatMap(({ order, ohm, q }, rank) =>
      quantities('resonance', { kind: 'bus', id: bus.id }, nameOf(bus), [
        { what: `parallel resonance ${rank + 1}, order`, unit: '', decimals: 2, value: order },
        { what: `parallel resonance ${rank + 1}, |Z|`, unit: 'mΩ', value: ohm * 1000 },
        { what: `parallel resonance ${rank + 1}, Q`, unit: '', value: q },
      ]),
    );
}
