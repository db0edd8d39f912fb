import type { Study } from '../../study/index.ts';
import type { SolvedCase } from '../SolvedCase.ts';
import type { Verdict } from '../types.ts';

/** A verdict's name without its words. */
export interface Measure {
  /** As the verdict's own. */
  key: string;
  check: string;
  subject: Verdict['subject'];
  order?: number;
}

/** A case solved at a tolerance point, as the gauges read it. */
export interface GaugedState {
  solved: SolvedCase;
  /** The case's study, its parts as they really are at the point. */
  actual: Study;
  frequencyFactor: number;
}

/** Stands for a margin that is not formed at a point: nothing is there for the limit to act on. */
export const NOT_FORMED = Number.POSITIVE_INFINITY;

/** Margins of some measures of one busbar or part, read from a solution without writing words. */
export interface Gauge {
  measures: readonly Measure[];
  /** Puts one margin per measure into `out` from `at` on, NOT_FORMED where there is none. */
  read(state: GaugedState, out: Float64Array, at: number): void;
}
