import { withDefaults } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { bankAdmittance } from './correctionBranch.ts';
import { figure, ordinal } from './figure.ts';
import { judgedOnce } from './judgedOnce.ts';
import { capacitorCurrentLimit } from './limits/capacitorLimit.ts';
import { capacitorSetFor } from './limits/choice.ts';
import { iec61000x2x2, iec61000x2x12 } from './limits/iec61000-2-2.ts';
import { limitsByOrder, type OrderLimit } from './limits/limitsByOrder.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { partRow } from './partRow.ts';
import type { Verdict } from './types.ts';
import { judged, unknown } from './verdict.ts';

/** The compatibility levels together exceed this THD; as a set they are scaled to it. */
const THD_PERCENT = 8;
/** Above the 25th public networks seldom carry enough to count (common practice). */
const LAST_ORDER = 25;

interface OrderShare {
  h: number;
  /** I_h/I_1 at the level alone. */
  ratio: number;
}

/** Worst of: each order alone at its compatibility level; the set scaled to THD 8 %. As I_rms/I_1. */
export function backgroundShares(
  perOrder: (h: number) => number,
  levels: readonly Pick<OrderLimit, 'h' | 'value'>[],
  carried: (h: number) => boolean,
): { alone: OrderShare; aloneRms: number; setRms: number } {
  const thd = Math.sqrt(levels.reduce((sum, { value }) => sum + value ** 2, 0));
  const scale = Math.min(1, THD_PERCENT / thd);
  let alone: OrderShare = { h: 0, ratio: 0 };
  let squares = 0;
  for (const { h, value } of levels) {
    if (!carried(h)) continue;
    const ratio = (value / 100) * perOrder(h);
    squares += (scale * ratio) ** 2;
    if (ratio > alone.ratio) alone = { h, ratio };
  }
  return { alone, aloneRms: Math.hypot(1, alone.ratio), setRms: Math.sqrt(1 + squares) };
}

/**
 * Bank current from supply distortion alone (background): each order at its compatibility level
 * (IEC 61000-2-2, above 1 kV -2-12) to the 25th, then all of them scaled to THD 8 %, at the bank's own terminals:
 * I_h/I_1 = u_h·(1 − p)/|h·p − 1/h|, losses counted. Limit as bank-current. Judged once: it depends on the
 * bank alone. Triplens meet a star-earthed bank only.
 */
export function backgroundDuty(context: CheckContext): Verdict[] {
  return liveBanks(context).flatMap((live) =>
    judgedOnce(context, live.bank.id) ? [atBank(context, live)] : [],
  );
}

function atBank(context: CheckContext, { bank, bus, p }: LiveBank): Verdict {
  const choice = capacitorSetFor(context.study, bank);
  const limit = 'set' in choice ? capacitorCurrentLimit(choice.set) : null;
  const row = partRow(context, bank.id, {
    check: 'background',
    title: 'bank current from supply distortion',
    unit: 'p.u.',
  });
  const set = bus.nominalV <= 1000 ? iec61000x2x2 : iec61000x2x12;
  const levels = limitsByOrder(set, bus.nominalV).flatMap((level) =>
    level && level.h <= LAST_ORDER ? [level] : [],
  );
  if (!limit || levels.length === 0) {
    const missing = limit
      ? `there are no compatibility levels at ${figure(bus.nominalV)} V: ask the network operator for the distortion to expect`
      : 'the chosen capacitor set holds no limit of the current; choose another set';
    return unknown(row, missing);
  }
  const admittance = bankAdmittance(bank, bus, 1);
  const size = (h: number): number => Math.hypot(admittance(h).re, admittance(h).im);
  const earthed = withDefaults(bank, bus).connection === 'star-earthed';
  const found = backgroundShares(
    (h) => size(h) / size(1),
    levels,
    (h) => earthed || h % 3 !== 0,
  );
  const fundamental = bus.nominalV / bank.ratedV / (1 - p);
  const value = fundamental * Math.max(found.aloneRms, found.setRms);
  return judged({
    ...row,
    value,
    limit: limit.value,
    source: limit.source,
    working: [
      {
        equation: 'I_h / I_1 = u_h · (1 − p) / |h · p − 1/h|, each order alone',
        numbers: `largest at the ${ordinal(found.alone.h)}: ${figure(found.alone.ratio, 3)}, so I_rms/I_1 = ${figure(found.aloneRms)}`,
      },
      {
        equation: `all orders, scaled to THD ${THD_PERCENT} %`,
        numbers: `I_rms/I_1 = ${figure(found.setRms)}`,
      },
      {
        equation: 'I_rms / I_N = I_rms/I_1 · (U/U_N) / (1 − p)',
        numbers: `${figure(Math.max(found.aloneRms, found.setRms))} · ${figure(fundamental)} = ${figure(value)}`,
      },
    ],
    remarks: [
      `Levels of ${set.document} taken at the bank's own terminals; the site's own distortion is judged by bank-current.`,
    ],
    mend: 'Choose capacitors of a higher rated voltage, or a detuning that draws less of the order named.',
  });
}
