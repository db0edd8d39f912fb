import type { Bank } from '../study/index.ts';
import { busById, nameOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { kvarOn } from './correctionBranch.ts';
import { figure } from './figure.ts';
import { galvanic } from './galvanic.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { partRow } from './partRow.ts';
import type { Verdict } from './types.ts';
import { judged, keptQuietly } from './verdict.ts';

/** Banks above this voltage are switched by the network or the site as a whole. */
const MEDIUM_VOLTAGE = 1000;
/** The larger bank's kvar over the smaller's from which the smaller can be carried away. */
const MUCH_LARGER = 10;
/** Nearness of the two LC frequencies, the smaller over the larger. */
const NEAR = 0.7;

/**
 * Screening (magnification): a plain low-voltage bank near a switched medium-voltage bank. Switching the large
 * one rings at √(Ssc/Q); where the small one with its transformer rings at nearly the same frequency its
 * voltage is raised far above the switching surge. Worst at equal frequencies and Q_MV ≫ Q_LV (McGranaghan
 * and others, IEEE Trans. Power Delivery 1992, from memory).
 */
export function magnification(context: CheckContext): Verdict[] {
  const banks = liveBanks(context);
  const large = banks.filter(({ bus }) => bus.nominalV > MEDIUM_VOLTAGE);
  const small = banks.filter(({ bus }) => bus.nominalV <= MEDIUM_VOLTAGE);
  return large.flatMap((mv) => small.flatMap((lv) => (lv.p > 0 ? [] : between(context, mv, lv))));
}

function between(context: CheckContext, mv: LiveBank, lv: LiveBank): Verdict[] {
  const xMv = context.networkOhm(mv.bus.id)?.im;
  const xLv = context.networkOhm(lv.bus.id)?.im;
  if (xMv === undefined || xLv === undefined) return [];
  if (galvanic(context.study, mv.bus.id).has(lv.bus.id)) return [];
  const ownX = xLv - xMv * (lv.bus.nominalV / mv.bus.nominalV) ** 2;
  const mvOrder = ringing(xMv, mv.bank);
  const lvOrder = ownX > 0 ? ringing(ownX, lv.bank) : null;
  if (lvOrder === null) return [];
  const nearness = Math.min(mvOrder, lvOrder) / Math.max(mvOrder, lvOrder);
  const ratio = kvarOn(mv.bank) / kvarOn(lv.bank);
  const row = partRow(context, lv.bank.id, {
    check: 'magnification',
    title: `surge from switching ${nameOf(mv.bank)}`,
    unit: '',
    part: mv.bank.id,
  });
  row.screening = true;
  row.remarks = ['Screening only: how high the surge rises needs a study of the switching.'];
  if (ratio < MUCH_LARGER)
    return [
      keptQuietly(row, `${nameOf(mv.bank)} is only ${figure(ratio, 2)} times as large.`, nearness, null),
    ];
  const place = nameOf(busById(context.study, lv.bus.id) ?? lv.bus);
  return [
    judged({
      ...row,
      value: nearness,
      limit: NEAR,
      working: () => [
        {
          equation:
            'LC frequencies √(X_c/X): the large bank on its network, the small one behind its transformer',
          numbers: `h ${figure(mvOrder, 3)} and ${figure(lvOrder, 3)}: ${figure(nearness, 2)}; ${figure(ratio, 3)} times the kvar`,
        },
      ],
      mend: `Switch ${nameOf(mv.bank)} at voltage zero or through resistors, or detune the bank at ${place}: its choke keeps the surge out.`,
    }),
  ];
}

/** Order at which a bank rings with a reactance at its busbar: √(X_c/X). */
const ringing = (reactance: number, bank: Bank): number =>
  Math.sqrt(bank.ratedV ** 2 / (kvarOn(bank) * 1000) / reactance);
