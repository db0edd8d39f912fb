/**
 * The study document as it stands in the file: trade units, ids, optional fields left out where the
 * default applies. Defaults, ranges and labels live in the field catalogue beside this file; a field
 * this version does not know stays on its object and is written back unchanged.
 */

import type { StudyView } from './viewTypes.ts';

export type * from './viewTypes.ts';

/** A spectrum or background row. An absent angle is 0 in the solution and unknown to the checks. */
export interface HarmonicRow {
  h: number;
  percent: number;
  angleDeg?: number;
}

export interface Spectrum {
  id: string;
  name?: string;
  orders: HarmonicRow[];
  origin?: string;
}

export interface Bus {
  id: string;
  name?: string;
  /** Line-to-line volts. */
  nominalV: number;
  pcc?: boolean;
  withstandKA?: number;
}

export type Connection = 'L1L2L3' | 'L1' | 'L2' | 'L3' | 'L1L2' | 'L2L3' | 'L3L1';

/** [s, e] of R(h) = R·((1 − s) + s·h^e). */
export type Skin = [number, number];

/** A [minus, plus] band in per cent. */
export type TolerancePercent = [number, number];

interface Part {
  id: string;
  name?: string;
  /** In service; absent means true. */
  on?: boolean;
}

interface SeriesPart extends Part {
  from: string;
  to: string;
}

interface ShuntPart extends Part {
  bus: string;
}

export interface Transformer extends SeriesPart {
  kind: 'transformer';
  ratedKVA: number;
  hvV: number;
  lvV: number;
  ukPercent: number;
  loadLossKW: number;
  vectorGroup: string;
  tapPercent?: number;
  z0OverZ1?: number;
  neutralOhm?: number;
  noLoadLossKW?: number;
  noLoadCurrentPercent?: number;
  skin?: Skin;
  /** P_EC-R of IEEE C57.110, per unit of the load loss. */
  eddyLossShare?: number;
  ukTested?: boolean;
}

export interface Cable extends SeriesPart {
  kind: 'cable';
  lengthM: number;
  resistanceOhmPerKm: number;
  reactanceOhmPerKm: number;
  capacitanceNFPerKm?: number;
  r0OverR1?: number;
  x0OverX1?: number;
  c0OverC1?: number;
  runs?: number;
  ratedA?: number;
  skin?: Skin;
}

export interface Reactor extends SeriesPart {
  kind: 'reactor';
  inductanceMH: number;
  resistanceOhm?: number;
  skin?: Skin;
}

export interface Coupler extends SeriesPart {
  kind: 'coupler';
  resistanceMOhm?: number;
  reactanceMOhm?: number;
}

interface FreeRLC {
  resistanceOhm?: number;
  inductanceMH?: number;
  capacitanceUF?: number;
  arrangement: 'series' | 'parallel';
}

export interface Branch extends SeriesPart, FreeRLC {
  kind: 'branch';
}

export interface Supply extends ShuntPart {
  kind: 'supply';
  shortCircuitMVA: number;
  xOverR: number;
  z0OverZ1?: number;
  setpointPercent?: number;
  angleDeg?: number;
  skin?: Skin;
  background?: HarmonicRow[];
  neutral?: boolean;
  shortCircuitMVAMin?: number;
}

export interface Generator extends ShuntPart {
  kind: 'generator';
  ratedKVA: number;
  xdSubtransientPercent: number;
  xOverR?: number;
  z0OverZ1?: number;
  setpointPercent?: number;
  angleDeg?: number;
  neutral?: boolean;
}

export interface Load extends ShuntPart {
  kind: 'load';
  kW: number;
  powerFactor: number;
  leading?: boolean;
  model?: 'impedance' | 'power';
  connection?: Connection;
  neutral?: boolean;
}

export interface Motor extends ShuntPart {
  kind: 'motor';
  ratedKW: number;
  count?: number;
  loadPercent?: number;
  efficiency?: number;
  powerFactor?: number;
  lockedRotorRatio?: number;
  lockedRotorPowerFactor?: number;
  noLoadCurrentRatio?: number;
  voltageFactorDesign?: string;
}

export interface Converter extends ShuntPart {
  kind: 'converter';
  kW: number;
  powerFactor: number;
  leading?: boolean;
  wires?: 3 | 4;
  connection?: Connection;
  spectrum: string | HarmonicRow[];
  filterCapacitanceUF?: number;
  /** Injects between whole orders, too. Said as a finding; no part in the solution. An extension of the first format. */
  interharmonics?: boolean;
  /** The spectrum was measured with capacitors in. Said as a finding. An extension of the first format. */
  spectrumWithBank?: boolean;
}

export interface BankStep {
  /** Rated kvar at the bank's ratedV. */
  kvar: number;
  on?: boolean;
}

export type StarDelta = 'delta' | 'star-earthed' | 'star';

export interface Controller {
  kCT?: number;
  threshold?: number;
  connectDelayS?: number;
  reconnectDelayS?: number;
}

