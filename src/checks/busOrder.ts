import type { Bus } from '../study/index.ts';
import { busById } from '../study/index.ts';
import { informsOnly, informsRemark, namedSource, noLimitWords } from './busThd.ts';
import type { CheckContext } from './CheckContext.ts';
import { angleRemark, orderPercent } from './distortion.ts';
import { figure, ordinal } from './figure.ts';
import { voltageSetFor } from './limits/choice.ts';
import { margin, verdictWord, WATCH_MARGIN } from './margin.ts';
import { type OrderRow, orderRows } from './orderTable.ts';
import type { Source, Verdict, Working } from './types.ts';
import { judged, type Row, unknown } from './verdict.ts';

/**
 * Single harmonic voltages (bus-order): per busbar the order nearest to its limit, and every further order
 * that fails or is worth watching. The working lists all orders present.
 */
export function busOrder(context: CheckContext): Verdict[] {
  return context.study.buses.flatMap((bus) => atBus(context, bus));
}

interface JudgedOrder {
  h: number;
  percent: number;
  limit: number;
  source: Source;
  margin: number;
}

function judgeable(rows: readonly OrderRow[]): JudgedOrder[] {
  return rows
    .flatMap(({ h, percent, limit, source }) =>
      percent === null || limit === null || source === null
        ? []
        : [{ h, percent, limit, source, margin: margin(percent, limit) }],
    )
    .sort((a, b) => a.margin - b.margin || a.h - b.h);
}

function atBus(context: CheckContext, bus: Bus): Verdict[] {
  const isPcc = context.pccBuses.has(bus.id);
  const choice = voltageSetFor(context.study, isPcc);
  const row: Row = {
    check: 'bus-order',
    title: 'harmonic voltages by order',
    subject: { kind: 'bus', id: bus.id },
    caseId: context.caseId,
    unit: '%',
    source: namedSource(choice),
    working: [],
  };
  if (!context.solved.energised(bus.id))
    return [unknown(row, 'the busbar has no path to a source in this case')];
  const rows = orderRows(context.study, context.solved, bus.id, isPcc);
  const orders = judgeable(rows);
  const worst = orders[0];
  if (!worst) return [unknown(row, noLimitWords(choice, bus))];
  const screening = informsOnly(choice, isPcc);
  const shown = orders.filter((order, index) => index === 0 || order.margin < WATCH_MARGIN);
  const table = allOrders(orders);
  const silent = silentWords(rows);
  return shown.map((order) => {
    const remarks = [
      angleRemark(context.solved, context.solved.anglesUnknown(order.h) ? [order.h] : []),
      screening ? informsRemark : '',
      silent,
    ];
    return judged({
      ...row,
      ...beforeCorrection(context, bus, order, screening),
      title: `${ordinal(order.h)} harmonic voltage`,
      order: order.h,
      source: order.source,
      value: order.percent,
      limit: order.limit,
      screening,
      working: [inNumbers(context, bus, order), table],
      remarks: remarks.filter((sentence) => sentence !== ''),
      mend: mendWords(context, bus, order),
    });
  });
}

function inNumbers(context: CheckContext, bus: Bus, order: JudgedOrder): Working {
  const phase = orderPercent(context.solved, bus, order.h)?.phase ?? 0;
  const index = context.solved.bus(bus.id);
  const volts = context.solved.volts(index, order.h, phase);
  const fundamental = context.solved.volts(index, 1, phase);
  return {
    equation: `U_${order.h} / U_1, worst phase`,
    numbers: `L${phase + 1}: ${figure(volts)} V / ${figure(fundamental)} V = ${figure(order.percent)} %`,
  };
}

function allOrders(orders: readonly JudgedOrder[]): Working {
  const present = orders.filter((order) => order.percent >= 0.005).sort((a, b) => a.h - b.h);
  const numbers = present.map(
    ({ h, percent, limit }) => `${h}: ${figure(percent, 3)} of ${figure(limit, 3)} %`,
  );
  return {
    equation: 'h: U_h of its limit',
    numbers: numbers.length > 0 ? numbers.join('; ') : 'no harmonic voltage',
  };
}

/** Orders with voltage but no limit in the set are named, not passed over. */
function silentWords(rows: readonly OrderRow[]): string {
  const orders = rows
    .filter(({ percent, limit }) => limit === null && (percent ?? 0) >= 0.1)
    .map(({ h }) => h);
  return orders.length === 0
    ? ''
    : `The set states no limit for ${orders.join(', ')}; these orders carry 0.1 % or more.`;
}

function mendWords(context: CheckContext, bus: Bus, order: JudgedOrder): string {
  const without = context.without();
  const before = without ? orderPercent(without, bus, order.h)?.percent : undefined;
  if (before !== undefined && before < order.percent) {
    return `The correction raises it from ${figure(before, 3)} %: detune the bank so that its series resonance lies below the ${ordinal(order.h)}, or move the steps away from the resonance.`;
  }
  return `Fit a filter tuned just below the ${ordinal(order.h)}, or lower the emission with chokes or a higher pulse number.`;
}

function beforeCorrection(
  context: CheckContext,
  bus: Bus,
  order: JudgedOrder,
  screening: boolean,
): Pick<Row, 'withoutCorrection'> {
  const without = context.without();
  const known = busById(context.study, bus.id);
  const before = without?.energised(bus.id) && known ? orderPercent(without, known, order.h) : null;
  if (!before) return {};
  return {
    withoutCorrection: {
      value: before.percent,
      verdict: verdictWord(margin(before.percent, order.limit), screening),
    },
  };
}
