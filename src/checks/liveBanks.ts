import type { Bank, Bus } from '../study/index.ts';
import { busById, isOn } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { kvarOn } from './correctionBranch.ts';

/** A bank with a step on, on a busbar that has a source. */
export interface LiveBank {
  bank: Bank;
  bus: Bus;
  terminal: number;
  /** Rated kvar of the steps on. */
  kvar: number;
  /** p = X_L/X_C, 0 for a plain bank. */
  p: number;
}

/** Banks that work in this case. One on a dead busbar is spoken of by bank-current alone. */
export function liveBanks(context: CheckContext): LiveBank[] {
  return context.study.elements.flatMap((bank) => {
    if (bank.kind !== 'bank' || !isOn(bank)) return [];
    const bus = busById(context.study, bank.bus);
    const terminal = context.solved.terminal(bank.id, bank.bus);
    const kvar = kvarOn(bank);
    if (!bus || terminal === undefined || kvar <= 0 || !context.solved.energised(bus.id)) return [];
    return [{ bank, bus, terminal, kvar, p: (bank.detuningPercent ?? 0) / 100 }];
  });
}
