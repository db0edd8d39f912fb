import type { BarX } from './block.ts';
import type { IslandDepths } from './islandDepths.ts';
import { BUS_MARK_ROOM, DIAL_RADIUS, DIAL_ROOM, PLATE_HEIGHT, PLATE_LIFT } from './measures.ts';
import type { Packing } from './packing.ts';
import type { BusPlace } from './types.ts';

const GAP = 6;

/** The place of a busbar: its bar, and the plate above it with dial, name, volts, mark and letters. */
export function placeBusbar(packing: Packing, bar: BarX, island: number, depths: IslandDepths): BusPlace {
  const { study, storeys, texts } = packing;
  const data = study.buses[bar.bus] ?? { id: '', nominalV: 0 };
  const storey = storeys.storey[bar.bus] ?? 0;
  const y = depths.barY[storey] ?? 0;
  const plan = texts.plate(data);
  const dialRoom = texts.drawn.has('dials') ? DIAL_ROOM : 0;
  const top = y - PLATE_LIFT - PLATE_HEIGHT;
  const left = bar.plateX + dialRoom;
  const markX = left + plan.nameWidth + GAP;
  return {
    id: data.id,
    x1: bar.x1,
    x2: bar.x2,
    y,
    depth: depths.depth[storey] ?? 0,
    storey,
    island,
    name: plan.name,
    label: { x: left, y: top + 2, width: plan.width - dialRoom, height: PLATE_HEIGHT - 2 },
    ...(dialRoom > 0 ? { dial: { x: bar.plateX + DIAL_RADIUS, y: top + DIAL_RADIUS + 1 } } : {}),
    mark: { x: markX, y: top + 2, width: BUS_MARK_ROOM, height: PLATE_HEIGHT / 2 },
  };
}
