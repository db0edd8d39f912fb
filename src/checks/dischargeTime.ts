/**
 * Largest discharge resistor across a capacitor that brings √2·U_N to U_r within t seconds:
 * R = t/(C·ln(√2·U_N/U_r)), ohm; C in farad. IEC 60831-1 annex (from memory). RangeError where
 * √2·U_N does not exceed U_r.
 */
export function dischargeLimitOhm(seconds: number, farad: number, ratedV: number, residualV: number): number {
  const ratio = (Math.SQRT2 * ratedV) / residualV;
  if (!(ratio > 1))
    throw new RangeError(`√2·${ratedV} V does not exceed ${residualV} V: nothing to discharge`);
  return seconds / (farad * Math.log(ratio));
}

/** Seconds until √2·U_N has fallen to a share of U_N (0.1 at re-energising): R·C·ln(√2/share). */
export function dischargeSeconds(ohm: number, farad: number, shareOfRated = 0.1): number {
  if (!(ohm > 0 && farad > 0 && shareOfRated > 0))
    throw new RangeError(`R ${ohm} Ω, C ${farad} F, share ${shareOfRated}: all must be above 0`);
  return ohm * farad * Math.log(Math.SQRT2 / shareOfRated);
}
