import type { Study } from '../../study/index.ts';
import { arrange, leadsAmongLeaves, orderAlong } from './alongBusbar.ts';
import { addBlock, type Block, type BlockContent, contentOf, emptyBlock, shiftBeside } from './block.ts';
import { foldStoreys } from './foldStoreys.ts';
import { hangRows } from './hangRows.ts';
import { type IslandDepths, islandDepths } from './islandDepths.ts';
import { textPlans } from './labels.ts';
import { assignLanes, type Lane } from './lanes.ts';
import { ISLAND_GAP, LANE_PITCH, MARGIN, PLATE_HEIGHT, PLATE_LIFT } from './measures.ts';
import { packTop } from './packBusbar.ts';
import { type Descent, gapRule, type Packing } from './packing.ts';
import { placeBusbar } from './placeBusbar.ts';
import { placePart, placeTie, sourceDepth } from './placePart.ts';
import { siteGraph } from './siteGraph.ts';
import { storeysOf } from './storeys.ts';
import type { BusPlace, Layout } from './types.ts';

/** Smallest paper the drawing asks for, so that an empty study still has room for its hint. */
const EMPTY = { width: 640, height: 400 };
/** Proportions the drawing aims at: a window of 1440 × 900 with its notes, and a page turned on its side. */
const AIM = { width: 1000, height: 636 };
/** The least scale at which the drawing's letters are read with ease: 11 of 12 px. */
const READABLE = 11 / 12;
/** A denser arrangement must bring at least so much larger letters. */
const WORTH = 1.06;

/** How lower busbars stand to the parts leading to them; rows of parts below a busbar; tiers of lower busbars. */
export interface Density {
  descent: Descent;
  rows: number;
  tiers: number;
}

/** From the plainest to the densest. */
export const DENSITIES: readonly Density[] = [
  { descent: 'straight', rows: 1, tiers: 1 },
  { descent: 'reach', rows: 1, tiers: 1 },
  { descent: 'jog', rows: 1, tiers: 1 },
  { descent: 'jog', rows: 2, tiers: 1 },
  { descent: 'jog', rows: 3, tiers: 1 },
  { descent: 'jog', rows: 1, tiers: 2 },
  { descent: 'jog', rows: 2, tiers: 2 },
  { descent: 'jog', rows: 2, tiers: 3 },
  { descent: 'jog', rows: 3, tiers: 4 },
];

interface PackedIsland {
  index: number;
  content: BlockContent;
  lanes: Lane[];
  depths: IslandDepths;
}

interface Packed {
  packing: Packing;
  islands: PackedIsland[];
  width: number;
  height: number;
}

/**
 * Places every busbar, part, conductor and line of text of a study's single-line diagram.
 *
 * Busbars stand in storeys (fewest series parts from the supply), parts hang below them in the order of
 * `view.orderAlong`, else of the file. The same study gives the same layout; in service or not and the case
 * play no part. Everything is anchored left and top, so an edit moves only what stands right of or below it,
 * unless the paper is full: then the plainest arrangement is taken whose letters are readable on it, else the
 * one with the largest. Parts at unknown busbars, and series parts with both ends on one busbar, are left out.
 */
export function layoutStudy(study: Study, densities: readonly Density[] = DENSITIES): Layout {
  const packed = bestPacking(study, densities);
  const layout: Layout = {
    width: Math.max(EMPTY.width, packed.width),
    height: Math.max(EMPTY.height, packed.height),
    buses: [],
    parts: [],
  };
  for (const island of packed.islands) placeIsland(packed.packing, island, layout);
  return inFileOrder(layout, study);
}

function bestPacking(study: Study, densities: readonly Density[]): Packed {
  const graph = siteGraph(study);
  const order = orderAlong(graph);
  const plain = storeysOf(graph);
  const texts = textPlans(study, leadsAmongLeaves(arrange(graph, plain, order)));
  const scale = ({ width, height }: Packed) => Math.min(1, AIM.width / width, AIM.height / height);
  let best: Packed | undefined;
  for (const { descent, rows: most, tiers } of densities) {
    const storeys = foldStoreys(graph, plain, order, tiers);
    const arrangement = arrange(graph, storeys, order);
    const rows = hangRows(graph, storeys, arrangement, most);
    const packed = pack({ study, storeys, arrangement, rows, texts, descent });
    if (!best || scale(packed) > WORTH * scale(best)) best = packed;
    if (scale(best) >= READABLE) break;
  }
  return best as Packed;
}

function pack(packing: Packing): Packed {
  const topY =
    MARGIN +
    Math.max(
      PLATE_HEIGHT + PLATE_LIFT,
      ...packing.arrangement.feeds.flat().map((part) => sourceDepth(packing.texts, part)),
    );
  let left = MARGIN;
  let bottom = topY;
  const islands = packing.storeys.tops.map((tops, index): PackedIsland => {
    const block = packIsland(packing, tops);
    const own = block.rows.filter((row) => row !== undefined);
    const [leftmost, rightmost] = [Math.min(...own.map((r) => r.left)), Math.max(...own.map((r) => r.right))];
    const content = contentOf(block, left - leftmost);
    left += rightmost - leftmost + ISLAND_GAP;
    const lanes = assignLanes(packing, content);
    const depths = islandDepths(packing, content, lanes, topY);
    bottom = Math.max(bottom, depths.bottom);
    return { index, content, lanes, depths };
  });
  return { packing, islands, width: left - ISLAND_GAP + MARGIN, height: bottom + MARGIN };
}

function packIsland(packing: Packing, tops: number[]): Block {
  const block = emptyBlock();
  for (const top of tops) {
    const next = packTop(packing, top);
    addBlock(block, next, block.rows.length > 0 ? shiftBeside(block, next, gapRule(packing)) : 0);
  }
  return block;
}

function placeIsland(packing: Packing, island: PackedIsland, into: Layout): void {
  const { content, lanes, depths, index } = island;
  const { study, arrangement } = packing;
  const bars = new Map<string, BusPlace>();
  for (const bar of content.bars) {
    const place = placeBusbar(packing, bar, index, depths);
    bars.set(place.id, place);
    into.buses.push(place);
  }
  const laneOf = new Map(lanes.map((lane) => [lane.part.id, lane]));
  for (const symbol of content.symbols) {
    const lane = laneOf.get(symbol.part.id);
    const route = lane && {
      x: lane.arrival.x,
      y: (depths.laneY[lane.storey] ?? 0) + lane.track * LANE_PITCH,
    };
    into.parts.push(placePart(packing, symbol, bars, depths, route));
  }
  for (const tie of arrangement.ties) {
    const left = bars.get(study.buses[tie.left]?.id ?? '');
    const right = bars.get(study.buses[tie.right]?.id ?? '');
    if (left && right) into.parts.push(placeTie(packing, tie.part, left, right));
  }
}

function inFileOrder(layout: Layout, study: Study): Layout {
  const busRank = new Map(study.buses.map((bus, index) => [bus.id, index]));
  const partRank = new Map(study.elements.map((part, index) => [part.id, index]));
  const by = (rank: Map<string, number>) => (a: { id: string }, b: { id: string }) =>
    (rank.get(a.id) ?? 0) - (rank.get(b.id) ?? 0);
  return { ...layout, buses: layout.buses.sort(by(busRank)), parts: layout.parts.sort(by(partRank)) };
}