export interface Bank extends ShuntPart {
  kind: 'bank';
  steps: BankStep[];
  ratedV: number;
  detuningPercent?: number;
  reactorQ?: number;
  reactorSkin?: Skin;
  lossWPerKvar?: number;
  connection?: StarDelta;
  tolerancePercent?: TolerancePercent;
  reactorTolerancePercent?: TolerancePercent;
  ratedReactorA?: number;
  reactorLinearA?: number;
  dischargeOhm?: number;
  controller?: Controller;
  regulator?: unknown;
  ageingPercent?: number;
  switchMakingA?: number;
  unitsPerPhase?: number;
  temperatureClass?: 'A' | 'B' | 'C' | 'D';
  /** °C, with all steps on, on the hottest day. */
  cubicleAirC?: number;
}

export interface Filter extends ShuntPart {
  kind: 'filter';
  type: 'single-tuned' | 'high-pass' | 'c-type';
  kvar: number;
  tunedOrder: number;
  qFactor: number;
  ratedV: number;
  lossWPerKvar?: number;
  connection?: StarDelta;
}

export interface Shunt extends ShuntPart, FreeRLC {
  kind: 'shunt';
  neutral?: boolean;
}

export type SeriesElement = Transformer | Cable | Reactor | Coupler | Branch;
export type ShuntElement = Supply | Generator | Load | Motor | Converter | Bank | Filter | Shunt;
export type StudyElement = SeriesElement | ShuntElement;
export type ElementKind = StudyElement['kind'];
export type ElementOf<K extends ElementKind> = Extract<StudyElement, { kind: K }>;

export interface CaseChange {
  element: string;
  /** Whole top-level fields; null removes the field. */
  set: Record<string, unknown>;
}

export type CaseRole = 'load' | 'light' | 'export' | 'generator';

export interface StudyCase {
  id: string;
  name?: string;
  /** What the state is and why it is looked at. An extension of the first format. */
  description?: string;
  role?: CaseRole;
  hoursPerDay?: number;
  changes: CaseChange[];
}

export interface ScanRequest {
  bus: string;
  sequence: 'positive' | 'zero';
  fromHz: number;
  toHz: number;
  points: number;
}

export interface Criteria {
  targetPF?: number;
  leadingKvarLimit?: number;
  demandCurrentA?: number;
  shortCircuitMVAAtPcc?: number;
  rippleControlHz?: number;
  agreedKVA?: number;
  maxVoltagePercent?: number;
}

export interface LimitChoice {
  pcc?: string;
  internal?: string;
  current?: string;
  capacitor?: string;
}

export interface DataOrigin {
  origin: 'measured' | 'nameplate' | 'typical' | 'assumed';
  note?: string;
  date?: string;
}

export interface Study {
  format: 'varwright-study';
  version: 1;
  title: string;
  site?: string;
  preparedBy?: string;
  revision?: string;
  /** The revision's date, ISO 8601; printed on the results sheet. An extension of the first format. */
  revisionDate?: string;
  notes?: string;
  frequencyHz: 50 | 60;
  maxOrder?: number;
  summation?: 'phasor' | 'alpha';
  limits?: LimitChoice;
  spectra?: Spectrum[];
  buses: Bus[];
  elements: StudyElement[];
  cases?: StudyCase[];
  scans?: ScanRequest[];
  criteria?: Criteria;
  tariff?: unknown;
  proposals?: unknown[];
  interval?: unknown;
  origins?: Record<string, DataOrigin>;
  view?: StudyView;
}

/** What is wrong or worth saying about a study, in words an engineer can act on. */
export interface Finding {
  /** Dotted kind of finding, e.g. "range", "dangling-id", "unknown-field". */
  code: string;
  /** A note is worth knowing; a warning puts a result in doubt; an error makes it worthless or refuses the study. */
  severity: 'error' | 'warning' | 'note';
  /** JSON path, e.g. "$.elements[3].ukPercent". */
  path: string;
  /** The offending value, as JSON text, where there is one. */
  value?: string;
  /** One sentence: part, quantity, value, unit, what is allowed. */
  message: string;
  /** What would mend it, as a sentence; absent where the message says it. */
  mend?: string;
}

/** The part or busbar a finding speaks of. */
export interface FindingSubject {
  kind: 'element' | 'bus';
  id: string;
}

/** A finding about a study that can be opened, with the way to its part and, where only one is meant, the mend itself. */
export interface SiteFinding extends Finding {
  /** Tells findings apart and stays over edits elsewhere. */
  key: string;
  mend: string;
  /** null where it speaks of the study as a whole. */
  subject: FindingSubject | null;
  /** Field of the part or busbar, or null. */
  field: string | null;
  /** Ids of the cases it holds in; empty where it holds whatever the case. */
  cases: readonly string[];
  /** One undoable edit after which the finding is gone. */
  repair?: Edit;
}

/** A change of the study: a pure function with a dotted label and the words undo shows. */
export interface Edit {
  /** e.g. "bank.setSteps". */
  label: string;
  /** e.g. "set the steps of Bank C1". */
  words: string;
  apply(study: Study): Study;
}
