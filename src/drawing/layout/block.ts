import type { SeriesElement, ShuntElement } from '../../study/index.ts';

/** What one storey of a block occupies, and which busbars stand at its two ends (−1: none). */
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
}

export interface SymbolX {
  part: SeriesElement | ShuntElement;
  x: number;
  hang: 'below' | 'above' | 'leads-on';
}

/** Where a column touches its second busbar. */
export interface ArrivalX {
  part: SeriesElement;
  bus: number;
  x: number;
  from: 'above' | 'below';
}

/** A busbar with everything drawn below it, horizontally packed; row 0 is its own storey. */
export interface Block {
  rows: Row[];
  bars: BarX[];
  symbols: SymbolX[];
  arrivals: ArrivalX[];
}

export function emptyBlock(): Block {
  return { rows: [], bars: [], symbols: [], arrivals: [] };
}

export type GapRule = (leftBus: number, rightBus: number, row: number) => number;

/** Smallest shift that puts `next` right of `block` with the gap of each common storey. */
export function shiftBeside(block: Block, next: Block, gap: GapRule): number {
  let shift = Number.NEGATIVE_INFINITY;
  next.rows.forEach((row, at) => {
    const standing = block.rows[at];
    if (standing)
      shift = Math.max(shift, standing.right + gap(standing.rightBus, row.leftBus, at) - row.left);
  });
  return shift;
}

/** Adds `next`, shifted by `dx`, to `block`; `rowOffset` is the storey of `next` counted from the block's own. */
export function addBlock(block: Block, next: Block, dx: number, rowOffset = 0): void {
  next.rows.forEach((row, at) => {
    const index = at + rowOffset;
    const standing = block.rows[index];
    const moved = { ...row, left: row.left + dx, right: row.right + dx };
    block.rows[index] = standing ? widen(standing, moved) : moved;
  });
  for (const bar of next.bars) block.bars.push({ ...bar, x1: bar.x1 + dx, x2: bar.x2 + dx });
  for (const symbol of next.symbols) block.symbols.push({ ...symbol, x: symbol.x + dx });
  for (const arrival of next.arrivals) block.arrivals.push({ ...arrival, x: arrival.x + dx });
}

function widen(a: Row, b: Row): Row {
  const [leftmost, rightmost] = [a.left <= b.left ? a : b, a.right >= b.right ? a : b];
  return {
    left: leftmost.left,
    right: rightmost.right,
    leftBus: leftmost.leftBus,
    rightBus: rightmost.rightBus,
  };
}
