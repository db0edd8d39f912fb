import type { CaseSolution, ImpedanceScan, ScanSpan } from '../engine/index.ts';
import type { Bank, CaseRole, Filter, Study } from '../study/index.ts';
import type { SolvedCase } from './SolvedCase.ts';

/** Presence of an order, both settable: U_h against its limit, I_h against the bank's I_N. */
export interface PresenceThresholds {
  voltageShareOfLimit: number;
  currentShareOfRated: number;
}

export const defaultPresence: PresenceThresholds = { voltageShareOfLimit: 0.1, currentShareOfRated: 0.005 };

/** Everything one case's checks read. Solutions and scans beyond the given one are computed when asked for. */
export interface CheckContext {
  /** The study as it stands in this case: ratings are read here. */
  study: Study;
  /** The same with its parts as they really are at the tolerance point judged. */
  actualStudy: Study;
  /** A bank or filter as it really is at the tolerance point judged, for reactances and currents. */
  actual<T extends Bank | Filter>(part: T): T;
  /** Actual over rated frequency. */
  frequencyFactor: number;
  /** The study as the file holds it. */
  base: Study;
  caseId: string;
  role: CaseRole;
  hoursPerDay: number;
  solved: SolvedCase;
  pccBuses: ReadonlySet<string>;
  /** Ids of banks and filters in service. */
  correction: ReadonlySet<string>;
  presence: PresenceThresholds;
  /** The same case with every bank and filter out; null where there is none or it has no solution. */
  without(): SolvedCase | null;
  /** The case with these parts out of service. */
  solveWithout(without: ReadonlySet<string>): CaseSolution;
  /** The case under the supply's distortion alone: converters keep their power and filters, not their spectra. */
  solveBackground(without: ReadonlySet<string>): CaseSolution;
  /** Fundamental impedance of the network alone (sources and series parts) at a busbar, ohm; null without a source. */
  networkOhm(bus: string): { re: number; im: number } | null;
  /** The same with loads and motors, every coupler closed; the correction left out. */
  coupledOhm(bus: string): { re: number; im: number } | null;
  scan(span: ScanSpan, without?: ReadonlySet<string>, steps?: ReadonlyMap<string, number>): ImpedanceScan;
  /** Largest active power into the site at a PCC over all cases, kW; null when only this case is known. */
  largestKW(bus: string): number | null;
}
