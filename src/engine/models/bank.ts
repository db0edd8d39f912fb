import type { Skin } from '../../study/index.ts';
import { type PartLaw, writeInverse, writeZeroSequence } from './PartLaw.ts';
import { skinFactor } from './skinFactor.ts';

export interface BankData {
  steps: readonly { kvar: number; on?: boolean }[];
  ratedV: number;
  detuningPercent: number;
  reactorQ: number;
  reactorSkin: Skin;
  lossWPerKvar: number;
  connection: 'delta' | 'star-earthed' | 'star';
}

/** Rated kvar of the steps that are on. */
export function bankKvar(steps: BankData['steps']): number {
  return steps.reduce((sum, step) => ((step.on ?? true) ? sum + step.kvar : sum), 0);
}

/**
 * Capacitor bank, plain or detuned, star-equivalent: Xc = U_N²/Q_N, Rc = loss·Xc, XL = p·Xc,
 * RL = XL/reactorQ, Z(h) = Rc + RL(h) + j(h·XL − Xc/h), y1 = y2 = 1/Z; y0 only star-earthed.
 * RangeError without a step on: such a bank is no part of the network.
 */
export function bankLaw(data: BankData): PartLaw {
  const kvar = bankKvar(data.steps);
  if (!(kvar > 0)) throw new RangeError(`a bank of ${kvar} kvar on has no admittance; it must be above 0`);
  const xc = (data.ratedV * data.ratedV) / (kvar * 1e3);
  const rc = (data.lossWPerKvar / 1e3) * xc;
  const xl = (data.detuningPercent / 100) * xc;
  const rl = xl / data.reactorQ;
  const joinsZero = data.connection === 'star-earthed';
  const skin = data.reactorSkin;
  return (h, out, at) => {
    writeInverse(rc + rl * skinFactor(h, skin), h * xl - xc / h, out, at + 2);
    writeZeroSequence(joinsZero, out, at);
  };
}
