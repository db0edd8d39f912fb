import type { CaseSolution } from '../engine/index.ts';

/**
 * A converged solution with its busbars and terminals found by id, read in the magnitudes the checks
 * judge: volts phase-to-neutral, amperes, rms, per order h ≥ 1 and phase 0…2.
 */
export class SolvedCase {
  readonly solution: CaseSolution;
  private readonly busIndex: Map<string, number>;
  private readonly terminalIndex: Map<string, number>;
  private readonly dead: Set<string>;

  constructor(solution: CaseSolution) {
    if (!solution.converged)
      throw new RangeError(`case "${solution.caseId}" has no solution: ${solution.error ?? ''}`);
    this.solution = solution;
    this.busIndex = new Map(solution.buses.map((id, index) => [id, index]));
    this.terminalIndex = new Map(solution.terminals.map((t, index) => [`${t.element}\n${t.bus}`, index]));
    this.dead = new Set(solution.deenergised);
  }

  get maxOrder(): number {
    return this.solution.maxOrder;
  }

  /** Index of a busbar; RangeError where the solution has none of that id. */
  bus(id: string): number {
    const index = this.busIndex.get(id);
    if (index === undefined) throw new RangeError(`the solution has no busbar "${id}"`);
    return index;
  }

  /** Index of the terminal of a part at a busbar; undefined where the part is out of service. */
  terminal(element: string, bus: string): number | undefined {
    return this.terminalIndex.get(`${element}\n${bus}`);
  }

  /** Whether the busbar has a path to a source. */
  energised(bus: string): boolean {
    return !this.dead.has(bus);
  }

  /** Judged |V_k| of a busbar, volts phase-to-neutral. */
  volts(bus: number, h: number, phase: number): number {
    return this.solution.judged.voltage[(bus * this.maxOrder + h - 1) * 3 + phase] ?? 0;
  }

  /** Judged line-to-line volts U12, U23, U31. */
  lineVolts(bus: number, h: number, pair: number): number {
    return this.solution.judged.lineVoltage[(bus * this.maxOrder + h - 1) * 3 + pair] ?? 0;
  }

  /** Judged |I_k| of a terminal, amperes. */
  amperes(terminal: number, h: number, phase: number): number {
    return this.solution.judged.current[(terminal * this.maxOrder + h - 1) * 3 + phase] ?? 0;
  }

  /** Judged |IL1 + IL2 + IL3| of a terminal, amperes. */
  neutralAmperes(terminal: number, h: number): number {
    return this.solution.judged.neutralCurrent[terminal * this.maxOrder + h - 1] ?? 0;
  }

  /** Whether groups of unknown mutual phase were added at this order. */
  anglesUnknown(h: number): boolean {
    return this.solution.judged.anglesUnknown[h - 1] ?? false;
  }

  /** √Σ_h I_h² of one phase of a terminal, amperes. */
  rmsAmperes(terminal: number, phase: number): number {
    let sum = 0;
    for (let h = 1; h <= this.maxOrder; h++) sum += this.amperes(terminal, h, phase) ** 2;
    return Math.sqrt(sum);
  }

  /** The phase 0…2 whose value is largest. */
  static worstPhase(of: (phase: number) => number): number {
    let worst = 0;
    for (let phase = 1; phase < 3; phase++) if (of(phase) > of(worst)) worst = phase;
    return worst;
  }
}
