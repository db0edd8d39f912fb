import type { Bank } from '../study/index.ts';
import { busById, isOn, nameOf, withDefaults } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { capacitorVerdicts } from './capacitorVerdicts.ts';
import { bankAdmittance, bankXc, kvarOn } from './correctionBranch.ts';
import { commonPractice } from './source.ts';
import type { Verdict } from './types.ts';
import { unitAmperes } from './unitAmperes.ts';
import { type Row, unknown } from './verdict.ts';

const checks = { current: 'bank-current', voltage: 'bank-voltage', kvar: 'bank-kvar' } as const;

/**
 * Duty of every bank in service with at least one step on (bank-current, bank-voltage with its crest,
 * bank-kvar), from the bank's own branch current and Xc; so it holds behind a detuning reactor as well.
 */
export function bankDuty(context: CheckContext): Verdict[] {
  return context.study.elements.flatMap((part) =>
    part.kind === 'bank' && isOn(part) ? atBank(context, part) : [],
  );
}

function atBank(context: CheckContext, bank: Bank): Verdict[] {
  const real = context.actual(bank);
  const xcOhm = bankXc(real);
  if (xcOhm === null) return [];
  const { frequencyFactor } = context;
  const terminal = context.solved.terminal(bank.id, bank.bus);
  if (terminal === undefined || !context.solved.energised(bank.bus)) return [dead(context, bank)];
  const bus = busById(context.study, bank.bus);
  if (!bus) throw new RangeError(`the study has no busbar "${bank.bus}"`);
  const branch = bankAdmittance(real, bus, kvarOn(real));
  const connection = withDefaults(bank, context.study).connection;
  return capacitorVerdicts(context, context.study, {
    id: bank.id,
    words: 'bank',
    checks,
    xcOhm: xcOhm / frequencyFactor,
    ratedKvar: kvarOn(bank),
    ratedV: bank.ratedV,
    amperes: unitAmperes(context.solved, {
      terminal,
      bus: bank.bus,
      connection,
      admittance(h) {
        const { re, im } = branch(h * frequencyFactor);
        return Math.hypot(re, im);
      },
    }),
    orderCount: context.solved.maxOrder,
  });
}

function dead(context: CheckContext, bank: Bank): Verdict {
  const row: Row = {
    check: 'bank-current',
    title: 'bank current',
    subject: { kind: 'element', id: bank.id },
    caseId: context.caseId,
    unit: 'p.u.',
    source: commonPractice,
    working: [],
  };
  return unknown(row, `the busbar of ${nameOf(bank)} has no path to a source in this case`);
}
