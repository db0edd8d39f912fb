/**
 * Crest of the current of a capacitor switched alone onto a busbar, amperes:
 * Î = U·√(2/3)/√(Xc·(Xs + X_L)), which for a plain bank is √2·I_N·√(S_sc/Q) and for a detuned one
 * √(2·Xc/(Xs + X_L))·I_N. Line-to-line volts, star-equivalent ohm at the fundamental; damping left out.
 * IEC 60831-1 annex (from memory).
 */
export function isolatedPeakA(volts: number, xcOhm: number, xsOhm: number, xlOhm = 0): number {
  if (!(xcOhm > 0 && xsOhm + xlOhm > 0))
    throw new RangeError(`Xc ${xcOhm} Ω, Xs + X_L ${xsOhm + xlOhm} Ω: both must be above 0`);
  return (volts * Math.sqrt(2 / 3)) / Math.sqrt(xcOhm * (xsOhm + xlOhm));
}

/**
 * Crest when a plain bank is switched beside one already on, amperes: Î = U·√(2/3)·√(C_eq/L), C_eq the two
 * star-equivalent capacitances in series (farad), L the inductance between them per phase (henry).
 */
export function backToBackPeakA(volts: number, equivalentF: number, henry: number): number {
  if (!(equivalentF > 0 && henry > 0))
    throw new RangeError(`C ${equivalentF} F, L ${henry} H: both must be above 0`);
  return volts * Math.sqrt(2 / 3) * Math.sqrt(equivalentF / henry);
}

/** Inductance per phase between the banks that holds the back-to-back crest to peakA, henry. */
export function neededHenry(volts: number, equivalentF: number, peakA: number): number {
  if (!(peakA > 0)) throw new RangeError(`peak ${peakA} A: above 0 is needed`);
  return equivalentF * ((volts * Math.sqrt(2 / 3)) / peakA) ** 2;
}
