import { type PartLaw, writeZeroSequence } from './PartLaw.ts';

/** kvar of a load or converter from kW and power factor: |P|·tan(acos pf), negative when leading. */
export function reactivePower(active: number, powerFactor: number, leading: boolean): number {
  const size = Math.abs(active) * Math.tan(Math.acos(powerFactor));
  return leading ? -size : size;
}

/**
 * Load admittance G + jB from its nominal voltage: G = P/U², B = −Q/(U²·h) for Q > 0 and |Q|·h/U² for
 * Q < 0; P, Q in W and var. `volts` is line-to-line for three-phase and pair loads, phase-to-neutral for
 * a single phase. Three-phase: y0 = y1 with a neutral, else open. Used at the fundamental by constant
 * impedance loads, at every harmonic by all.
 */
export function loadLaw(active: number, reactive: number, volts: number, neutral: boolean): PartLaw {
  const conductance = active / (volts * volts);
  const susceptance = -reactive / (volts * volts);
  return (h, out, at) => {
    out[at + 2] = conductance;
    out[at + 3] = susceptance < 0 ? susceptance / h : susceptance * h;
    writeZeroSequence(neutral, out, at);
  };
}
