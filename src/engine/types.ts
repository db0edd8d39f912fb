/** Results of the phasor engine, as flat arrays that cross the worker boundary by transfer. */

/** A terminal of an in-service element. Current is positive INTO the element from the bus. */
export interface Terminal {
  element: string;
  bus: string;
  /** Whether IEEE 1459 four-wire formulas apply here (study format, §8 list). */
  fourWire: boolean;
}

export interface ComplexArray {
  re: Float64Array;
  im: Float64Array;
}

/**
 * Magnitudes the checks judge. Where every angle is known they equal the solution's; at orders where
 * source groups of unknown mutual phase meet, the groups are added by magnitude (or by the IEC 61000-3-6
 * law where the study chooses it). Same indexing as the solution. Index 0 of an order is h = 1.
 */
export interface JudgedMagnitudes {
  voltage: Float64Array;
  lineVoltage: Float64Array;
  current: Float64Array;
  neutralCurrent: Float64Array;
  /** By order h (index h − 1): more than one group of unknown mutual phase was added by magnitude. */
  anglesUnknown: boolean[];
}

/**
 * One case solved at every integer order 1…maxOrder, rms phasors, cosine reference.
 * Index of bus b, order h, phase k: (b·maxOrder + h − 1)·3 + k; of terminal t alike;
 * neutralCurrent: t·maxOrder + h − 1. Under the "alpha" summation, orders ≥ 2 carry [magnitude, 0].
 */
export interface CaseSolution {
  caseId: string;
  frequencyHz: number;
  maxOrder: number;
  summation: 'phasor' | 'alpha';
  converged: boolean;
  iterations: number;
  /** Why there are no numbers, when converged is false; the arrays are then empty. */
  error?: string;
  /** Bus ids in study order. */
  buses: string[];
  /** Line-to-line nominal volts of the buses; the measure for "no fundamental to speak of". */
  nominalV?: Float64Array;
  terminals: Terminal[];
  /** Ids of buses without a path to a source; their voltages are zero. */
  deenergised: string[];
  /** Phase-to-neutral volts. */
  voltage: ComplexArray;
  /** Amperes into the element. */
  current: ComplexArray;
  /** |V12|, |V23|, |V31| by order, volts; under "alpha" formed per source before combining. */
  lineVoltage: Float64Array;
  /** |IL1 + IL2 + IL3| by order, amperes; under "alpha" formed per source before combining. */
  neutralCurrent: Float64Array;
  judged: JudgedMagnitudes;
  warnings: string[];
}

export interface Resonance {
  /** Order h = f/fn. */
  order: number;
  kind: 'parallel' | 'series';
  ohm: number;
  /** null where the half-power points are out of reach. */
  q: number | null;
}

/** Driving-point impedance over frequency at one bus, in ohm per phase of the named sequence. */
export interface ImpedanceScan {
  bus: string;
  sequence: 'positive' | 'zero';
  frequencyHz: Float64Array;
  re: Float64Array;
  im: Float64Array;
  resonances: Resonance[];
  /** Why it is empty (no source, or no zero-sequence path). */
  error?: string;
}

/**
 * Positive-sequence driving-point impedances of all buses at one order, ohm, in study order. A bus without
 * a path to a source has `present` 0 and no meaning in re and im.
 */
export interface DrivingPoints extends ComplexArray {
  present: Uint8Array;
}

/** Readings of one bus: rms over all orders per phase, volts and per cent. */
export interface BusReading {
  rmsV: [number, number, number];
  /** U12, U23, U31. */
  rmsLL: [number, number, number];
  thdPercent: (number | null)[];
}

/** Readings of one terminal, powers into the element (a source shows negative kW). */
export interface TerminalReading {
  rmsA: [number, number, number];
  neutralRmsA: number;
  thdPercent: (number | null)[];
  kW: number;
  kvar: number;
  kVA: number;
  displacementPF: number | null;
  truePF: number | null;
}

/** The results file, study format §8. */
export interface ResultsFile {
  format: 'varwright-results';
  version: 1;
  cases: ResultsCase[];
  warnings: string[];
}

export interface ResultsCase {
  id: string;
  converged: boolean;
  iterations: number;
  error?: string;
  buses: {
    id: string;
    orders: { h: number; V: [number, number][] }[];
    rmsV: number[];
    rmsLL: number[];
    thdPercent: (number | null)[];
  }[];
  terminals: ({
    element: string;
    bus: string;
    orders: { h: number; I: [number, number][] }[];
  } & TerminalReading)[];
  checks: ResultsCheck[];
  scans: {
    bus: string;
    sequence: 'positive' | 'zero';
    error?: string;
    points: [number, number, number][];
    resonances: Resonance[];
  }[];
}

export interface ResultsCheck {
  check: string;
  element?: string;
  bus?: string;
  value: number | null;
  limit: number | null;
  unit: string;
  margin: number | null;
  verdict: 'pass' | 'watch' | 'fail' | 'unknown';
  source: string;
}
