import type { SeriesElement } from '../../study/index.ts';
import type { Block } from './block.ts';
import { ARRIVAL_PITCH, BAR_INSET, PLATE_CLEAR } from './measures.ts';

/** A busbar with all that hangs below and stands beside it; the left end of the bar is at x = 0. */
export interface PackedBusbar {
  block: Block;
  bus: number;
  length: number;
  /** Width of its plate: dial, name and volts. */
  plate: number;
  /** Columns arriving from above besides the parts it hangs from. */
  columns: SeriesElement[];
}

/** First and last place along a bar where conductors may meet it from above, and where its plate then stands. */
export interface Landing {
  from: number;
  to: number;
  plateX(at: number): number;
}

/** The least place at which a conductor meets a bar whose plate stands left of it. */
export function afterPlate(plate: number): number {
  return plate + PLATE_CLEAR;
}

/** The least length of a bar that has room for its plate, `span` px of conductors and further columns. */
export function leastLength(plate: number, span: number, columns: number): number {
  return afterPlate(plate) + span + columns * ARRIVAL_PITCH + BAR_INSET;
}

/** Where `span` px of conductors may land: right of the plate, or left of it with the plate moved beside them. */
export function landings({ length, plate, columns }: PackedBusbar, span: number): Landing[] {
  const further = columns.length * ARRIVAL_PITCH;
  const right = { from: afterPlate(plate), to: length - span - further - BAR_INSET, plateX: () => 0 };
  const left = {
    from: BAR_INSET,
    to: length - span - PLATE_CLEAR - plate - further,
    plateX: (at: number) => at + span + PLATE_CLEAR,
  };
  return [right, left].filter(({ from, to }) => to >= from - 0.01);
}

export function landingAt(packed: PackedBusbar, at: number, span: number): Landing | undefined {
  return landings(packed, span).find(({ from, to }) => at >= from - 0.01 && at <= to + 0.01);
}

/** The place nearest to `at` where the conductors can land. */
export function nearestLanding(packed: PackedBusbar, at: number, span: number): number {
  const places = landings(packed, span).map(({ from, to }) => Math.min(Math.max(at, from), to));
  return places.sort((a, b) => Math.abs(a - at) - Math.abs(b - at))[0] ?? afterPlate(packed.plate);
}

/** Sets the plate clear of conductors landing at `at`, and lands the further columns right of both. */
export function land(packed: PackedBusbar, at: number, span: number): void {
  const { block, bus, plate, columns } = packed;
  const bar = block.bars.find((one) => one.bus === bus);
  if (!bar) return;
  const plateX = landingAt(packed, at, span)?.plateX(at) ?? 0;
  bar.plateX = bar.x1 + plateX;
  const last = plateX > 0 ? plateX + plate + PLATE_CLEAR - ARRIVAL_PITCH : at + span;
  columns.forEach((part, index) => {
    block.arrivals.push({ part, bus, x: bar.x1 + last + (index + 1) * ARRIVAL_PITCH, from: 'above' });
  });
}
