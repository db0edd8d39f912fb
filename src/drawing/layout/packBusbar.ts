import type { SeriesElement, ShuntElement, Study } from '../../study/index.ts';
import type { Arrangement, Slot } from './alongBusbar.ts';
import { addBlock, type Block, emptyBlock, type GapRule, shiftBeside } from './block.ts';
import { busLabelWidth, leafLabelWidth, sideLabel } from './labels.ts';
import {
  ARRIVAL_PITCH,
  BAR_INSET,
  BUS_GAP,
  BUS_MARK_ROOM,
  DIAL_RADIUS,
  DIAL_ROOM,
  LEAF_READING,
  MARK_WIDTH,
  SIDE_TEXT_OFFSET,
  SLOT_GAP,
  STACKED_MARK_WIDTH,
} from './measures.ts';
import type { Storeys } from './storeys.ts';

const SYMBOL_HALF = 20;
const LABEL_TO_LEAD = 18;
/** How far left of the feed a part may stand and still be moved straight under it. */
const STRAIGHTEN_LEAD = 110;
const STRAIGHTEN_LEAF = 40;

export interface Packing {
  study: Study;
  storeys: Storeys;
  arrangement: Arrangement;
}

interface PackedBusbar {
  block: Block;
  /** Where the first part from above meets the bar, and how far the text of the last one reaches. */
  leadX: number;
  leadRight: number;
}

/**
 * Packs a busbar, the parts feeding it from above, what hangs from it and all it leads to. Everything is
 * anchored at the left end of the bar: what is added at the right end moves only what stands further right.
 */
export function packBusbar(
  packing: Packing,
  bus: number,
  fedBy: (SeriesElement | ShuntElement)[],
): PackedBusbar {
  const { arrangement, study } = packing;
  const label = busLabelWidth(study.buses[bus] ?? { id: '', nominalV: 0 });
  const leadX = label + LABEL_TO_LEAD;
  const block = packSlots(packing, bus, leadX);

  let [topEnd, leadRight] = [leadX, leadX];
  for (const part of fedBy) {
    const x = part === fedBy[0] ? leadX : leadRight + SYMBOL_HALF + SLOT_GAP;
    block.symbols.push({ part, x, hang: 'from' in part ? 'leads-on' : 'above' });
    topEnd = x + ('from' in part ? ARRIVAL_PITCH : SIDE_TEXT_OFFSET + MARK_WIDTH);
    leadRight = x + SIDE_TEXT_OFFSET + sideLabel(part, study).width;
  }
  for (const part of arrangement.fromAbove[bus] ?? []) {
    block.arrivals.push({ part, bus, x: topEnd, from: 'above' });
    topEnd += ARRIVAL_PITCH;
  }
  closeBar(packing, block, bus, topEnd, fedBy.some((part) => !('from' in part)) ? leadRight : 0);
  for (const right of arrangement.beside[bus] ?? []) {
    const next = packBusbar(packing, right, arrangement.feeds[right] ?? []).block;
    addBlock(block, next, shiftBeside(block, next, gapRule(packing)));
  }
  return { block, leadX, leadRight };
}

/** Ends the bar right of everything on it and reserves the room of the dial. */
function closeBar(packing: Packing, block: Block, bus: number, topEnd: number, feedRight: number): void {
  const tiedRight = packing.arrangement.ties.some((tie) => tie.left === bus);
  const dialAbove = tiedRight ? 2 * DIAL_RADIUS + 8 : 0;
  const x2 = Math.max(block.rows[0]?.right ?? 0, topEnd + dialAbove) + BAR_INSET;
  const right = Math.max(x2 + (tiedRight ? 0 : DIAL_ROOM), feedRight);
  block.bars.push({ bus, x1: 0, x2 });
  block.rows[0] = { left: 0, right, leftBus: bus, rightBus: bus };
}

/** Slots from left to right, clear of the busbar's mark and, where that is near, straight under its feed. */
function packSlots(packing: Packing, bus: number, leadX: number): Block {
  const slots = packing.arrangement.slots[bus] ?? [];
  const block = emptyBlock();
  let left = BUS_MARK_ROOM;
  for (const part of packing.arrangement.fromBelow[bus] ?? []) {
    block.arrivals.push({ part, bus, x: left, from: 'below' });
    left += ARRIVAL_PITCH;
  }
  const arrived = left > BUS_MARK_ROOM;
  block.rows[0] = { left: 0, right: (arrived ? left : BAR_INSET) - SLOT_GAP, leftBus: -1, rightBus: -1 };
  for (const slot of slots) {
    const next = packSlot(packing, bus, slot);
    const nearest = Math.max(shiftBeside(block, next, gapRule(packing)), BUS_MARK_ROOM);
    addBlock(block, next, straightened(nearest, leadX, slot, slots.length));
  }
  return block;
}

/**
 * A part leading on moves right to stand straight under the feed when that is near, a hanging one when it is
 * nearly there. The part moves, never the feed: what is hung later must not shift what stands above.
 */
function straightened(nearest: number, leadX: number, slot: Slot, count: number): number {
  if (nearest >= leadX) return nearest;
  const reach = slot.kind === 'leaf' ? STRAIGHTEN_LEAF : count === 1 ? leadX : STRAIGHTEN_LEAD;
  return leadX - nearest <= reach ? leadX : nearest;
}

/** A slot with its (first) symbol at x = 0. */
function packSlot(packing: Packing, bus: number, slot: Slot): Block {
  const { study, storeys } = packing;
  const block = emptyBlock();
  if (slot.kind === 'leaf') {
    const half = leafLabelWidth(slot.part, study) / 2;
    const right = Math.max(half, SIDE_TEXT_OFFSET + STACKED_MARK_WIDTH);
    block.rows.push({ left: -half, right, leftBus: -1, rightBus: -1 });
    block.symbols.push({ part: slot.part, x: 0, hang: 'below' });
  } else if (slot.kind === 'column') {
    const right = SIDE_TEXT_OFFSET + sideLabel(slot.part, study).width;
    block.rows.push({ left: -SYMBOL_HALF, right, leftBus: -1, rightBus: -1 });
    block.symbols.push({ part: slot.part, x: 0, hang: 'leads-on' });
    const between = (storeys.storey[slot.to] ?? 0) - (storeys.storey[bus] ?? 0) - 1;
    for (let row = 0; row < between; row++)
      block.rows.push({ left: -8, right: 8, leftBus: -1, rightBus: -1 });
  } else {
    const child = packBusbar(packing, slot.below, slot.parts);
    const right = child.leadRight - child.leadX;
    block.rows.push({ left: -SYMBOL_HALF, right, leftBus: -1, rightBus: -1 });
    addBlock(block, child.block, -child.leadX, 1);
  }
  return block;
}

/** Slots stand close, busbars apart, and busbars tied end to end leave room for the tie and its text. */
export function gapRule({ arrangement, study }: Packing): GapRule {
  return (left, right) => {
    if (left < 0 && right < 0) return SLOT_GAP;
    const tie = arrangement.ties.find((t) => t.left === left && t.right === right);
    return tie ? Math.max(LEAF_READING, leafLabelWidth(tie.part, study)) + 2 * SLOT_GAP : BUS_GAP;
  };
}
