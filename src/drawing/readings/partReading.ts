import { type CaseSolution, type TerminalReading, terminalReading } from '../../engine/index.ts';
import { type Bank, busesOf, type DrawnItem, minusSign, type StudyElement } from '../../study/index.ts';
import { hasPowerFactor, hasRatedCurrent, reactiveKinds } from '../layout/index.ts';
import { liveNumber, liveShare } from './liveNumber.ts';
import { type ReadingMode, readOrder } from './ReadingMode.ts';
import { currentAt, currentRms, powerAt, terminalOf } from './solutionView.ts';

/** One live figure: a number and its unit, each with a fixed place on the drawing. */
export interface ReadingCell {
  value: string;
  unit: string;
  /** What a screen reader says, where number and unit alone do not tell. */
  spoken?: string;
}

export interface PartReading {
  cells: ReadingCell[];
  /** Said instead of figures: out of service, no step on. */
  words: string;
  /** The current each conductor's width shows, ampere, by busbar id; empty when unknown or out of service. */
  amperes: Record<string, number>;
  /** Whether active power flows from its busbar into the part or out of it; 0 where there is none to speak of. */
  flow: -1 | 0 | 1;
}

type Part = StudyElement;
type Drawn = ReadonlySet<DrawnItem>;

/** Active power below this share of the apparent power at the order shows no direction. */
const LEAST_FLOW = 0.01;

/** The terminal a part is read at: the lower end of a transformer, else its first. */
function readAt(part: Part): string {
  if (!('from' in part)) return part.bus;
  return part.kind === 'transformer' ? part.to : part.from;
}

/** Power is told as delivered where the part delivers: by a source, and by a transformer at its lower side. */
function delivers(part: Part): boolean {
  return part.kind === 'supply' || part.kind === 'generator' || part.kind === 'transformer';
}

/** Rated amperes to compare with, where the part's data give them. */
function ratedAmpere(part: Part): number | undefined {
  if (part.kind === 'transformer') return (part.ratedKVA * 1000) / (Math.sqrt(3) * part.lvV);
  if (part.kind === 'cable') return part.ratedA;
  if (part.kind === 'bank') return bankAmpere(part);
  return undefined;
}

function bankAmpere(bank: Bank): number {
  const kvar = bank.steps.reduce((sum, step) => sum + (step.on === false ? 0 : step.kvar), 0);
  return (kvar * 1000) / (Math.sqrt(3) * bank.ratedV);
}

const signed = (value: number): string =>
  value < 0 ? `${minusSign}${liveNumber(-value)}` : liveNumber(value);

/** kW, kvar: in the mega unit from ten thousand, in the plain one below a hundredth. */
function powerCell(kilo: number, unit: 'W' | 'var'): ReadingCell {
  const size = Math.abs(kilo);
  if (size >= 10_000) return { value: signed(kilo / 1000), unit: `M${unit}` };
  if (size < 0.995 && size > 0) return { value: signed(kilo * 1000), unit };
  return { value: signed(kilo), unit: `k${unit}` };
}

function currentCells(part: Part, ampere: number): ReadingCell[] {
  const cells: ReadingCell[] = [{ value: liveNumber(ampere), unit: 'A' }];
  const rated = ratedAmpere(part);
  if (hasRatedCurrent(part)) {
    const share = rated ? liveShare(ampere / rated) : '–';
    cells.push({ value: share, unit: '%', spoken: `${share} % of rated` });
  }
  return cells;
}

function fundamentalCells(part: Part, meter: TerminalReading, ampere: number, drawn: Drawn): ReadingCell[] {
  const sign = delivers(part) ? -1 : 1;
  const cells: ReadingCell[] = drawn.has('current') ? currentCells(part, ampere) : [];
  if (drawn.has('power')) {
    if (reactiveKinds.has(part.kind)) {
      const side = meter.kvar > 0 ? 'lagging' : 'leading';
      const cell = powerCell(Math.abs(meter.kvar), 'var');
      cells.push({ ...cell, spoken: `${cell.value} ${cell.unit} ${side}` });
    } else cells.push(powerCell(sign * meter.kW, 'W'), powerCell(sign * meter.kvar, 'var'));
  }
  if (drawn.has('powerFactor') && hasPowerFactor(part)) cells.push(displacementCell(meter, sign));
  return cells;
}

