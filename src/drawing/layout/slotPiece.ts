import type { SeriesElement } from '../../study/index.ts';
import type { Slot } from './alongBusbar.ts';
import { type Block, emptyBlock, occupy, rowOf } from './block.ts';
import type { PackedBusbar } from './landing.ts';
import { MARK_RIGHT, PASS_HALF, SIDE_LEFT } from './measures.ts';
import { firstRowOf, type Packing, rowCountOf, sidePitch, sideReach } from './packing.ts';

/** What stands in one slot of a busbar, its (first) symbol at `x`, and the busbar it leads down to. */
export interface Piece {
  block: Block;
  x: number;
  below?: Below;
}

export interface Below {
  packed: PackedBusbar;
  /** Left end of the lower bar. */
  x: number;
  parts: SeriesElement[];
  /** From the first to the last of the parts. */
  span: number;
}

/** From the first of parallel parts to each of them. */
export function leadOffsets(packing: Packing, parts: readonly SeriesElement[]): number[] {
  let at = 0;
  return parts.map((part) => {
    const offset = at;
    at += sidePitch(packing, part);
    return offset;
  });
}

/** A hanging part, or a column leading to a busbar drawn elsewhere. */
export function plainPiece(packing: Packing, bus: number, slot: Exclude<Slot, { kind: 'lead' }>): Piece {
  const block = emptyBlock();
  const first = firstRowOf(packing, bus);
  if (slot.kind === 'leaf') {
    const row = packing.rows.of.get(slot.part) ?? 0;
    const half = packing.texts.under(slot.part).width / 2;
    pass(block, first, first + row);
    occupy(block, first + row, rowOf(-half, Math.max(half, MARK_RIGHT)));
    block.symbols.push({ part: slot.part, x: 0, hang: 'below', row });
    return { block, x: 0 };
  }
  const { storeys, rows } = packing;
  const [storey, other] = [storeys.storey[bus] ?? 0, storeys.storey[slot.to] ?? 0];
  const end = other > storey ? (rows.first[other] ?? 0) : first + rowCountOf(packing, bus);
  pass(block, first + 1, end);
  occupy(block, first, rowOf(-SIDE_LEFT, sideReach(packing, slot.part)));
  block.symbols.push({ part: slot.part, x: 0, hang: 'leads-on', row: 0 });
  return { block, x: 0 };
}

/** Parallel parts leading down to one busbar. */
export function leadPiece(
  packing: Packing,
  bus: number,
  parts: SeriesElement[],
  packed: PackedBusbar,
): Piece {
  const block = emptyBlock();
  const first = firstRowOf(packing, bus);
  const offsets = leadOffsets(packing, parts);
  parts.forEach((part, at) => {
    const x = offsets[at] ?? 0;
    occupy(block, first, rowOf(x - SIDE_LEFT, x + sideReach(packing, part)));
    pass(block, first + 1, firstRowOf(packing, packed.bus), x);
    block.symbols.push({ part, x, hang: 'leads-on', row: 0 });
  });
  return { block, x: 0, below: { packed, x: 0, parts, span: offsets.at(-1) ?? 0 } };
}

/** Keeps a conductor's way through the rows from `from` to before `to`. */
function pass(block: Block, from: number, to: number, x = 0): void {
  for (let row = from; row < to; row++) occupy(block, row, rowOf(x - PASS_HALF, x + PASS_HALF));
}
