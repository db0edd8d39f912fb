import type { CurrentRow, CurrentTable, LimitSet } from './types.ts';
import { citation, type Limit } from './voltageLimit.ts';

function rowFor(
  set: LimitSet,
  nominalV: number,
  ratio: number,
): { table: CurrentTable; row: CurrentRow } | null {
  const table = set.current?.tables.find(
    (candidate) =>
      nominalV > candidate.aboveV && (candidate.upToV === undefined || nominalV <= candidate.upToV),
  );
  const row = table?.rows.find(
    (candidate) =>
      ratio >= candidate.ratioFrom && (candidate.ratioBelow === undefined || ratio < candidate.ratioBelow),
  );
  return table && row ? { table, row } : null;
}

/** What one row of a current table allows, Isc/I_L being `ratio`. */
export interface CurrentRowLimits {
  /** e.g. "Isc/I_L 20 to 50". */
  words: string;
  tdd: Limit;
  /** Limit of I_h in per cent of I_L; null above the last order. */
  order(h: number): Limit | null;
}

/** The row of the set for a nominal voltage and Isc/I_L; null where the set has none. */
export function currentLimits(set: LimitSet, nominalV: number, ratio: number): CurrentRowLimits | null {
  const found = rowFor(set, nominalV, ratio);
  const limits = set.current;
  if (!found || !limits) return null;
  const { table, row } = found;
  const source = citation(set, table);
  return {
    words:
      row.ratioBelow === undefined
        ? `Isc/I_L ${row.ratioFrom} and above`
        : `Isc/I_L ${row.ratioFrom} to ${row.ratioBelow}`,
    tdd: { value: row.tddPercent, source },
    order(h) {
      const percent = row.percent[table.bands.findIndex((last) => h <= last)];
      if (h < 2 || h > limits.toOrder || percent === undefined) return null;
      if (h % 2 === 1) return { value: percent, source };
      const share = limits.even.spans.find((span) => h <= span.to)?.share ?? 1;
      return { value: percent * share, source: citation(set, limits.even) };
    },
  };
}
