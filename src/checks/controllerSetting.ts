import { nameOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import { judgedOnce } from './judgedOnce.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { partRow } from './partRow.ts';
import type { Verdict } from './types.ts';
import { judged, unknown } from './verdict.ts';

/** Share of the smallest step's current below which the customary setting starts (common practice). */
const SHARE = 0.65;

/** C/k = Q_step/(√3·U·k_CT): secondary amperes of a step, Q in var at the busbar's voltage. */
export function stepCurrent(kvar: number, volts: number, kCT: number): number {
  if (!(volts > 0 && kCT > 0)) throw new RangeError(`${volts} V, k_CT ${kCT}: both must be above 0`);
  return (kvar * 1000) / (Math.sqrt(3) * volts * kCT);
}

/**
 * Response threshold of a bank's controller (controller): at least 0.65·Q_step/(√3·U·k_CT) of the smallest
 * step; below half a step it hunts, switching the same step in and out. Judged once; nothing is said of a
 * bank whose study holds no controller.
 */
export function controllerSetting(context: CheckContext): Verdict[] {
  return liveBanks(context).flatMap((live) =>
    live.bank.controller !== undefined && judgedOnce(context, live.bank.id) ? [atBank(context, live)] : [],
  );
}

function atBank(context: CheckContext, { bank, bus, p }: LiveBank): Verdict {
  const { kCT, threshold } = bank.controller ?? {};
  const row = partRow(context, bank.id, { check: 'controller', title: 'controller threshold', unit: 'A' });
  const smallest = Math.min(...bank.steps.map(({ kvar }) => kvar));
  const atBus = (smallest * (bus.nominalV / bank.ratedV) ** 2) / (1 - p);
  const absent = [
    kCT === undefined ? 'the current transformer ratio' : '',
    threshold === undefined ? 'the response threshold' : '',
  ].filter((words) => words !== '');
  if (kCT === undefined || threshold === undefined)
    return unknown(row, `enter ${absent.join(' and ')} of the controller of ${nameOf(bank)}`);
  const step = stepCurrent(atBus, bus.nominalV, kCT);
  const remarks =
    threshold > step
      ? [
          `The threshold exceeds the current of the smallest step (${figure(step)} A): that step comes in late.`,
        ]
      : [];
  return judged({
    ...row,
    value: threshold,
    limit: SHARE * step,
    sense: 'lower',
    // The customary setting is 0.65 to 0.70 of a step: it lies on the limit and is no cause for watching.
    watchBelow: 0,
    working: [
      {
        equation: 'C/k = Q_step / (√3 · U · k_CT), threshold at least 0.65 of it',
        numbers: `${figure(atBus)} kvar / (√3 · ${figure(bus.nominalV)} V · ${figure(kCT)}) = ${figure(step)} A; 0.65 of it ${figure(SHARE * step)} A, set ${figure(threshold)} A`,
      },
    ],
    remarks,
    mend: `Set the threshold to ${figure(SHARE * step, 3)} to ${figure(0.7 * step, 3)} A; below half a step the controller hunts.`,
  });
}
