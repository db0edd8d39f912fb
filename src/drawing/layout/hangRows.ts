import type { StudyElement } from '../../study/index.ts';
import type { Arrangement } from './alongBusbar.ts';
import type { SiteGraph } from './siteGraph.ts';
import type { Storeys } from './storeys.ts';

/** Fewer parts than this below a busbar gain nothing by a further row. */
const PARTS_A_ROW = 3;

/** The rows of the drawing: each storey has one or more below its busbars. */
export interface HangRows {
  /** First row of each storey, and how many it has. */
  first: number[];
  count: number[];
  /** Row below its busbar of each hanging part, 0 uppermost. */
  of: ReadonlyMap<StudyElement, number>;
}

/**
 * Deals the parts hanging below each busbar into at most `most` rows, in turns from left to right: a part of a
 * lower row hangs on a long conductor between the texts of the row above.
 */
export function hangRows(
  graph: SiteGraph,
  storeys: Storeys,
  arrangement: Arrangement,
  most: number,
): HangRows {
  const count: number[] = [];
  const of = new Map<StudyElement, number>();
  graph.study.buses.forEach((_, bus) => {
    const storey = storeys.storey[bus] ?? 0;
    const leaves = (arrangement.slots[bus] ?? []).flatMap((slot) => (slot.kind === 'leaf' ? slot.part : []));
    const rows = Math.max(1, Math.min(most, Math.ceil(leaves.length / PARTS_A_ROW)));
    leaves.forEach((part, at) => {
      of.set(part, at % rows);
    });
    count[storey] = Math.max(count[storey] ?? 1, rows);
  });
  const first: number[] = [];
  let row = 0;
  for (let storey = 0; storey < count.length; storey++) {
    first[storey] = row;
    row += count[storey] ?? 1;
  }
  return { first, count, of };
}
