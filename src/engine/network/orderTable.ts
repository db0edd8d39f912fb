import type { HarmonicRow } from '../../study/index.ts';
import type { OrderTable } from './Network.ts';

/** Rows by order; rows outside 2 … maxOrder are left out, an absent angle is 0 and marked unknown. */
export function orderTable(rows: readonly HarmonicRow[], maxOrder: number): OrderTable {
  const table: OrderTable = {
    percent: new Float64Array(maxOrder + 1),
    angleRad: new Float64Array(maxOrder + 1),
    angleKnown: new Uint8Array(maxOrder + 1),
  };
  for (const { h, percent, angleDeg } of rows) {
    if (!(h >= 2 && h <= maxOrder)) continue;
    table.percent[h] = percent;
    table.angleRad[h] = ((angleDeg ?? 0) * Math.PI) / 180;
    table.angleKnown[h] = angleDeg === undefined ? 0 : 1;
  }
  return table;
}
