import type { Bus } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { angleRemarks, thdPercent, unknownAngleOrders } from './distortion.ts';
import { figure } from './figure.ts';
import { type Choice, voltageSetFor } from './limits/choice.ts';
import { thdLimit } from './limits/voltageLimit.ts';
import { margin, verdictWord } from './margin.ts';
import { noLimitSet } from './source.ts';
import type { Source, Verdict } from './types.ts';
import { judged, type Row, unknown } from './verdict.ts';

/**
 * Total harmonic distortion of the voltage, one verdict a busbar, worst phase (bus-thd). A busbar without a
 * path to a source is left to bus-voltage, which says so once.
 */
export function busThd(context: CheckContext): Verdict[] {
  return context.study.buses.flatMap((bus) =>
    context.solved.energised(bus.id) ? [atBus(context, bus)] : [],
  );
}

/** What stands in for a source where no set speaks. */
export function namedSource(choice: Choice): Source {
  return 'set' in choice
    ? { document: choice.set.document, edition: choice.set.edition, provenance: 'memory' }
    : noLimitSet;
}

/** IEEE 519 judges the PCC; away from it the row informs like a screening rule. */
export function informsOnly(choice: Choice, isPcc: boolean): boolean {
  return 'set' in choice && choice.set.voltage?.pccOnly === true && !isPcc;
}

export const informsRemark =
  'This document judges the point of common coupling; at this busbar it only informs.';

function atBus(context: CheckContext, bus: Bus): Verdict {
  const isPcc = context.pccBuses.has(bus.id);
  const choice = voltageSetFor(context.study, isPcc);
  const row: Row = {
    check: 'bus-thd',
    title: 'voltage distortion (THD)',
    subject: { kind: 'bus', id: bus.id },
    caseId: context.caseId,
    unit: '%',
    source: namedSource(choice),
    working: [],
  };
  const limit = 'set' in choice ? thdLimit(choice.set, bus.nominalV) : null;
  const thd = thdPercent(context.solved, bus, limit?.toOrder ?? context.solved.maxOrder);
  if (!thd) return unknown(row, 'the busbar carries no fundamental voltage');
  if (!limit) return unknown(row, noLimitWords(choice, bus), thd.percent);
  const toOrder = Math.min(limit.toOrder, context.solved.maxOrder);
  const screening = informsOnly(choice, isPcc);
  return judged({
    ...row,
    ...beforeCorrection(context, bus, limit, screening),
    source: limit.source,
    value: thd.percent,
    limit: limit.value,
    screening,
    working: () => [
      {
        equation: `THD = √(Σ U_h²) / U_1, h = 2 to ${toOrder}`,
        numbers: `L${thd.phase + 1}: ${figure(thd.harmonicV)} V / ${figure(thd.fundamentalV)} V = ${figure(thd.percent)} %`,
      },
    ],
    remarks: () => [
      ...angleRemarks(context.solved, unknownAngleOrders(context.solved, bus)),
      ...(screening ? [informsRemark] : []),
    ],
    mend: () => mendWords(context, bus, thd.percent, limit.toOrder),
  });
}

/** Why a set gives no limit at a busbar. */
export function noLimitWords(choice: Choice, bus: Bus): string {
  if (!('set' in choice)) return choice.missing;
  return choice.set.voltage
    ? `${choice.set.label} has no harmonic limits at ${figure(bus.nominalV)} V; choose another set`
    : `${choice.set.label} holds no harmonic limits; choose another set`;
}

function mendWords(context: CheckContext, bus: Bus, percent: number, toOrder: number): string {
  const without = context.without();
  const before = without ? thdPercent(without, bus, toOrder)?.percent : undefined;
  return before !== undefined && before < percent
    ? `The correction raises it from ${figure(before, 3)} %: detune the bank below the lowest present order, or move its steps away from the resonance.`
    : 'Filter the lowest large order, fit chokes or higher pulse numbers at the converters, or stiffen the supply.';
}

function beforeCorrection(
  context: CheckContext,
  bus: Bus,
  limit: { value: number; toOrder: number },
  screening: boolean,
): Pick<Row, 'withoutCorrection'> {
  const without = context.without();
  const thd = without?.energised(bus.id) ? thdPercent(without, bus, limit.toOrder) : null;
  if (!thd) return {};
  return {
    withoutCorrection: {
      value: thd.percent,
      verdict: verdictWord(margin(thd.percent, limit.value), screening),
    },
  };
}
