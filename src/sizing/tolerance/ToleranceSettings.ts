import type { DimensionKind } from './Dimension.ts';

/** Which dimensions are searched, and how wide those are that no part's own data state. */
export interface ToleranceSettings {
  /** Left out: as in `defaultTolerances`. */
  on: Readonly<Record<DimensionKind, boolean>>;
  /** ± per cent of uk where it is not tested. IEC 60076-1: ±10 % (from memory). */
  ukPercent: number;
  /** ± per cent of the supply's voltage. */
  supplyVoltagePercent: number;
  /** ± per cent on the grid, common practice. */
  gridFrequencyPercent: number;
  /** ± per cent on generators, common practice. */
  generatorFrequencyPercent: number;
  /** Capacitance lost by ageing where the bank states none, per cent. */
  ageingPercent: number;
}

/** The supply's voltage is off: its band belongs to the operator, and checks raise capacitors to the highest. */
export const defaultTolerances: ToleranceSettings = {
  on: {
    capacitance: true,
    inductance: true,
    'transformer-impedance': true,
    'fault-level': true,
    'supply-voltage': false,
    frequency: true,
    background: true,
    motors: true,
  },
  ukPercent: 10,
  supplyVoltagePercent: 5,
  gridFrequencyPercent: 1,
  generatorFrequencyPercent: 2.5,
  ageingPercent: 5,
};
