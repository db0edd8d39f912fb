import type { Filter } from '../types.ts';
import { type Typical, typicalOrigin } from './Typical.ts';
import { capacitorVoltsSource, typicalCapacitorV } from './typicalCapacitor.ts';

export interface FilterValues {
  tunedOrder: number;
  qFactor: number;
  ratedV: number;
}

/** Orders single branches are tuned for. */
export const filteredOrders = [5, 7, 11, 13] as const;

const below = 0.94;
const tuningSource =
  'IEEE 1531, 3 to 15 % below the order, so that tolerances never bring it above: 4.7 for the 5th (from memory)';
const qualities = {
  'single-tuned': { q: 40, source: 'common practice, 30 to 80 for single-tuned branches' },
  'high-pass': { q: 2, source: 'common practice, 0.5 to 5 for high-pass branches' },
  'c-type': { q: 2, source: 'common practice, 0.5 to 5 for high-pass branches' },
} as const satisfies Readonly<Record<Filter['type'], { q: number; source: string }>>;

/** Tuned order n just below the order to be filtered, quality q, and the voltage its capacitors then need. */
export function typicalFilter(order: number, type: Filter['type'], nominalV: number): Typical<FilterValues> {
  const tunedOrder = Number((below * order).toPrecision(2 + (order >= 10 ? 1 : 0)));
  const { q, source } = qualities[type];
  const rise = type === 'c-type' ? 1 : tunedOrder ** 2 / (tunedOrder ** 2 - 1);
  const volts = capacitorVoltsSource(type === 'c-type' ? 'U' : 'U·n²/(n² − 1)');
  return {
    ok: true,
    values: { tunedOrder, qFactor: q, ratedV: typicalCapacitorV(nominalV, rise) },
    origins: {
      tunedOrder: typicalOrigin(tuningSource),
      qFactor: typicalOrigin(source),
      ratedV: typicalOrigin(volts),
    },
    source: `n: ${tuningSource}. q: ${source}. U_N: ${volts}.`,
  };
}
