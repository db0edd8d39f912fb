import type { CaseSolution } from '../../engine/index.ts';
import { type Bank, busesOf, type StudyElement } from '../../study/index.ts';
import { livePercent, livePower, liveQuantity } from './liveNumber.ts';
import { type ReadingMode, readOrder, subscript } from './ReadingMode.ts';
import { currentAt, currentRms, powerInto, terminalOf } from './solutionView.ts';

export interface PartReading {
  lines: string[];
  /** The current each conductor's width shows, ampere, by busbar id; empty when unknown or out of service. */
  amperes: Record<string, number>;
}

/** The terminal a part is read at: the lower end of a transformer, else its first. */
function readAt(part: StudyElement): string {
  if (!('from' in part)) return part.bus;
  return part.kind === 'transformer' ? part.to : part.from;
}

/** Rated amperes to compare with, where the part's data give them. */
function ratedAmpere(part: StudyElement): number | undefined {
  if (part.kind === 'transformer') return (part.ratedKVA * 1000) / (Math.sqrt(3) * part.lvV);
  if (part.kind === 'cable') return part.ratedA;
  if (part.kind === 'bank') return bankAmpere(part);
  return undefined;
}

function bankAmpere(bank: Bank): number {
  const kvar = bank.steps.reduce((sum, step) => sum + (step.on === false ? 0 : step.kvar), 0);
  return (kvar * 1000) / (Math.sqrt(3) * bank.ratedV);
}

function withLoading(part: StudyElement, ampere: number): string {
  const rated = ratedAmpere(part);
  const amperes = liveQuantity(ampere, 'A');
  return rated ? `${livePercent(ampere / rated)} · ${amperes}` : amperes;
}

function fundamentalLines(solution: CaseSolution, part: StudyElement, terminal: number): string[] {
  const into = powerInto(solution, terminal);
  const ampere = currentAt(solution, terminal, 1);
  // Power is told as delivered where the part delivers: by a source, and by a transformer at its lower side.
  const turned = part.kind === 'supply' || part.kind === 'generator' || part.kind === 'transformer';
  const [kW, kvar] = turned ? [-into.kW, -into.kvar] : [into.kW, into.kvar];
  const kVA = Math.hypot(kW, kvar);
  const direction = Math.abs(kvar) < 5e-4 * kVA ? '' : kvar > 0 ? ' lagging' : ' leading';
  const reactive = `${livePower(Math.abs(kvar), 'var')}${direction}`;
  const pf =
    kVA > 1e-6
      ? ` · cos φ ${(Math.abs(kW) / kVA).toFixed(kVA > 0 && Math.abs(kW) / kVA > 0.995 ? 3 : 2)}`
      : '';
  if (part.kind === 'bank' || part.kind === 'filter') return [reactive, withLoading(part, ampere)];
  if (part.kind === 'coupler' || part.kind === 'reactor') return [withLoading(part, ampere)];
  return [`${withLoading(part, ampere)}${pf}`, livePower(kW, 'W'), reactive];
}

function rmsLines(solution: CaseSolution, part: StudyElement, terminal: number): string[] {
  const { rms, thd } = currentRms(solution, terminal);
  return [withLoading(part, rms), thd === null ? 'no fundamental' : `THD(I) ${livePercent(thd)}`];
}

function orderLines(solution: CaseSolution, terminal: number, h: number): string[] {
  const ampere = currentAt(solution, terminal, h);
  const fundamental = currentAt(solution, terminal, 1);
  const share = h > 1 && fundamental > 1e-6 ? ` · ${livePercent(ampere / fundamental)}` : '';
  return [`I${subscript(h)} ${liveQuantity(ampere, 'A')}${share}`];
}

/** The current at each end in the chosen reading. */
function endAmperes(part: StudyElement, solution: CaseSolution, mode: ReadingMode, h: number) {
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

/**
 * The live lines of one part. A part out of service, a bank without a step on and a case without a solution
 * say so in words; no number stands for what was not computed.
 */
export function partReading(
  part: StudyElement,
  solution: CaseSolution | null,
  mode: ReadingMode,
  handle: number,
): PartReading {
  if (part.on === false) return { lines: ['out of service'], amperes: {} };
  if (!solution?.converged) return { lines: [], amperes: {} };
  const terminal = terminalOf(solution, part.id, readAt(part));
  if (terminal === undefined) {
    return { lines: [part.kind === 'bank' ? 'no step on' : 'not in this solution'], amperes: {} };
  }
  const h = readOrder(handle, solution.maxOrder);
  const amperes = endAmperes(part, solution, mode, h);
  if (mode === 'fundamental') return { lines: fundamentalLines(solution, part, terminal), amperes };
  if (mode === 'rms') return { lines: rmsLines(solution, part, terminal), amperes };
  return { lines: orderLines(solution, terminal, h), amperes };
}
