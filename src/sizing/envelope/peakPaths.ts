import { type Dimension, type DimensionKind, isSwitch, type Point } from '../tolerance/Dimension.ts';

/**
 * Which end of an axis lowers the order of a parallel resonance: more capacitance, more inductance anywhere, a
 * weaker supply, a frequency above the rated one. Voltage and background leave it where it is.
 */
const lowering: Readonly<Record<DimensionKind, 'low' | 'high' | null>> = {
  capacitance: 'high',
  inductance: 'high',
  'transformer-impedance': 'high',
  'fault-level': 'low',
  frequency: 'high',
  'supply-voltage': null,
  background: null,
  motors: null,
};

/**
 * Points of the tolerance space along which every peak goes from its lowest order to its highest, in equal
 * steps from the corner that lowers it on all axes at once to the opposite one: one row with motors running
 * and, where they may stand still, one without.
 */
export function peakPaths(dimensions: readonly Dimension[], steps: number): Point[][] {
  const running = Array.from({ length: steps + 1 }, (_, step) =>
    Float64Array.from(dimensions, ({ kind, low, high }) => {
      const end = lowering[kind];
      if (end === null) return 1;
      const from = end === 'low' ? low : high;
      const to = end === 'low' ? high : low;
      return from + ((to - from) * step) / steps;
    }),
  );
  const motors = dimensions.findIndex(isSwitch);
  if (motors < 0) return [running];
  return [running, running.map((point) => point.map((factor, k) => (k === motors ? 0 : factor)))];
}
