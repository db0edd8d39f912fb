import { addBlock, type Block, emptyBlock, type GapRule, occupyRows, shiftBeside } from './block.ts';
import { afterPlate, land, landingAt, landings, nearestLanding } from './landing.ts';
import { ARRIVAL_PITCH } from './measures.ts';
import type { Descent } from './packing.ts';
import type { Below, Piece } from './slotPiece.ts';

/** Width given up for one straight conductor where busbars stand as close as they can. */
const STRAIGHT_WORTH = 60;

/**
 * Sets a piece right of what stands, and the busbar it leads to below it. `feedX` is the least place of its
 * symbol: straight below the source that feeds the bar.
 */
export function setPiece(
  standing: Block,
  piece: Piece,
  feedX: number | undefined,
  descent: Descent,
  gap: GapRule,
): void {
  piece.x = Math.max(shiftBeside(standing, piece.block, gap), feedX ?? Number.NEGATIVE_INFINITY);
  const { below } = piece;
  if (below) {
    const room = shiftBeside(standing, below.packed.block, gap);
    if (descent === 'straight') setStraight(piece, below, room);
    else if (descent === 'reach') setReaching(piece, below, Math.max(room, 0));
    else setNear(piece, below, Math.max(room, 0));
  }
  stand(standing, piece);
}

function setStraight(piece: Piece, below: Below, room: number): void {
  const at = afterPlate(below.packed.plate);
  piece.x = Math.max(piece.x, room + at);
  below.x = piece.x - at;
}

/** Straight down, the lower bar as far left as it reaches; of two ways the one that moves less. */
function setReaching(piece: Piece, below: Below, room: number): void {
  const at = piece.x - room;
  below.x = room;
  if (landingAt(below.packed, at, below.span)) return;
  const ways = landings(below.packed, below.span).flatMap(({ from, to }) => [
    { move: from - at, bar: false },
    { move: at - to, bar: true },
  ]);
  const way = ways.filter(({ move }) => move > 0).sort((a, b) => a.move - b.move)[0];
  if (way?.bar) below.x += way.move;
  else piece.x += way?.move ?? 0;
}

/** As far left as there is room, and straight down where a little width buys that. */
function setNear(piece: Piece, below: Below, room: number): void {
  const x = piece.x;
  setReaching(piece, below, room);
  if (piece.x - x + below.x - room <= STRAIGHT_WORTH) return;
  piece.x = x;
  below.x = room;
}

function stand(standing: Block, piece: Piece): void {
  occupyRows(standing, piece.block, piece.x);
  if (piece.below) occupyRows(standing, piece.below.packed.block, piece.below.x);
}

/**
 * Where the drawing has room to the right anyway, lower bars move right until their conductor is straight.
 * From the last piece to the first, so that each sees where the next one ended.
 */
export function straighten(standing: Block, pieces: readonly Piece[], gap: GapRule): void {
  const width = Math.max(...standing.rows.map((row) => row?.right ?? Number.NEGATIVE_INFINITY));
  const right = emptyBlock();
  for (const piece of pieces.toReversed()) {
    const { below } = piece;
    if (below) {
      const at = piece.x - below.x;
      const straight = landings(below.packed, below.span).filter(({ to }) => to <= at);
      const wish = landingAt(below.packed, at, below.span)
        ? 0
        : at - Math.max(...straight.map(({ to }) => to));
      const room = roomBefore(right, below, width, gap);
      if (Number.isFinite(wish)) below.x += Math.max(0, Math.min(wish, room));
    }
    stand(right, piece);
  }
}

/** How far a lower bar can move right before it meets what stands there or the edge of the drawing. */
function roomBefore(right: Block, below: Below, width: number, gap: GapRule): number {
  let room = Number.POSITIVE_INFINITY;
  below.packed.block.rows.forEach((row, at) => {
    if (!row) return;
    const next = right.rows[at];
    const edge = next ? next.left - gap(row.rightBus, next.leftBus) : width;
    room = Math.min(room, edge - row.right - below.x);
  });
  return room;
}

/** Adds the piece to the block, its conductors straight down or bent to where they can land. */
export function joinPiece(block: Block, piece: Piece): void {
  addBlock(block, piece.block, piece.x);
  const { below } = piece;
  if (!below) return;
  const at = piece.x - below.x;
  if (landingAt(below.packed, at, below.span)) land(below.packed, at, below.span);
  else {
    const span = (below.parts.length - 1) * ARRIVAL_PITCH;
    const first = nearestLanding(below.packed, at, span);
    land(below.packed, first, span);
    below.parts.forEach((part, index) => {
      const x = below.x + first + index * ARRIVAL_PITCH;
      block.arrivals.push({ part, bus: below.packed.bus, x, from: 'above' });
    });
  }
  addBlock(block, below.packed.block, below.x);
}
