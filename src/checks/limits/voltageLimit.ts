import type { Source } from '../types.ts';
import type { Cited, LimitSet, OrderFamily, OrderRow, VoltageTable } from './types.ts';

/** A limit with the place it stands in. */
export interface Limit {
  value: number;
  source: Source;
}

/** Document, edition, clause and provenance of a value of a set. */
export function citation(set: LimitSet, cited: Cited): Source {
  return {
    document: set.document,
    edition: set.edition,
    clause: cited.clause,
    provenance: cited.provenance,
  };
}

function familyOf(h: number): Exclude<OrderFamily, 'any'> {
  if (h % 2 === 0) return 'even';
  return h % 3 === 0 ? 'odd-triplen' : 'odd-nontriplen';
}

function percentOf(row: OrderRow, h: number): number {
  return typeof row.percent === 'number' ? row.percent : (row.percent.a * row.percent.at) / h + row.percent.b;
}

/** The table of the set whose span (aboveV, upToV] holds this nominal line-to-line voltage. */
function voltageTable(set: LimitSet, nominalV: number): VoltageTable | undefined {
  return set.voltage?.tables.find(
    (table) => nominalV > table.aboveV && (table.upToV === undefined || nominalV <= table.upToV),
  );
}

/**
 * Limit of U_h in per cent of U_1 for integer order h ≥ 2 at a busbar of nominal line-to-line volts.
 * null where the set is silent: no table for the voltage, or no row for the order.
 */
export function voltageLimit(set: LimitSet, h: number, nominalV: number): Limit | null {
  if (!Number.isInteger(h) || h < 2) throw new RangeError(`order ${h}: an integer of at least 2 is needed`);
  const table = voltageTable(set, nominalV);
  const family = familyOf(h);
  const row = table?.orders.find(
    (candidate) =>
      h >= candidate.from && h <= candidate.to && (candidate.family === 'any' || candidate.family === family),
  );
  if (!table || !row) return null;
  const source = citation(set, { ...table, provenance: row.provenance ?? table.provenance });
  return { value: percentOf(row, h), source };
}

/** Limit of THD(U) in per cent and the last order it counts; null where the set has no table here. */
export function thdLimit(set: LimitSet, nominalV: number): (Limit & { toOrder: number }) | null {
  const table = voltageTable(set, nominalV);
  if (!table || !set.voltage) return null;
  return { value: table.thdPercent, source: citation(set, table), toOrder: set.voltage.thdToOrder };
}
