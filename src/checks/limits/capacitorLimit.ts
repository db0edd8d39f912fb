import { iec60831x1, ieee18 } from './capacitorSets.ts';
import type { CapacitorVoltageRow, DischargeRow, LimitSet } from './types.ts';
import { citation, type Limit } from './voltageLimit.ts';

/**
 * Allowed U_C,rms/U_N for a state that lasts hoursPerDay: the row of the shortest duration that still
 * covers it. null where the set holds no capacitor limits.
 */
export function capacitorVoltageLimit(
  set: LimitSet,
  hoursPerDay: number,
): (Limit & { row: CapacitorVoltageRow }) | null {
  const voltage = set.capacitor?.voltage;
  const row = voltage?.rows
    .filter((candidate) => hoursPerDay <= candidate.upToHours * (1 + 1e-9))
    .sort((a, b) => a.upToHours - b.upToHours)[0];
  return voltage && row ? { value: row.ratio, source: citation(set, voltage), row } : null;
}

/** Allowed I_rms/I_N; null where the set holds no capacitor limits. */
export function capacitorCurrentLimit(set: LimitSet): Limit | null {
  const cited = set.capacitor?.currentRatio;
  return cited ? { value: cited.value, source: citation(set, cited) } : null;
}

/** Allowed crest, per unit of √2·U_N. Documents that are silent borrow IEEE 18, named in the source. */
export function capacitorPeakLimit(set: LimitSet): Limit | null {
  const own = set.capacitor?.peakRatio;
  if (own) return { value: own.value, source: citation(set, own) };
  return set === ieee18 || !ieee18.capacitor ? null : capacitorPeakLimit(ieee18);
}

/** Allowed operating kvar, per unit of Q_N. Documents that are silent borrow IEEE 18. */
export function capacitorKvarLimit(set: LimitSet): Limit | null {
  const own = set.capacitor?.kvarRatio;
  if (own) return { value: own.value, source: citation(set, own) };
  return set === ieee18 || !ieee18.capacitor ? null : capacitorKvarLimit(ieee18);
}

/** Residual voltage and time after disconnection of a capacitor of this rated voltage; null without limits. */
export function dischargeLimit(set: LimitSet, ratedV: number): (DischargeRow & Pick<Limit, 'source'>) | null {
  const discharge = set.capacitor?.discharge;
  const row = discharge?.rows.find(({ upToV }) => upToV === undefined || ratedV <= upToV);
  return discharge && row ? { ...row, source: citation(set, discharge) } : null;
}

/** Peak of the inrush current over I_N. Documents that are silent borrow IEC 60831-1, named in the source. */
export function inrushLimit(set: LimitSet): Limit | null {
  const own = set.capacitor?.inrushRatio;
  if (own) return { value: own.value, source: citation(set, own) };
  return set === iec60831x1 || !iec60831x1.capacitor ? null : inrushLimit(iec60831x1);
}
