import type { BankStep } from '../types.ts';
import { formatQuantity } from '../units/formatQuantity.ts';
import { type Typical, typicalOrigin } from './Typical.ts';
import { capacitorVoltsSource, typicalCapacitorV } from './typicalCapacitor.ts';
import { stepsSource, usualSplits } from './typicalSteps.ts';

export interface BankValues {
  detuningPercent: number;
  ratedV: number;
  steps?: BankStep[];
}

/** Detuning in %: plain, and the usual ones (7 % second-hand, the others common practice). */
export const usualDetunings: readonly number[] = [0, 5.67, 7, 14];

const detuningSource = 'usual detuning (common practice)';

/**
 * Detuning and the rated voltage the capacitors then need at a busbar of `nominalV`, with the steps given or
 * split into `count` equal ones of a usual size. Kvar count at the rated voltage: the sentence says what they
 * give at the busbar's, Q·(U/U_N)²/(1 − p).
 */
export function typicalBank(
  steps: readonly BankStep[],
  nominalV: number,
  detuningPercent: number,
  count?: number,
): Typical<BankValues> {
  const kvar = steps.reduce((sum, step) => sum + step.kvar, 0);
  const p = detuningPercent / 100;
  const ratedV = typicalCapacitorV(nominalV, 1 / (1 - p));
  const voltsSource = capacitorVoltsSource(p > 0 ? 'U/(1 − p)' : 'U');
  const split = usualSplits(kvar).find((one) => one.count === count);
  const delivered = (kvar * (nominalV / ratedV) ** 2) / (1 - p);
  return {
    ok: true,
    values: { detuningPercent, ratedV, ...(split ? { steps: equalSteps(split) } : {}) },
    origins: {
      detuningPercent: typicalOrigin(detuningSource),
      ratedV: typicalOrigin(voltsSource),
      ...(split ? { steps: typicalOrigin(stepsSource) } : {}),
    },
    source: `U_N: ${voltsSource}. Detuning: ${detuningSource}.${split ? ` Steps: ${stepsSource}.` : ''} ${formatQuantity(kvar, 'kvar')} rated at ${formatQuantity(ratedV, 'V')} give ${formatQuantity(delivered, 'kvar', { digits: 3 })} at ${formatQuantity(nominalV, 'V')}.`,
  };
}

function equalSteps({ count, kvar }: { count: number; kvar: number }): BankStep[] {
  return Array.from({ length: count }, () => ({ kvar }));
}
