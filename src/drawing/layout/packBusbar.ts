import type { ShuntElement } from '../../study/index.ts';
import { addBlock, type Block, emptyBlock, occupy, rowOf, shiftBeside } from './block.ts';
import { joinPiece, setPiece, straighten } from './descend.ts';
import { afterPlate, land, leastLength, type PackedBusbar } from './landing.ts';
import { ARRIVAL_PITCH, BAR_INSET, PASS_HALF, SLOT_GAP, SOURCE_HALF } from './measures.ts';
import { firstRowOf, gapRule, type Packing, rowCountOf, sidePitch, sideReach } from './packing.ts';
import { leadOffsets, leadPiece, plainPiece } from './slotPiece.ts';

/** Packs a busbar nothing leads down to, with the sources feeding it from above and all it leads to. */
export function packTop(packing: Packing, bus: number): Block {
  const feeds = packing.arrangement.feeds[bus] ?? [];
  const first = afterPlate(plateOf(packing, bus));
  const places: { part: ShuntElement; x: number }[] = [];
  let x = first;
  for (const part of feeds) {
    places.push({ part, x });
    x += sidePitch(packing, part) + SOURCE_HALF;
  }
  const last = places.at(-1);
  const span = (last?.x ?? first) - first;
  const feed = last && { x: first, right: last.x + sideReach(packing, last.part) };
  const packed = packBusbar(packing, bus, span, feed);
  for (const place of places) packed.block.symbols.push({ ...place, hang: 'above', row: 0 });
  land(packed, first, span);
  return packed.block;
}

function plateOf({ study, texts }: Packing, bus: number): number {
  const data = study.buses[bus];
  return data ? texts.plate(data).width : 0;
}

/** Where sources stand above a busbar: the first one, and how far the last one's text reaches. */
interface Feed {
  x: number;
  right: number;
}

/**
 * Packs a busbar with room for `span` px of conductors from above. Everything is anchored at the left end of
 * the bar: what is added at its right end moves only what stands further right.
 */
function packBusbar(packing: Packing, bus: number, span: number, feed?: Feed): PackedBusbar {
  const { arrangement } = packing;
  const plate = plateOf(packing, bus);
  const columns = arrangement.fromAbove[bus] ?? [];
  const block = packSlots(packing, bus, feed?.x);
  const first = firstRowOf(packing, bus);
  const own = block.rows.slice(first, first + rowCountOf(packing, bus));
  const length = Math.max(
    leastLength(plate, span, columns.length),
    feed?.right ?? 0,
    ...own.map((row) => row?.right ?? 0),
  );
  block.rows[first] = rowOf(0, length, bus);
  block.bars.push({ bus, x1: 0, x2: length, plateX: 0 });
  for (const right of arrangement.beside[bus] ?? []) {
    const next = packTop(packing, right);
    addBlock(block, next, shiftBeside(block, next, gapRule(packing)));
  }
  return { block, bus, length, plate, columns };
}

/**
 * The parts along a busbar from left to right with all they lead to. `feedX` is where a source meets the bar
 * from above: a first part that leads on stands straight below it.
 */
function packSlots(packing: Packing, bus: number, feedX: number | undefined): Block {
  const gap = gapRule(packing);
  const block = fromBelow(packing, bus);
  const standing: Block = { ...emptyBlock(), rows: [...block.rows] };
  const pieces = (packing.arrangement.slots[bus] ?? []).map((slot, at) => {
    const piece =
      slot.kind === 'lead'
        ? leadPiece(packing, bus, slot.parts, packBusbar(packing, slot.below, spanOf(packing, slot.parts)))
        : plainPiece(packing, bus, slot);
    const straight = at === 0 && slot.kind !== 'leaf' ? feedX : undefined;
    setPiece(standing, piece, straight, packing.descent, gap);
    return piece;
  });
  if (packing.descent === 'jog') straighten(standing, pieces, gap);
  for (const piece of pieces) joinPiece(block, piece);
  return block;
}

function spanOf(packing: Packing, parts: Parameters<typeof leadOffsets>[1]): number {
  return leadOffsets(packing, parts).at(-1) ?? 0;
}

/** Columns coming up to the bar from a lane below it, left of all that hangs from it. */
function fromBelow(packing: Packing, bus: number): Block {
  const block = emptyBlock();
  const first = firstRowOf(packing, bus);
  occupy(block, first, rowOf(0, -SLOT_GAP));
  (packing.arrangement.fromBelow[bus] ?? []).forEach((part, at) => {
    const x = BAR_INSET + at * ARRIVAL_PITCH;
    block.arrivals.push({ part, bus, x, from: 'below' });
    for (let row = 0; row < rowCountOf(packing, bus); row++)
      occupy(block, first + row, rowOf(0, x + PASS_HALF));
  });
  return block;
}
