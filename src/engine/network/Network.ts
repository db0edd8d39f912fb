import type { Bus, ResolvedElement, Study } from '../../study/index.ts';
import type { PartLaw } from '../models/PartLaw.ts';
import type { Terminal } from '../types.ts';

/** Which of a study's two sets of admittances: h = 1 of the power solution, or any h of the harmonic model. */
export type Role = 'fundamental' | 'harmonic';

/** Phases of a part: three-phase −1, −1; single-phase to neutral p, −1; phase to phase p, q. */
export interface Phases {
  p: number;
  q: number;
}

/** Constant power drawn at the fundamental, total VA, into the part. */
export interface Demand {
  active: number;
  reactive: number;
  /** 'motor': in the positive sequence; 'wye': each phase by itself; 'three-wire': freed of zero sequence. */
  form: 'motor' | 'wye' | 'three-wire' | 'single' | 'pair';
}

/** Harmonic content by order h; percent 0 where there is none. */
export interface OrderTable {
  percent: Float64Array;
  angleRad: Float64Array;
  /** 1 where the study gives the angle. */
  angleKnown: Uint8Array;
}

/** Source behind its impedance: EMF of L1 at the fundamental, and background by order. */
export interface Emf {
  volts: number;
  angleRad: number;
  /** Volts of 100 % background. */
  backgroundBase: number;
  background: OrderTable | null;
}

/** Ideal harmonic current source of a converter, as a share of its bridge's fundamental current. */
export interface Injector {
  table: OrderTable;
  /** Freed of zero sequence at h ≥ 2. */
  threeWire: boolean;
}

export interface ShuntPart {
  element: ResolvedElement;
  bus: number;
  /** −1 on a bus without a source. */
  node: number;
  terminal: number;
  phases: Phases;
  /** Admittances; null for a part that is current source alone. */
  law: PartLaw | null;
  /** Offset of the law's values in `Network.values`. */
  at: number;
  /** Whether the law counts at the fundamental: all of it, nothing, or a motor's negative sequence. */
  atFundamental: 'all' | 'none' | 'negative';
  demand: Demand | null;
  emf: Emf | null;
  injector: Injector | null;
}

export interface SeriesPart {
  element: ResolvedElement;
  fromBus: number;
  toBus: number;
  from: number;
  to: number;
  /** Terminal of `from`; that of `to` follows. */
  terminal: number;
  law: PartLaw;
  at: number;
  /** Hours of the vector group, 0 for everything that is no transformer. */
  clock: number;
}

/** Per node: whether zero-sequence current finds a path. */
export interface ZeroPaths {
  fundamental: Uint8Array;
  harmonic: Uint8Array;
  /** Like `fundamental` without cables, banks, filters and shunts: what may carry a load. */
  demand: Uint8Array;
}

/**
 * A study in one case, compiled: energised buses are nodes, parts have their laws and places. Pure data;
 * solvers built on it keep their own matrices. `values` is scratch for the laws' sequence admittances.
 */
export interface Network {
  study: Study;
  caseId: string;
  /** Rated frequency, hertz: reactances of the data hold there. */
  frequencyHz: number;
  /** Actual over rated frequency. */
  frequencyFactor: number;
  maxOrder: number;
  summation: 'phasor' | 'alpha';
  buses: readonly Bus[];
  /** Node of each bus, −1 without a path to a source. */
  nodeOfBus: Int32Array;
  busOfNode: Int32Array;
  nodeCount: number;
  /** Pairs of nodes joined by a series part. */
  edges: Int32Array;
  shunts: ShuntPart[];
  series: SeriesPart[];
  terminals: Terminal[];
  values: Float64Array;
  zeroPaths: ZeroPaths;
  /** Every part in service loads the three phases alike, and no ring of transformers turns the phase. */
  balanced: boolean;
  /** Hours by which each node lags its island's reference in positive sequence. */
  hours: Int32Array;
  warnings: string[];
  /** Why the case has no solution, known before solving (a single-phase demand without a neutral path). */
  error: string | null;
}
