import type { SeriesElement, ShuntElement, Study } from '../../study/index.ts';
import { symbolShape } from '../symbols/symbolShape.ts';
import type { SymbolX } from './block.ts';
import type { Lane } from './islandDepths.ts';
import { leafLabelWidth, sideLabel } from './labels.ts';
import {
  LEAF_TEXT_DEPTH,
  LINE_PX,
  MARK_HEIGHT,
  MARK_WIDTH,
  SIDE_TEXT_OFFSET,
  SOURCE_HEIGHT,
  STACKED_MARK_WIDTH,
  SYMBOL_DEPTH,
} from './measures.ts';
import type { Box, BusPlace, PartEnd, PartPlace, Point } from './types.ts';

export interface Route {
  lane: Lane;
  y: number;
}

/** Name, plate and two lines of readings beside a symbol, three below it. */
const SIDE_LINES = 4;
const LEAF_LINES = 5;

function endsOf(part: SeriesElement | ShuntElement): [string, string] {
  return 'from' in part ? [part.from, part.to] : [part.bus, part.bus];
}

/** The place of a part standing at x: symbol, conductors to its busbars, box of its text. */
export function placePart(
  study: Study,
  symbol: SymbolX,
  bars: Map<string, BusPlace>,
  route: Route | undefined,
): PartPlace {
  const { part, x } = symbol;
  const known = endsOf(part)
    .map((id) => bars.get(id))
    .filter((bar) => bar !== undefined);
  const upper = upperOf(known, x);
  if (!upper) throw new RangeError(`part ${part.id} is placed without a busbar`);
  if (symbol.hang === 'leads-on' && 'from' in part) {
    const lower = known.find((bar) => bar !== upper) ?? upper;
    return placeLead(study, part, x, upper, lower, route);
  }
  return symbol.hang === 'above' ? placeFeed(study, part, x, upper) : placeLeaf(study, part, x, upper);
}

/** Of two busbars the one in the higher storey; in one storey the one the part stands under. */
function upperOf(bars: BusPlace[], x: number): BusPlace | undefined {
  const [a, b] = bars;
  if (!a || !b || a === b) return a;
  if (a.storey !== b.storey) return a.storey < b.storey ? a : b;
  return x >= a.x1 && x <= a.x2 ? a : b;
}

function common(part: SeriesElement | ShuntElement, bus: string, centre: Point) {
  return { id: part.id, kind: part.kind, bus, x: centre.x, y: centre.y };
}

function placeLeaf(study: Study, part: SeriesElement | ShuntElement, x: number, bar: BusPlace): PartPlace {
  const shape = symbolShape(part);
  const centre = { x, y: bar.y + SYMBOL_DEPTH };
  const width = leafLabelWidth(part, study);
  return {
    ...common(part, bar.id, centre),
    hang: 'below',
    top: { x, y: bar.y },
    ends: [
      {
        bus: bar.id,
        path: [
          { x, y: bar.y },
          { x, y: centre.y - shape.reach },
        ],
      },
    ],
    label: { x: x - width / 2, y: bar.y + LEAF_TEXT_DEPTH, width, height: LEAF_LINES * LINE_PX },
    align: 'middle',
    oneLine: false,
    mark: {
      x: x + SIDE_TEXT_OFFSET,
      y: centre.y - MARK_HEIGHT,
      width: STACKED_MARK_WIDTH,
      height: 2 * MARK_HEIGHT,
    },
  };
}

function sideBox(
  study: Study,
  part: SeriesElement | ShuntElement,
  centre: Point,
): { label: Box; mark: Box; oneLine: boolean } {
  const { width, oneLine } = sideLabel(part, study);
  const height = (oneLine ? SIDE_LINES - 1 : SIDE_LINES) * LINE_PX;
  return {
    label: { x: centre.x + SIDE_TEXT_OFFSET, y: centre.y - height / 2, width, height },
    mark: { x: centre.x + SIDE_TEXT_OFFSET, y: centre.y + 31, width: MARK_WIDTH, height: MARK_HEIGHT },
    oneLine,
  };
}

function placeFeed(study: Study, part: SeriesElement | ShuntElement, x: number, bar: BusPlace): PartPlace {
  const shape = symbolShape(part);
  const centre = { x, y: bar.y - SOURCE_HEIGHT };
  return {
    ...common(part, bar.id, centre),
    hang: 'above',
    top: { x, y: bar.y },
    ends: [
      {
        bus: bar.id,
        path: [
          { x, y: bar.y },
          { x, y: centre.y + shape.reach },
        ],
      },
    ],
    ...sideBox(study, part, centre),
    align: 'start',
  };
}

function placeLead(
  study: Study,
  part: SeriesElement,
  x: number,
  upper: BusPlace,
  lower: BusPlace,
  route: Route | undefined,
): PartPlace {
  const reach = symbolShape(part).reach;
  const centre = { x, y: upper.y + SYMBOL_DEPTH };
  const foot = { x: route ? route.lane.arrival.x : x, y: lower.y };
  const bends =
    route && foot.x !== x
      ? [
          { x: foot.x, y: route.y },
          { x, y: route.y },
        ]
      : [];
  const ends: PartEnd[] = [
    {
      bus: upper.id,
      path: [
        { x, y: upper.y },
        { x, y: centre.y - reach },
      ],
    },
    { bus: lower.id, path: [foot, ...bends, { x, y: centre.y + reach }] },
  ];
  return {
    ...common(part, upper.id, centre),
    hang: 'leads-on',
    top: { x, y: upper.y },
    foot: { ...foot, bus: lower.id },
    ends,
    ...sideBox(study, part, centre),
    align: 'start',
  };
}

/** A tie lies on its side between the ends of two bars, its text centred below. */
export function placeTie(study: Study, part: SeriesElement, left: BusPlace, right: BusPlace): PartPlace {
  const reach = symbolShape(part).reach;
  const centre = { x: (left.x2 + right.x1) / 2, y: left.y };
  const width = leafLabelWidth(part, study);
  return {
    ...common(part, left.id, centre),
    hang: 'across',
    top: { x: left.x2, y: left.y },
    foot: { x: right.x1, y: right.y, bus: right.id },
    ends: [
      {
        bus: left.id,
        path: [
          { x: left.x2, y: left.y },
          { x: centre.x - reach, y: left.y },
        ],
      },
      {
        bus: right.id,
        path: [
          { x: right.x1, y: right.y },
          { x: centre.x + reach, y: right.y },
        ],
      },
    ],
    label: { x: centre.x - width / 2, y: centre.y + 26, width, height: LEAF_LINES * LINE_PX },
    align: 'middle',
    oneLine: false,
    mark: { x: centre.x - 50, y: centre.y - 26 - MARK_HEIGHT, width: MARK_WIDTH, height: MARK_HEIGHT },
  };
}
