import type { Study } from '../../study/index.ts';
import { type Arrangement, arrange } from './alongBusbar.ts';
import { addBlock, type Block, emptyBlock, shiftBeside } from './block.ts';
import { assignLanes, type IslandDepths, islandDepths, type Lane } from './islandDepths.ts';
import { busLabelWidth } from './labels.ts';
import {
  BUS_LABEL_HEIGHT,
  BUS_MARK_ROOM,
  DIAL_RADIUS,
  ISLAND_GAP,
  LANE_PITCH,
  MARGIN,
  MARK_HEIGHT,
} from './measures.ts';
import { gapRule, type Packing, packBusbar } from './packBusbar.ts';
import { placePart, placeTie } from './placePart.ts';
import { type SiteGraph, siteGraph } from './siteGraph.ts';
import { type Storeys, storeysOf } from './storeys.ts';
import type { BusPlace, Layout, PartPlace } from './types.ts';

/** Smallest paper the drawing asks for, so that an empty study still has room for its hint. */
const EMPTY = { width: 640, height: 400 };

/**
 * Places every busbar, part, conductor and line of text of a study's single-line diagram.
 *
 * Busbars stand in storeys (fewest series parts from the supply), parts hang below them in the order of
 * `view.orderAlong`, else of the file. The same study gives the same layout; in service or not and the case
 * play no part. Everything is anchored left and top, so an edit moves only what stands right of or below it.
 * Parts at unknown busbars, and series parts with both ends on one busbar, are left out.
 */
export function layoutStudy(study: Study): Layout {
  const graph = siteGraph(study);
  const storeys = storeysOf(graph);
  const arrangement = arrange(graph, storeys);
  const layout: Layout = { ...EMPTY, buses: [], parts: [] };
  let left = MARGIN;
  let bottom = EMPTY.height - MARGIN;
  graph.islands.forEach((island, index) => {
    const block = packIsland({ study, storeys, arrangement }, storeys.tops[index] ?? []);
    const leftmost = Math.min(...block.rows.map((row) => row.left));
    const rightmost = Math.max(...block.rows.map((row) => row.right));
    const placed = emptyBlock();
    addBlock(placed, block, left - leftmost);
    left += rightmost - leftmost + ISLAND_GAP;
    bottom = Math.max(bottom, placeIsland({ graph, storeys, arrangement }, index, island, placed, layout));
  });
  layout.width = Math.max(EMPTY.width, left - ISLAND_GAP + MARGIN);
  layout.height = bottom + MARGIN;
  return inFileOrder(layout, study);
}

function packIsland(packing: Packing, tops: number[]): Block {
  const block = emptyBlock();
  for (const top of tops) {
    const next = packBusbar(packing, top, packing.arrangement.feeds[top] ?? []).block;
    const shift = block.rows.length > 0 ? shiftBeside(block, next, gapRule(packing)) : 0;
    addBlock(block, next, shift);
  }
  return block;
}

interface Site {
  graph: SiteGraph;
  storeys: Storeys;
  arrangement: Arrangement;
}

/** Turns a packed island into places; returns its lower edge. */
function placeIsland(site: Site, index: number, island: number[], block: Block, into: Layout): number {
  const { graph, storeys, arrangement } = site;
  const lanes = assignLanes(block, storeys);
  const depths = islandDepths(graph, storeys, arrangement, island, lanes);
  const bars = new Map<string, BusPlace>();
  for (const bar of block.bars) {
    const place = placeBusbar(site, bar.bus, bar.x1, bar.x2, index, depths);
    bars.set(place.id, place);
    into.buses.push(place);
  }
  const laneOf = new Map(lanes.map((lane): [string, Lane] => [lane.arrival.part.id, lane]));
  for (const symbol of block.symbols) {
    const lane = laneOf.get(symbol.part.id);
    const route = lane && { lane, y: (depths.laneY[lane.storey] ?? 0) + lane.track * LANE_PITCH };
    into.parts.push(placePart(graph.study, symbol, bars, route));
  }
  for (const tie of arrangement.ties) {
    const left = bars.get(graph.study.buses[tie.left]?.id ?? '');
    const right = bars.get(graph.study.buses[tie.right]?.id ?? '');
    if (left && right) into.parts.push(placeTie(graph.study, tie.part, left, right));
  }
  return depths.bottom;
}

function placeBusbar(site: Site, bus: number, x1: number, x2: number, island: number, depths: IslandDepths) {
  const data = site.graph.study.buses[bus] ?? { id: '', nominalV: 0 };
  const storey = site.storeys.storey[bus] ?? 0;
  const y = depths.barY[storey] ?? 0;
  const tiedRight = site.arrangement.ties.some((tie) => tie.left === bus);
  const place: BusPlace = {
    id: data.id,
    x1,
    x2,
    y,
    storey,
    island,
    label: { x: x1, y: y - 6 - BUS_LABEL_HEIGHT, width: busLabelWidth(data), height: BUS_LABEL_HEIGHT },
    mark: { x: x1, y: y + 6, width: BUS_MARK_ROOM - 8, height: MARK_HEIGHT },
    dial: tiedRight ? { x: x2 - DIAL_RADIUS - 2, y: y - DIAL_RADIUS - 4 } : { x: x2 + DIAL_RADIUS + 12, y },
  };
  return place;
}

function inFileOrder(layout: Layout, study: Study): Layout {
  const busRank = new Map(study.buses.map((bus, index) => [bus.id, index]));
  const partRank = new Map(study.elements.map((part, index) => [part.id, index]));
  const by = (rank: Map<string, number>) => (a: { id: string }, b: { id: string }) =>
    (rank.get(a.id) ?? 0) - (rank.get(b.id) ?? 0);
  return {
    ...layout,
    buses: layout.buses.sort(by(busRank)),
    parts: layout.parts.sort(by(partRank)) satisfies PartPlace[],
  };
}
