import type { SeriesElement, ShuntElement, Study } from '../../study/index.ts';
import type { Arrangement } from './alongBusbar.ts';
import type { GapRule } from './block.ts';
import type { HangRows } from './hangRows.ts';
import type { TextPlans } from './labels.ts';
import { BUS_GAP, CELL_WIDTH, SIDE_LEFT, SIDE_TEXT_OFFSET, SLOT_GAP } from './measures.ts';
import type { Storeys } from './storeys.ts';

/**
 * How a busbar stands to the part leading down to it.
 *  straight: straight below it, its plate left of the conductor.
 *  reach: straight below it, but reaching left under what hangs from the busbar above.
 *  jog: as far left as there is room; the conductor bends where it must.
 */
export type Descent = 'straight' | 'reach' | 'jog';

/** All that packing a study's busbars needs to know. */
export interface Packing {
  study: Study;
  storeys: Storeys;
  arrangement: Arrangement;
  rows: HangRows;
  texts: TextPlans;
  descent: Descent;
}

export function firstRowOf({ rows, storeys }: Packing, bus: number): number {
  return rows.first[storeys.storey[bus] ?? 0] ?? 0;
}

export function rowCountOf({ rows, storeys }: Packing, bus: number): number {
  return rows.count[storeys.storey[bus] ?? 0] ?? 1;
}

/** How far the text beside a part that leads on or feeds reaches right of its conductor. */
export function sideReach({ texts }: Packing, part: SeriesElement | ShuntElement): number {
  return SIDE_TEXT_OFFSET + texts.beside(part).width;
}

/** From a part that leads on or feeds to the next one beside it. */
export function sidePitch(packing: Packing, part: SeriesElement | ShuntElement): number {
  return sideReach(packing, part) + SLOT_GAP + SIDE_LEFT;
}

/** Slots stand close, busbars apart, and busbars tied end to end leave room for the tie and its text. */
export function gapRule({ arrangement, texts }: Packing): GapRule {
  return (left, right) => {
    if (left < 0 || right < 0) return SLOT_GAP;
    const tie = arrangement.ties.find((t) => t.left === left && t.right === right);
    return tie ? Math.max(CELL_WIDTH, texts.under(tie.part).width) + 2 * SLOT_GAP : BUS_GAP;
  };
}
