import type { SeriesElement, ShuntElement } from '../../study/index.ts';

/** What a block occupies of one row, and which busbars stand at its two ends (−1: none). */
export interface Row {
  left: number;
  right: number;
  leftBus: number;
  rightBus: number;
}

export interface BarX {
  bus: number;
  x1: number;
  x2: number;
  /** Left end of the busbar's plate. */
  plateX: number;
}

export interface SymbolX {
  part: SeriesElement | ShuntElement;
  x: number;
  hang: 'below' | 'above' | 'leads-on';
  /** Row below the busbar, 0 uppermost. */
  row: number;
}

/** Where a part whose foot is not straight below its symbol touches its second busbar. */
export interface ArrivalX {
  part: SeriesElement;
  bus: number;
  x: number;
  from: 'above' | 'below';
}

/** What stands in a block, each at its x. */
export interface BlockContent {
  bars: BarX[];
  symbols: SymbolX[];
  arrivals: ArrivalX[];
}

/**
 * Busbars and parts packed sideways. Rows are those of the whole drawing, the uppermost is 0. Blocks within it
 * keep their own coordinates until all are set.
 */
export interface Block extends BlockContent {
  rows: (Row | undefined)[];
  within: { block: Block; dx: number }[];
}

export function emptyBlock(): Block {
  return { rows: [], bars: [], symbols: [], arrivals: [], within: [] };
}

export function rowOf(left: number, right: number, bus = -1): Row {
  return { left, right, leftBus: bus, rightBus: bus };
}

export type GapRule = (leftBus: number, rightBus: number) => number;

/** Smallest shift that puts `next` right of `block` with the gap of each common row. */
export function shiftBeside(block: Block, next: Block, gap: GapRule): number {
  let shift = Number.NEGATIVE_INFINITY;
  next.rows.forEach((row, at) => {
    const standing = block.rows[at];
    if (standing && row)
      shift = Math.max(shift, standing.right + gap(standing.rightBus, row.leftBus) - row.left);
  });
  return shift;
}

/** Widens the block's rows by those of `next`, shifted by `dx`. */
export function occupyRows(block: Block, next: Block, dx: number): void {
  next.rows.forEach((row, at) => {
    if (row) occupy(block, at, { ...row, left: row.left + dx, right: row.right + dx });
  });
}

/** Adds `next`, shifted by `dx`, to `block`. */
export function addBlock(block: Block, next: Block, dx: number): void {
  occupyRows(block, next, dx);
  block.within.push({ block: next, dx });
}

/** Everything in the block and in the blocks within it, shifted by `dx`. */
export function contentOf(block: Block, dx: number, into: BlockContent = emptyBlock()): BlockContent {
  for (const bar of block.bars)
    into.bars.push({ ...bar, x1: bar.x1 + dx, x2: bar.x2 + dx, plateX: bar.plateX + dx });
  for (const symbol of block.symbols) into.symbols.push({ ...symbol, x: symbol.x + dx });
  for (const arrival of block.arrivals) into.arrivals.push({ ...arrival, x: arrival.x + dx });
  for (const inner of block.within) contentOf(inner.block, dx + inner.dx, into);
  return into;
}

/** Widens a row of the block by what stands in it as well. */
export function occupy(block: Block, at: number, row: Row): void {
  const standing = block.rows[at];
  block.rows[at] = standing ? widened(standing, row) : row;
}

function widened(a: Row, b: Row): Row {
  const [leftmost, rightmost] = [a.left <= b.left ? a : b, a.right >= b.right ? a : b];
  return {
    left: leftmost.left,
    right: rightmost.right,
    leftBus: leftmost.leftBus,
    rightBus: rightmost.rightBus,
  };
}
