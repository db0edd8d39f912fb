import { type PartLaw, writeInverse } from './PartLaw.ts';

export interface MotorData {
  ratedKW: number;
  count: number;
  loadPercent: number;
  efficiency: number;
  powerFactor: number;
  lockedRotorRatio: number;
  lockedRotorPowerFactor: number;
}

/** P of the running motors, watts: ratedKW·count·loadPercent/100/efficiency. */
export function motorPower(data: MotorData): number {
  return (data.ratedKW * 1e3 * data.count * data.loadPercent) / 100 / data.efficiency;
}

/**
 * Locked-rotor admittance 1/(R·√h + jhX) of the motors together in positive and negative sequence, zero
 * sequence open: |Z| = U²/(S·ratio), S = ratedKW·count/(efficiency·powerFactor), R = |Z|·pf.
 * At the fundamental only its negative sequence counts, the positive one being constant power.
 */
export function motorLaw(data: MotorData, nominalV: number): PartLaw {
  const va = (data.ratedKW * 1e3 * data.count) / (data.efficiency * data.powerFactor);
  const ohm = (nominalV * nominalV) / (va * data.lockedRotorRatio);
  const resistance = ohm * data.lockedRotorPowerFactor;
  const reactance = Math.sqrt(ohm * ohm - resistance * resistance);
  return (h, out, at) => {
    out[at] = 0;
    out[at + 1] = 0;
    writeInverse(resistance * Math.sqrt(h), h * reactance, out, at + 2);
  };
}
