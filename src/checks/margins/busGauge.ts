import type { Bus } from '../../study/index.ts';
import { informsOnly } from '../busThd.ts';
import type { CheckContext } from '../CheckContext.ts';
import { bandSetFor, voltageSetFor } from '../limits/choice.ts';
import { limitsByOrder } from '../limits/limitsByOrder.ts';
import { thdLimit } from '../limits/voltageLimit.ts';
import { unbalanceLimit, unbalancePercent } from '../unbalance.ts';
import { type Gauge, type GaugedState, type Measure, NOT_FORMED } from './Gauge.ts';

/** Gauges of one busbar: steady voltage, unbalance, and distortion where a set limits it. */
export function busGauges(context: CheckContext, bus: Bus): Gauge[] {
  if (!context.solved.energised(bus.id)) return [];
  const isPcc = context.pccBuses.has(bus.id);
  return [
    voltageGauge(context, bus, isPcc),
    unbalanceGauge(context, bus, isPcc),
    ...distortion(context, bus, isPcc),
  ];
}

const measureAt = (check: string, bus: Bus, order?: number): Measure => ({
  key: order === undefined ? `${check}|${bus.id}` : `${check}|${bus.id}|${order}`,
  check,
  subject: { kind: 'bus', id: bus.id },
  ...(order === undefined ? {} : { order }),
});

function voltageGauge(context: CheckContext, bus: Bus, isPcc: boolean): Gauge {
  const band = bandSetFor(context.study, isPcc).band;
  const ratedV = bus.nominalV / Math.sqrt(3);
  return {
    measures: [measureAt('bus-voltage', bus)],
    read({ solved }, out, at) {
      if (!band) throw new RangeError('the chosen set has no voltage band');
      const index = solved.bus(bus.id);
      let worst = NOT_FORMED;
      for (let phase = 0; phase < 3; phase++) {
        const percent = (100 * solved.volts(index, 1, phase)) / ratedV;
        const above = (band.highPercent - percent) / (band.highPercent - 100);
        const below = (percent - band.lowPercent) / (100 - band.lowPercent);
        worst = Math.min(worst, above, below);
      }
      out[at] = worst;
    },
  };
}

function unbalanceGauge(context: CheckContext, bus: Bus, isPcc: boolean): Gauge {
  const limit = unbalanceLimit(context.study, isPcc).cited.value;
  return {
    measures: [measureAt('unbalance', bus)],
    read({ solved }, out, at) {
      const percent = unbalancePercent(solved, bus);
      out[at] = percent === null ? NOT_FORMED : (limit - percent) / limit;
    },
  };
}

/** THD and every order with a limit; nothing where the document only informs. */
function distortion(context: CheckContext, bus: Bus, isPcc: boolean): Gauge[] {
  const choice = voltageSetFor(context.study, isPcc);
  if (!('set' in choice) || informsOnly(choice, isPcc)) return [];
  const thd = thdLimit(choice.set, bus.nominalV);
  const { maxOrder } = context.solved;
  const orders = limitsByOrder(choice.set, bus.nominalV).filter(
    (limit) => limit !== null && limit.h <= maxOrder,
  );
  const limits = Float64Array.from(orders, (limit) => limit?.value ?? 0);
  const hs = Int32Array.from(orders, (limit) => limit?.h ?? 0);
  const floor = (1e-6 * bus.nominalV) / Math.sqrt(3);
  return [
    {
      measures: [
        ...(thd ? [measureAt('bus-thd', bus)] : []),
        ...[...hs].map((h) => measureAt('bus-order', bus, h)),
      ],
      read(state, out, at) {
        const from = at + (thd ? 1 : 0);
        for (let k = at; k < from + hs.length; k++) out[k] = NOT_FORMED;
        if (thd) out[at] = thdMargin(state, bus, thd, floor);
        orderMargins(state, bus, { hs, limits, floor }, out, from);
      },
    },
  ];
}

function thdMargin(
  { solved }: GaugedState,
  bus: Bus,
  limit: { value: number; toOrder: number },
  floor: number,
): number {
  const index = solved.bus(bus.id);
  const last = Math.min(limit.toOrder, solved.maxOrder);
  let worst = NOT_FORMED;
  for (let phase = 0; phase < 3; phase++) {
    const fundamental = solved.volts(index, 1, phase);
    if (fundamental < floor) continue;
    let sum = 0;
    for (let h = 2; h <= last; h++) {
      const volts = solved.volts(index, h, phase);
      sum += volts * volts;
    }
    worst = Math.min(worst, 1 - (100 * Math.sqrt(sum)) / fundamental / limit.value);
  }
  return worst;
}

function orderMargins(
  { solved }: GaugedState,
  bus: Bus,
  { hs, limits, floor }: { hs: Int32Array; limits: Float64Array; floor: number },
  out: Float64Array,
  from: number,
): void {
  const index = solved.bus(bus.id);
  for (let phase = 0; phase < 3; phase++) {
    const fundamental = solved.volts(index, 1, phase);
    if (fundamental < floor) continue;
    for (let k = 0; k < hs.length; k++) {
      const percent = (100 * solved.volts(index, hs[k]!, phase)) / fundamental;
      out[from + k] = Math.min(out[from + k]!, 1 - percent / limits[k]!);
    }
  }
}
