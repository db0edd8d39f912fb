import type { BankStep } from '../types.ts';
import { type Typical, typicalOrigin } from './Typical.ts';

/** Step sizes in kvar, from the step column of a public table of controller settings; second-hand. */
export const stepSizes: readonly number[] = [2.5, 5, 7.5, 10, 12.5, 15, 20, 25, 30, 40, 50, 60, 75, 80];

export const stepsSource = 'usual step sizes, 2.5 to 80 kvar (second-hand)';
const fewest = 2;
const most = 12;
const favoured = 6;
const smallestKvar = 5;
const largestKvar = 960;

/** Equal steps of a usual size, 2 to 12 of them, that make up a bank of `kvar`; nearest to six first. */
export function usualSplits(kvar: number): { count: number; kvar: number }[] {
  return stepSizes
    .map((size) => ({ count: kvar / size, kvar: size }))
    .filter(({ count }) => Number.isInteger(count) && count >= fewest && count <= most)
    .toSorted((a, b) => Math.abs(a.count - favoured) - Math.abs(b.count - favoured));
}

/**
 * Equal steps of a usual size that make up a bank of `kvar`, as near to six of them as it goes; where no
 * usual size fits, six equal parts. The sum is always the bank's kvar. Refuses banks that no 2 to 12 usual
 * steps can make up.
 */
export function typicalSteps(kvar: number): Typical<{ steps: BankStep[] }> {
  if (!(kvar >= smallestKvar && kvar <= largestKvar))
    return {
      ok: false,
      error: `${kvar} kvar is no bank of ${fewest} to ${most} usual steps; allowed is ${smallestKvar} to ${largestKvar} kvar.`,
    };
  const split = usualSplits(kvar)[0];
  const count = split?.count ?? favoured;
  const words = split ? stepsSource : `${favoured} equal steps, no usual size fits (${stepsSource})`;
  return {
    ok: true,
    values: { steps: Array.from({ length: count }, () => ({ kvar: kvar / count })) },
    origins: { steps: typicalOrigin(words) },
    source: `Steps: ${words}.`,
  };
}
