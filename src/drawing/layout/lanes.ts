import type { SeriesElement } from '../../study/index.ts';
import type { ArrivalX, BlockContent } from './block.ts';
import type { Packing } from './packing.ts';

/** The horizontal run of a part's conductor from below its symbol to the busbar it arrives at. */
export interface Lane {
  part: SeriesElement;
  arrival: ArrivalX;
  /** The storey below whose busbars' rows it runs, and its track there (0 uppermost). */
  storey: number;
  track: number;
  fromX: number;
}

/** Two conductors closer than this look like one. */
const APART = 5;

/**
 * Lanes of an island. Runs that overlap sideways get tracks of their own, in the order that crosses least; no
 * arrival stands in line with the foot of another conductor.
 */
export function assignLanes(packing: Packing, content: BlockContent): Lane[] {
  const { storeys } = packing;
  const symbolX = new Map(content.symbols.map((symbol) => [symbol.part.id, symbol.x]));
  const lanes = content.arrivals.map((arrival): Lane => {
    const storey = storeys.storey[arrival.bus] ?? 0;
    return {
      part: arrival.part,
      arrival,
      storey: arrival.from === 'above' ? storey - 1 : storey,
      track: 0,
      fromX: symbolX.get(arrival.part.id) ?? arrival.x,
    };
  });
  for (const storey of new Set(lanes.map((lane) => lane.storey))) {
    const own = lanes.filter((lane) => lane.storey === storey);
    for (const lane of own) if (lane.arrival.from === 'above') keepApart(packing, lane, own, content);
    assignTracks(own);
  }
  return lanes;
}

/** Moves an arrival along its bar until it stands clear of the plate and of every other conductor. */
function keepApart(packing: Packing, lane: Lane, own: readonly Lane[], content: BlockContent): void {
  const { study, texts } = packing;
  const bar = content.bars.find(({ bus }) => bus === lane.arrival.bus);
  const data = study.buses[lane.arrival.bus];
  if (!bar || !data) return;
  const plate = { left: bar.plateX - 2 * APART, right: bar.plateX + texts.plate(data).width + 2 * APART };
  const taken = [
    ...own.flatMap((other) => (other === lane ? [] : [other.arrival.x])),
    ...content.symbols.flatMap(({ part, hang, x }) => (hang === 'leads-on' && part !== lane.part ? [x] : [])),
  ];
  const free = (x: number) =>
    x > bar.x1 + APART &&
    x < bar.x2 - APART &&
    (x < plate.left || x > plate.right) &&
    taken.every((other) => Math.abs(other - x) >= APART);
  const wish = lane.arrival.x;
  for (let step = 0; step * APART < bar.x2 - bar.x1; step++) {
    const found = [wish + step * APART, wish - step * APART].find(free);
    if (found !== undefined) {
      lane.arrival.x = found;
      return;
    }
  }
}

function assignTracks(lanes: Lane[]): void {
  const above = lanes.map((lane) => lanes.filter((other) => other !== lane && mustBeAbove(other, lane)));
  const done = new Set<Lane>();
  const open = [...lanes].sort((a, b) => leftOf(a) - leftOf(b));
  while (open.length > 0) {
    const next =
      open.find((lane) => above[lanes.indexOf(lane)]?.every((other) => done.has(other))) ?? open[0];
    if (!next) return;
    const over = [...done].filter((other) => overlaps(other, next));
    next.track = over.reduce((track, other) => Math.max(track, other.track + 1), 0);
    done.add(next);
    open.splice(open.indexOf(next), 1);
  }
}

const leftOf = (lane: Lane) => Math.min(lane.fromX, lane.arrival.x);
const rightOf = (lane: Lane) => Math.max(lane.fromX, lane.arrival.x);

function overlaps(a: Lane, b: Lane): boolean {
  return leftOf(a) <= rightOf(b) + 2 * APART && leftOf(b) <= rightOf(a) + 2 * APART;
}

/** Whether `a` above `b` crosses less than `b` above `a`. */
function mustBeAbove(a: Lane, b: Lane): boolean {
  return overlaps(a, b) && crossings(a, b) < crossings(b, a);
}

/** Crossings of two runs of which `upper` is the higher one. */
function crossings(upper: Lane, lower: Lane): number {
  const inside = (x: number, lane: Lane) => x > leftOf(lane) && x < rightOf(lane);
  // The lower run's foot comes down from above through the upper run; the upper one's arrival goes down through
  // the lower run, or comes up to its busbar clear of it.
  const foot = inside(lower.fromX, upper) ? 1 : 0;
  const down = upper.arrival.from === 'above' && inside(upper.arrival.x, lower) ? 1 : 0;
  const up = lower.arrival.from === 'below' && inside(lower.arrival.x, upper) ? 1 : 0;
  return foot + down + up;
}
