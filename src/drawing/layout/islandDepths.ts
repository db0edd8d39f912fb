import type { Arrangement } from './alongBusbar.ts';
import type { ArrivalX, Block } from './block.ts';
import {
  BARE_ZONE,
  BUS_LABEL_BAND,
  LANE_PITCH,
  LEAF_ZONE,
  MARGIN,
  SOURCE_ZONE,
  TIE_ZONE,
  TRUNK_ZONE,
} from './measures.ts';
import type { SiteGraph } from './siteGraph.ts';
import type { Storeys } from './storeys.ts';

/** The horizontal run of a column from its symbol to the busbar it arrives at. */
export interface Lane {
  arrival: ArrivalX;
  /** The storey below whose busbars' zone it runs, and its track there (0 uppermost). */
  storey: number;
  track: number;
  fromX: number;
}

/** Heights of one island: bar y and the y of the first lane below it, by storey. */
export interface IslandDepths {
  barY: number[];
  laneY: number[];
  bottom: number;
}

/** Lanes that overlap sideways get tracks of their own, so two runs never lie on each other. */
export function assignLanes(block: Block, storeys: Storeys): Lane[] {
  const symbolX = new Map(block.symbols.map((symbol) => [symbol.part.id, symbol.x]));
  const lanes = block.arrivals.map((arrival): Lane => {
    const storey = storeys.storey[arrival.bus] ?? 0;
    return {
      arrival,
      storey: arrival.from === 'above' ? storey - 1 : storey,
      track: 0,
      fromX: symbolX.get(arrival.part.id) ?? arrival.x,
    };
  });
  const extent = (lane: Lane) => [Math.min(lane.fromX, lane.arrival.x), Math.max(lane.fromX, lane.arrival.x)];
  lanes.sort((a, b) => (extent(a)[0] ?? 0) - (extent(b)[0] ?? 0));
  const taken = new Map<number, number[]>();
  for (const lane of lanes) {
    const ends = taken.get(lane.storey) ?? [];
    const [left = 0, right = 0] = extent(lane);
    const free = ends.findIndex((end) => end + LANE_PITCH < left);
    lane.track = free >= 0 ? free : ends.length;
    ends[lane.track] = right;
    taken.set(lane.storey, ends);
  }
  return lanes;
}

/** Storey heights of an island from what hangs in each. */
export function islandDepths(
  graph: SiteGraph,
  storeys: Storeys,
  arrangement: Arrangement,
  island: number[],
  lanes: Lane[],
): IslandDepths {
  const zones: number[] = [];
  const tiedLeft = new Set(arrangement.ties.map((tie) => tie.left));
  for (const bus of island) {
    const storey = storeys.storey[bus] ?? 0;
    let zone = Math.max(zones[storey] ?? 0, tiedLeft.has(bus) ? TIE_ZONE : BARE_ZONE);
    for (const slot of arrangement.slots[bus] ?? []) {
      zone = Math.max(zone, slot.kind === 'leaf' ? LEAF_ZONE : TRUNK_ZONE);
    }
    zones[storey] = zone;
  }
  const own = new Set(island.map((bus) => graph.study.buses[bus]?.id));
  const tracks = (storey: number) =>
    lanes
      .filter((lane) => lane.storey === storey && own.has(graph.study.buses[lane.arrival.bus]?.id))
      .reduce((most, lane) => Math.max(most, lane.track + 1), 0);
  const depths: IslandDepths = { barY: [], laneY: [], bottom: 0 };
  let y = MARGIN + SOURCE_ZONE;
  zones.forEach((zone, storey) => {
    depths.barY.push(y);
    depths.laneY.push(y + zone + LANE_PITCH / 2);
    const lanesHeight = tracks(storey) * LANE_PITCH;
    depths.bottom = y + zone + lanesHeight;
    y += zone + lanesHeight + BUS_LABEL_BAND;
  });
  return depths;
}
