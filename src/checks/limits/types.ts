import type { Provenance } from '../types.ts';

/** percent(h) = a·at/h + b, the form in which the IEC documents state limits of high orders. */
export interface OverOrder {
  a: number;
  at: number;
  b: number;
}

/** Which orders of a row's span it speaks of; "odd" and "even" of IEC documents part the triplens. */
export type OrderFamily = 'any' | 'odd-nontriplen' | 'odd-triplen' | 'even';

/** One row of a table of limits: percent of the reference for the family's orders in from…to. */
export interface OrderRow {
  family: OrderFamily;
  from: number;
  to: number;
  percent: number | OverOrder;
  /** Where this row was read, when it differs from its table. */
  provenance?: Provenance;
}

/** A value read in one place of a document. */
export interface Cited {
  clause: string;
  provenance: Provenance;
  note?: string;
}

/** Harmonic voltage limits for nominal voltages in (aboveV, upToV]; no upToV: no upper end. */
export interface VoltageTable extends Cited {
  aboveV: number;
  upToV?: number;
  orders: OrderRow[];
  thdPercent: number;
}

/** Steady voltage band in per cent of nominal. */
export interface VoltageBand extends Cited {
  lowPercent: number;
  highPercent: number;
}

/** A single number with its place. */
export interface CitedValue extends Cited {
  value: number;
}

export interface VoltageLimits {
  tables: VoltageTable[];
  /** THD counts orders up to here. */
  thdToOrder: number;
  /** The document speaks of the point of common coupling only; elsewhere it informs. */
  pccOnly?: boolean;
}

/** Percent of the demand current I_L for one span of Isc/I_L: [atLeast, below). */
export interface CurrentRow {
  ratioFrom: number;
  ratioBelow?: number;
  /** By band of orders, aligned with CurrentTable.bands. */
  percent: number[];
  tddPercent: number;
}

export interface CurrentTable extends Cited {
  aboveV: number;
  upToV?: number;
  /** Last order of each band; the first begins at order 2. */
  bands: number[];
  rows: CurrentRow[];
}

/** Even orders: the share of the table's value that applies up to `to`. */
export interface EvenRule extends Cited {
  spans: { to: number; share: number }[];
}

export interface CurrentLimits {
  tables: CurrentTable[];
  even: EvenRule;
  toOrder: number;
}

/** Voltage ratio U/U_N allowed while the state lasts at most upToHours a day. */
export interface CapacitorVoltageRow {
  upToHours: number;
  ratio: number;
  words: string;
}

/** Residual voltage allowed so many seconds after disconnection, for rated voltages up to upToV. */
export interface DischargeRow {
  upToV?: number;
  residualV: number;
  seconds: number;
}

export interface CapacitorLimits {
  voltage: Cited & { rows: CapacitorVoltageRow[] };
  discharge: Cited & { rows: DischargeRow[] };
  /** Peak of the inrush current, multiples of I_N; absent where the document is silent. */
  inrushRatio?: CitedValue;
  currentRatio: CitedValue;
  peakRatio?: CitedValue;
  kvarRatio?: CitedValue;
  /** Said beside every verdict that uses the set. */
  remark?: string;
}

/** One published document as data. A user may edit a copy; ids of copies are the user's own. */
export interface LimitSet {
  id: string;
  label: string;
  document: string;
  edition: string;
  note?: string;
  voltage?: VoltageLimits;
  band?: VoltageBand;
  unbalancePercent?: CitedValue;
  current?: CurrentLimits;
  capacitor?: CapacitorLimits;
}
