import type { Arrangement } from './alongBusbar.ts';
import type { BlockContent } from './block.ts';
import type { Lane } from './lanes.ts';
import {
  BARE_DEPTH,
  LANE_PITCH,
  LEAF_TEXT_DEPTH,
  ROW_GAP,
  SIDE_TEXT_DEPTH,
  STOREY_BAND,
  TIE_MARK_HEIGHT,
  TIE_TEXT_DEPTH,
  TRUNK_DEPTH,
} from './measures.ts';
import type { Packing } from './packing.ts';

/** Heights of one island by storey: of its bars, of the rows below them and of the first lane below those. */
export interface IslandDepths {
  barY: number[];
  rowY: number[][];
  /** Depth of all rows of a storey together. */
  depth: number[];
  laneY: number[];
  bottom: number;
}

/** Heights of an island from what hangs in each row; its uppermost bars stand at `topY`. */
export function islandDepths(
  packing: Packing,
  content: BlockContent,
  lanes: Lane[],
  topY: number,
): IslandDepths {
  const rows = rowDepths(packing, content);
  const depths: IslandDepths = { barY: [], rowY: [], depth: [], laneY: [], bottom: topY };
  let y = topY;
  rows.forEach((heights, storey) => {
    depths.barY.push(y);
    let depth = 0;
    depths.rowY.push(
      heights.map((height) => {
        const top = y + depth;
        depth += height;
        return top;
      }),
    );
    depths.depth.push(depth);
    depths.laneY.push(y + depth + LANE_PITCH / 2);
    const tracks = lanes.filter((lane) => lane.storey === storey).map(({ track }) => track + 1);
    depths.bottom = y + depth + Math.max(0, ...tracks) * LANE_PITCH;
    y = depths.bottom + STOREY_BAND;
  });
  return depths;
}

/** Depth of every row of every storey the island has. */
function rowDepths(packing: Packing, content: BlockContent): number[][] {
  const { storeys, texts } = packing;
  const depths: number[][] = [];
  const reach = (storey: number, row: number, depth: number) => {
    const own = depths[storey] ?? [];
    depths[storey] = own;
    for (let at = own.length; at <= row; at++) own.push(0);
    own[row] = Math.max(own[row] ?? 0, depth);
  };
  const storeyOf = homeStoreys(packing.arrangement, storeys.storey);
  for (const { bus } of content.bars) reach(storeys.storey[bus] ?? 0, 0, BARE_DEPTH);
  for (const { part, hang, row } of content.symbols) {
    const storey = storeyOf.get(part) ?? 0;
    if (hang === 'below') reach(storey, row, LEAF_TEXT_DEPTH + texts.under(part).height + ROW_GAP);
    if (hang === 'leads-on')
      reach(storey, 0, Math.max(TRUNK_DEPTH, SIDE_TEXT_DEPTH + texts.beside(part).height + ROW_GAP));
  }
  const stands = new Set(content.bars.map(({ bus }) => bus));
  for (const { part, left } of packing.arrangement.ties) {
    if (stands.has(left))
      reach(
        storeys.storey[left] ?? 0,
        0,
        TIE_TEXT_DEPTH + TIE_MARK_HEIGHT + texts.under(part).height + ROW_GAP,
      );
  }
  return depths;
}

function homeStoreys(arrangement: Arrangement, storey: readonly number[]) {
  const home = new Map<unknown, number>();
  arrangement.slots.forEach((slots, bus) => {
    for (const slot of slots) {
      for (const part of slot.kind === 'lead' ? slot.parts : [slot.part]) home.set(part, storey[bus] ?? 0);
    }
  });
  return home;
}
