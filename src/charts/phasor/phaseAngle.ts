import { fixedNumber } from '../figure/quantityParts.ts';
import { angleDeg, magnitude, type ThreePhasors } from './phasorSpectrum.ts';

/** The angle by which a phase's current lags its voltage. */
export interface PhaseAngle {
  /** Phase index 0…2. */
  phase: number;
  /** φ = ∠V − ∠I in degrees, (−180, 180]; positive is lagging. */
  phiDeg: number;
}

const NOTHING = 1e-9;

/**
 * φ = ∠V − ∠I of L1, or of the phase with the largest current when L1 carries next to none (a
 * single-phase part). null without a voltage or a current.
 */
export function phaseAngle(voltage: ThreePhasors | null, current: ThreePhasors | null): PhaseAngle | null {
  if (!voltage || !current) return null;
  const currents = current.map(magnitude);
  const largest = Math.max(...currents);
  if (largest <= NOTHING) return null;
  const phase = (currents[0] ?? 0) > 0.01 * largest ? 0 : currents.indexOf(largest);
  const v = voltage[phase];
  const i = current[phase];
  if (!v || !i || magnitude(v) <= NOTHING) return null;
  return { phase, phiDeg: wrapped(angleDeg(v) - angleDeg(i)) };
}

function wrapped(degrees: number): number {
  const turned = degrees % 360;
  if (turned > 180) return turned - 360;
  return turned <= -180 ? turned + 360 : turned;
}

/** "φ 34° lagging", "φ 2° leading", "φ 0°, in phase"; beyond a quarter turn the part feeds in. */
export function phaseAngleWords(angle: PhaseAngle, decimals = 0): string {
  const size = fixedNumber(Math.abs(angle.phiDeg), decimals);
  if (Number(size) === 0) return 'φ 0°, in phase';
  const side = angle.phiDeg > 0 ? 'lagging' : 'leading';
  return Math.abs(angle.phiDeg) > 90 ? `φ ${size}° ${side}, feeding in` : `φ ${size}° ${side}`;
}
