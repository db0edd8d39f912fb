import type { Bus, Cable, Study } from '../study/index.ts';
import { elementsAt, isOn, isSeries, nameOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import { judgedOnce } from './judgedOnce.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { partRow } from './partRow.ts';
import { commonPractice } from './source.ts';
import type { Source, Verdict } from './types.ts';
import { judged, unknown } from './verdict.ts';

const nec: Source = { document: 'NEC 460', clause: 'conductor rating', provenance: 'second-hand' };

/** Multiples of a bank's I_N for its conductors, and for its fuses, switch and contactor. */
interface FeederShares {
  conductor: number;
  gear: readonly [number, number];
  source: Source;
}

/** 1.35·I_N of conductor by NEC 460 at 60 Hz; else 1.43·I_N (1.3 by 1.1 of tolerance) as for the gear. */
export function feederShares(frequencyHz: 50 | 60): FeederShares {
  const gear = [1.43, 1.5] as const;
  return frequencyHz === 60
    ? { conductor: 1.35, gear, source: nec }
    : { conductor: 1.43, gear, source: commonPractice };
}

/**
 * Cable that feeds nothing but a bank (feeder): rated for 1.35·I_N (NEC 460, 60 Hz) or 1.43·I_N of all its
 * steps; the current of fuse and contactor is told beside. Judged once; nothing is said of a bank straight on
 * a board.
 */
export function feeder(context: CheckContext): Verdict[] {
  return liveBanks(context).flatMap((live) => {
    const cable = ownCable(context.study, live.bus, live.bank.id);
    return cable && judgedOnce(context, live.bank.id) ? [atBank(context, live, cable)] : [];
  });
}

function ownCable(study: Study, bus: Bus, bank: string): Cable | null {
  const others = elementsAt(study, bus.id).filter((part) => isOn(part) && part.id !== bank);
  const [only] = others;
  return others.length === 1 && only && isSeries(only) && only.kind === 'cable' ? only : null;
}

function atBank(context: CheckContext, { bank }: LiveBank, cable: Cable): Verdict {
  const { conductor, gear, source } = feederShares(context.study.frequencyHz);
  const kvar = bank.steps.reduce((sum, step) => sum + step.kvar, 0);
  const ratedA = (kvar * 1000) / (Math.sqrt(3) * bank.ratedV);
  const row = partRow(context, cable.id, {
    check: 'feeder',
    title: 'cable of the bank',
    unit: 'p.u.',
    source,
  });
  row.working.push({
    equation: `I_needed = ${figure(conductor)} · I_N of all steps`,
    numbers: `${figure(conductor)} · ${figure(ratedA)} A = ${figure(conductor * ratedA)} A`,
  });
  row.remarks = [
    `Fuses, switch and contactor for ${figure(gear[0] * ratedA, 3)} to ${figure(gear[1] * ratedA, 3)} A (common practice); local rules prevail.`,
  ];
  if (cable.ratedA === undefined)
    return unknown(
      row,
      `enter the rated current of ${nameOf(cable)}: at least ${figure(conductor * ratedA)} A`,
    );
  const value = (conductor * ratedA) / cable.ratedA;
  return judged({
    ...row,
    value,
    limit: 1,
    // The excess over I_N stands in the value already: a cable that just meets it is well chosen.
    watchBelow: 0,
    working: [
      ...row.working,
      {
        equation: 'I_needed / I_rated',
        numbers: `${figure(conductor * ratedA)} A / ${figure(cable.ratedA)} A = ${figure(value)}`,
      },
    ],
    mend: `Choose a cable of at least ${figure(conductor * ratedA)} A.`,
  });
}
