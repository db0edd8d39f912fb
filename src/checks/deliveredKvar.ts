import type { Bank, Bus, Filter } from '../study/index.ts';
import { busById, nameOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { kvarOn } from './correctionBranch.ts';
import { figure } from './figure.ts';
import { inflowAt } from './inflow.ts';
import { partRow } from './partRow.ts';
import { meteredBusesOf } from './pcc.ts';
import type { Verdict } from './types.ts';
import { judged, keptQuietly, unknown } from './verdict.ts';

/** Kvar a capacitor of rated kvar at ratedV gives at a busbar of `volts`, behind p = X_L/X_C: Q_N·(U/U_N)²/(1−p). */
export function kvarGiven(kvar: number, ratedV: number, volts: number, p: number): number {
  if (!(p >= 0 && p < 1)) throw new RangeError(`p ${p}: from 0 to below 1 is possible`);
  if (!(ratedV > 0)) throw new RangeError(`rated voltage ${ratedV} V: above 0 is needed`);
  return (kvar * (volts / ratedV) ** 2) / (1 - p);
}

/** √(Σ U_k²): the line-to-line equivalent of the three phases at the fundamental, volts. */
function lineVolts(context: CheckContext, bus: Bus): number {
  const index = context.solved.bus(bus.id);
  return Math.sqrt([0, 1, 2].reduce((sum, k) => sum + context.solved.volts(index, 1, k) ** 2, 0));
}

interface Given {
  part: Bank | Filter;
  bus: Bus;
  volts: number;
  kvar: number;
}

function givenBy(context: CheckContext): Given[] {
  return context.study.elements.flatMap((part) => {
    if ((part.kind !== 'bank' && part.kind !== 'filter') || !context.correction.has(part.id)) return [];
    const bus = busById(context.study, part.bus);
    if (!bus || !context.solved.energised(bus.id)) return [];
    const volts = lineVolts(context, bus);
    const kvar =
      part.kind === 'bank'
        ? kvarGiven(kvarOn(part), part.ratedV, volts, (part.detuningPercent ?? 0) / 100)
        : kvarGiven(part.kvar, bus.nominalV, volts, 0);
    return kvar > 0 ? [{ part, bus, volts, kvar }] : [];
  });
}

/**
 * What each bank gives at its busbar, Q_N·(U/U_N)²/(1−p), against what the target power factor still needs
 * of it: Q − P·tan φ without the correction, less what the other banks and filters give (delivered-kvar).
 * First order: the kvar saved upstream are left out. Load cases only; nothing is said of a feeding-in site.
 */
export function deliveredKvar(context: CheckContext): Verdict[] {
  const { study } = context;
  if (context.role !== 'load' || context.correction.size === 0) return [];
  const given = givenBy(context);
  const total = given.reduce((sum, { kvar }) => sum + kvar, 0);
  const target = study.criteria?.targetPF ?? 0.95;
  const need = needed(context, Math.sqrt(1 / target ** 2 - 1));
  if (need === 'exports') return [];
  return given.flatMap((item) =>
    item.part.kind === 'bank' ? [atBank(context, item, item.part, need, total - item.kvar, target)] : [],
  );
}

/** Kvar the target needs over all metered busbars; null where the case without the correction says nothing. */
function needed(context: CheckContext, tan: number): number | null | 'exports' {
  const without = context.without();
  if (!without) return null;
  const inflows = meteredBusesOf(context.study, context.pccBuses).map((bus) =>
    inflowAt(context.study, without, bus),
  );
  let kvar = 0;
  for (const inflow of inflows) {
    if (!inflow) return null;
    if (inflow.kW <= 0) return 'exports';
    kvar += inflow.kvar - inflow.kW * tan;
  }
  return kvar;
}

function atBank(
  context: CheckContext,
  { volts, kvar }: Given,
  bank: Bank,
  need: number | null,
  others: number,
  target: number,
): Verdict {
  const p = (bank.detuningPercent ?? 0) / 100;
  const row = partRow(context, bank.id, { check: 'delivered-kvar', title: 'kvar delivered', unit: 'kvar' });
  row.working.push({
    equation: 'Q = Q_N · (U/U_N)² / (1 − p)',
    numbers: `${figure(kvarOn(bank))} kvar · (${figure(volts)} V / ${figure(bank.ratedV)} V)² / (1 − ${figure(p)}) = ${figure(kvar)} kvar`,
  });
  if (need === null) {
    const missing = `the case without the correction has no solution, so what the target needs of ${nameOf(bank)} is not known`;
    return unknown(row, missing, kvar);
  }
  row.working.push({
    equation: 'Q_needed = Q − P · tan φ2 without the correction, less what other correction gives',
    numbers: `${figure(need)} kvar − ${figure(others)} kvar = ${figure(need - others)} kvar for cos φ ${figure(target)}`,
  });
  const limit = need - others;
  if (limit <= 0) return keptQuietly(row, 'The target is met without this bank in this case.', kvar, null);
  return judged({
    ...row,
    value: kvar,
    limit,
    sense: 'lower',
    mend: `Switch in or add ${figure(Math.max(0, limit - kvar), 3)} kvar at the busbar; a capacitor rated above the busbar's voltage gives less there than its nameplate.`,
  });
}
