/** What the capacitor of one unit sees, per star-equivalent phase or delta branch. */
export interface CapacitorDuty {
  /** Rated current in the line, amperes. */
  ratedA: number;
  rmsA: number;
  /** Capacitor volts, line-to-line equivalent. */
  rmsV: number;
  /** Σ U_C,h: line-to-line rms equivalent of the crest when all crests coincide. */
  peakV: number;
  fundamentalV: number;
  ratedV: number;
  /** Σ_h √3·U_C,h·I_h, kvar of the three-phase set at this unit's duty. */
  kvarSum: number;
  /** √3·U_C,rms·I_rms, the conservative convention. */
  kvarProduct: number;
  ratedKvar: number;
}

/**
 * Duty from the branch current: U_C,h = √3·I_h·Xc/h (line-to-line equivalent), I_N = Q_N/(√3·U_N).
 * amperes[h − 1] rms in the line (or √3 times the delta branch); xcOhm per star-equivalent phase at the
 * fundamental, as it really is: with tolerance, ageing and frequency. `ratedKvar` is the nameplate's; left
 * out, U_N²/Xc. Holds behind a detuning reactor too, as the branch's own current is used.
 */
export function capacitorDuty(
  amperes: ArrayLike<number>,
  xcOhm: number,
  ratedV: number,
  ratedKvar = ratedV ** 2 / xcOhm / 1000,
): CapacitorDuty {
  if (!(xcOhm > 0 && ratedV > 0 && ratedKvar > 0))
    throw new RangeError(`Xc ${xcOhm} Ω, U_N ${ratedV} V, Q_N ${ratedKvar} kvar: all must be above 0`);
  const root3 = Math.sqrt(3);
  let squaresA = 0;
  let squaresV = 0;
  let peakV = 0;
  let kvarSum = 0;
  for (let h = 1; h <= amperes.length; h++) {
    const a = amperes[h - 1] ?? 0;
    const v = (root3 * a * xcOhm) / h;
    squaresA += a * a;
    squaresV += v * v;
    peakV += v;
    kvarSum += (root3 * v * a) / 1000;
  }
  return {
    ratedA: (ratedKvar * 1000) / (root3 * ratedV),
    rmsA: Math.sqrt(squaresA),
    rmsV: Math.sqrt(squaresV),
    peakV,
    fundamentalV: root3 * (amperes[0] ?? 0) * xcOhm,
    ratedV,
    kvarSum,
    kvarProduct: (root3 * Math.sqrt(squaresV) * Math.sqrt(squaresA)) / 1000,
    ratedKvar,
  };
}
