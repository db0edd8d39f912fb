import type { Bus } from '../study/index.ts';
import { informsOnly, informsRemark, namedSource, noLimitWords } from './busThd.ts';
import type { CheckContext } from './CheckContext.ts';
import { angleRemarks, type BusSpectrum, busSpectrum, orderPercent } from './distortion.ts';
import { figure, ordinal } from './figure.ts';
import { voltageSetFor } from './limits/choice.ts';
import { limitsByOrder, type OrderLimit } from './limits/limitsByOrder.ts';
import { margin, verdictWord, WATCH_MARGIN } from './margin.ts';
import type { Verdict, Working } from './types.ts';
import { judged, type Row, unknown } from './verdict.ts';

/** Orders at this share of their limit or more are listed in the working. */
const LISTED_SHARE = 0.1;

/**
 * Single harmonic voltages (bus-order): per busbar the order nearest to its limit, and every further order
 * that fails or is worth watching. The working lists the orders at a tenth of their limit or more; all
 * orders stand in orderTable.
 */
export function busOrder(context: CheckContext): Verdict[] {
  return context.study.buses.flatMap((bus) => (context.solved.energised(bus.id) ? atBus(context, bus) : []));
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
  const spectrum = busSpectrum(context.solved, bus);
  if (!spectrum) return [unknown(row, 'the busbar carries no fundamental voltage')];
  const limits = 'set' in choice ? limitsByOrder(choice.set, bus.nominalV) : [];
  const shown = nearestToLimit(spectrum, limits);
  if (shown.length === 0) return [unknown(row, noLimitWords(choice, bus))];
  row.screening = informsOnly(choice, isPcc);
  return shown.map((limit) => atOrder(context, bus, row, { spectrum, limits, limit }));
}

/** The limit with the smallest margin first, then those below the watch margin in order of margin. */
function nearestToLimit(spectrum: BusSpectrum, limits: readonly (OrderLimit | null)[]): OrderLimit[] {
  const near: { limit: OrderLimit; margin: number }[] = [];
  let worst: { limit: OrderLimit; margin: number } | null = null;
  for (let h = 2; h <= spectrum.percent.length; h++) {
    const limit = limits[h - 2];
    if (!limit) continue;
    const found = margin(spectrum.percent[h - 1] ?? 0, limit.value);
    if (found < WATCH_MARGIN) near.push({ limit, margin: found });
    if (!worst || found < worst.margin) worst = { limit, margin: found };
  }
  if (near.length === 0) return worst ? [worst.limit] : [];
  return near.sort((a, b) => a.margin - b.margin).map(({ limit }) => limit);
}

interface NearLimit {
  spectrum: BusSpectrum;
  limits: readonly (OrderLimit | null)[];
  limit: OrderLimit;
}

function atOrder(context: CheckContext, bus: Bus, row: Row, { spectrum, limits, limit }: NearLimit): Verdict {
  const { h } = limit;
  const percent = spectrum.percent[h - 1] ?? 0;
  const before = beforePercent(context, bus, h);
  return judged({
    ...row,
    title: `${ordinal(h)} harmonic voltage`,
    order: h,
    source: limit.source,
    value: percent,
    limit: limit.value,
    working: () => [
      inNumbers(context, bus, h, spectrum.phase[h - 1] ?? 0, percent),
      listing(spectrum, limits),
    ],
    remarks: () => [
      ...angleRemarks(context.solved, context.solved.anglesUnknown(h) ? [h] : []),
      ...(row.screening ? [informsRemark] : []),
      ...silentWords(spectrum, limits),
    ],
    mend: () => mendWords(h, percent, before),
    ...(before === null
      ? {}
      : {
          withoutCorrection: {
            value: before,
            verdict: verdictWord(margin(before, limit.value), row.screening),
          },
        }),
  });
}

function beforePercent(context: CheckContext, bus: Bus, h: number): number | null {
  const without = context.without();
  return without?.energised(bus.id) ? orderPercent(without, bus, h) : null;
}

function inNumbers(context: CheckContext, bus: Bus, h: number, phase: number, percent: number): Working {
  const index = context.solved.bus(bus.id);
  const volts = context.solved.volts(index, h, phase);
  const fundamental = context.solved.volts(index, 1, phase);
  return {
    equation: `U_${h} / U_1, worst phase`,
    numbers: `L${phase + 1}: ${figure(volts)} V / ${figure(fundamental)} V = ${figure(percent)} %`,
  };
}

function listing(spectrum: BusSpectrum, limits: readonly (OrderLimit | null)[]): Working {
  const items: string[] = [];
  for (let h = 2; h <= spectrum.percent.length; h++) {
    const percent = spectrum.percent[h - 1] ?? 0;
    const limit = limits[h - 2];
    if (limit && percent >= LISTED_SHARE * limit.value)
      items.push(`${h}: ${figure(percent, 3)} of ${limit.text} %`);
  }
  return {
    equation: 'h: U_h of its limit, a tenth and more',
    numbers: items.length > 0 ? items.join('; ') : 'no order reaches a tenth of its limit',
  };
}

/** Orders with voltage but no limit in the set are named, not passed over. */
function silentWords(spectrum: BusSpectrum, limits: readonly (OrderLimit | null)[]): string[] {
  const orders: number[] = [];
  for (let h = 2; h <= spectrum.percent.length; h++) {
    if (!limits[h - 2] && (spectrum.percent[h - 1] ?? 0) >= 0.1) orders.push(h);
  }
  if (orders.length === 0) return [];
  return [`The set states no limit for ${orders.join(', ')}; there U_h is 0.1 % or more.`];
}

function mendWords(h: number, percent: number, before: number | null): string {
  if (before !== null && before < percent) {
    return `The correction raises it from ${figure(before, 3)} %: detune the bank so that its series resonance lies below the ${ordinal(h)}, or move the steps away from the resonance.`;
  }
  return `Fit a filter tuned just below the ${ordinal(h)}, or lower the emission with chokes or a higher pulse number.`;
}
