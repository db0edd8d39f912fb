import type { Verdict } from '../../checks/index.ts';

/** Where a worst verdict stands: the operating state and the tolerance point that govern. */
export interface Governing {
  /** Id of the state; a case's own id where the state is that case. */
  stateId: string;
  stateName: string;
  /** The case the state is made from. */
  caseId: string;
  /** "every part at its rated value", or what stands off it. */
  point: string;
  rated: boolean;
}

/** A verdict at its worst over the states and the tolerance space searched. */
export interface WorstVerdict extends Verdict {
  governing: Governing;
}

/** A state, or a tolerance point of it, that has no solution. */
export interface Unsolved {
  stateId: string;
  stateName: string;
  point: string;
  error: string;
}

export interface WorstResult {
  /** One verdict a key, sorted by margin. */
  verdicts: WorstVerdict[];
  states: number;
  /** Points of all states solved. */
  points: number;
  /** What the last, smallest steps of the search still took off a margin, at most. */
  bound: number;
  unsolved: Unsolved[];
}

/** How far a run is, with the worst found so far. */
export interface WorstProgress {
  done: number;
  total: number;
  points: number;
}