function displacementCell({ displacementPF, kW, kvar }: TerminalReading, sign: number): ReadingCell {
  if (displacementPF === null) return { value: '–', unit: 'cos φ' };
  const size = Math.abs(displacementPF);
  const value = size.toFixed(size > 0.995 ? 3 : 2);
  if (Math.abs(kvar) < 5e-4 * Math.hypot(kW, kvar)) return { value, unit: 'cos φ' };
  const lagging = sign * kvar > 0;
  return {
    value,
    unit: lagging ? 'lag' : 'lead',
    spoken: `cos φ ${value} ${lagging ? 'lagging' : 'leading'}`,
  };
}

function rmsCells(
  solution: CaseSolution,
  part: Part,
  meter: TerminalReading,
  terminal: number,
  drawn: Drawn,
): ReadingCell[] {
  const { rms, thd } = currentRms(solution, terminal);
  const { truePF, kVA } = meter;
  const sign = delivers(part) ? -1 : 1;
  const cells: ReadingCell[] = [];
  if (drawn.has('current')) {
    cells.push(...currentCells(part, rms));
    cells.push({ value: thd === null ? '–' : liveShare(thd), unit: '% THD' });
  }
  if (drawn.has('power'))
    cells.push(
      reactiveKinds.has(part.kind)
        ? powerCell(Math.abs(meter.kvar), 'var')
        : powerCell(sign * (truePF ?? 0) * kVA, 'W'),
    );
  if (drawn.has('powerFactor') && hasPowerFactor(part)) {
    const value = truePF === null ? '–' : Math.abs(truePF).toFixed(2);
    cells.push({ value, unit: 'PF', spoken: `true power factor ${value}` });
  }
  return cells;
}

function orderCells(
  solution: CaseSolution,
  part: Part,
  terminal: number,
  h: number,
  drawn: Drawn,
): ReadingCell[] {
  const cells: ReadingCell[] = [];
  if (drawn.has('current')) {
    const ampere = currentAt(solution, terminal, h);
    const fundamental = currentAt(solution, terminal, 1);
    const share = fundamental > 1e-6 ? liveShare(ampere / fundamental) : '–';
    cells.push({ value: liveNumber(ampere), unit: 'A' });
    cells.push({ value: share, unit: '%', spoken: `${share} % of the fundamental` });
  }
  if (drawn.has('power') && !reactiveKinds.has(part.kind)) {
    const sign = delivers(part) ? -1 : 1;
    cells.push(powerCell((sign * powerAt(solution, terminal, h).watts) / 1000, 'W'));
  }
  return cells;
}

/** The current at each end in the chosen reading. */
function endAmperes(part: Part, solution: CaseSolution, mode: ReadingMode, h: number) {
  const amperes: Record<string, number> = {};
  for (const bus of busesOf(part)) {
    const terminal = terminalOf(solution, part.id, bus);
    if (terminal === undefined) continue;
    amperes[bus] =
      mode === 'rms'
        ? currentRms(solution, terminal).rms
        : currentAt(solution, terminal, mode === 'order' ? h : 1);
  }
  return amperes;
}

/** Direction of active power at the part's first terminal: at the order read, else at the fundamental. */
function flowAt(part: Part, solution: CaseSolution, h: number): -1 | 0 | 1 {
  const terminal = terminalOf(solution, part.id, 'from' in part ? part.from : part.bus);
  if (terminal === undefined) return 0;
  const { watts, voltAmperes } = powerAt(solution, terminal, h);
  if (!(Math.abs(watts) > LEAST_FLOW * voltAmperes) || voltAmperes < 1e-3) return 0;
  return watts > 0 ? 1 : -1;
}

/**
 * The live figures of one part. A part out of service, a bank without a step on and a case without a solution
 * say so in words; no number stands for what was not computed.
 */
export function partReading(
  part: Part,
  solution: CaseSolution | null,
  mode: ReadingMode,
  handle: number,
  drawn: Drawn,
): PartReading {
  const none: PartReading = { cells: [], words: '', amperes: {}, flow: 0 };
  if (part.on === false) return { ...none, words: 'off' };
  if (!solution?.converged) return none;
  const terminal = terminalOf(solution, part.id, readAt(part));
  if (terminal === undefined) return { ...none, words: part.kind === 'bank' ? 'no step on' : 'not solved' };
  const h = readOrder(handle, solution.maxOrder);
  const amperes = endAmperes(part, solution, mode, h);
  const flow = flowAt(part, solution, mode === 'order' ? h : 1);
  if (mode === 'order')
    return { ...none, cells: orderCells(solution, part, terminal, h, drawn), amperes, flow };
  const meter = terminalReading(solution, terminal);
  const cells =
    mode === 'rms'
      ? rmsCells(solution, part, meter, terminal, drawn)
      : fundamentalCells(part, meter, currentAt(solution, terminal, 1), drawn);
  return { ...none, cells, amperes, flow };
}
