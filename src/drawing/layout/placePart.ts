import { type SeriesElement, type ShuntElement, symbolSetOf } from '../../study/index.ts';
import { type SymbolShape, symbolShape } from '../symbols/symbolShape.ts';
import type { SymbolX } from './block.ts';
import type { IslandDepths } from './islandDepths.ts';
import type { TextPlan, TextPlans } from './labels.ts';
import {
  BASELINE,
  BUS_MARK_ROOM,
  LEAD,
  LEAF_TEXT_DEPTH,
  MARK_HEIGHT,
  MARK_OFFSET,
  MARK_WIDTH,
  SIDE_TEXT_DEPTH,
  SIDE_TEXT_OFFSET,
  SOURCE_HALF,
  SYMBOL_DEPTH,
  TIE_MARK_HEIGHT,
  TIE_TEXT_DEPTH,
} from './measures.ts';
import type { Packing } from './packing.ts';
import type { BusPlace, PartEnd, PartPlace, PartText, Point } from './types.ts';

type Part = SeriesElement | ShuntElement;

/** Top of a row to the top of the mark beside a conductor. */
const MARK_DEPTH = 4;
/** The mark itself and a gap. */
const MARK_DISC = 19;
/** Foot of a source's text above its busbar. */
const SOURCE_LIFT = 7;
/** Height a source's symbol and conductor need. */
const LEAST_SOURCE = 56;

/** Where a bent conductor runs along and meets its second busbar. */
export interface Route {
  x: number;
  y: number;
}

function endsOf(part: Part): [string, string] {
  return 'from' in part ? [part.from, part.to] : [part.bus, part.bus];
}

/** The place of a part standing at x: symbol, conductors to its busbars, box of its text. */
export function placePart(
  packing: Packing,
  symbol: SymbolX,
  bars: Map<string, BusPlace>,
  depths: IslandDepths,
  route: Route | undefined,
): PartPlace {
  const { part, x } = symbol;
  const known = endsOf(part)
    .map((id) => bars.get(id))
    .filter((bar) => bar !== undefined);
  const upper = upperOf(known, x);
  if (!upper) throw new RangeError(`part ${part.id} is placed without a busbar`);
  if (symbol.hang === 'leads-on') {
    const lower = known.find((bar) => bar !== upper) ?? upper;
    return placeLead(packing, part, x, upper, lower, route);
  }
  if (symbol.hang === 'above') return placeFeed(packing, part, x, upper);
  return placeLeaf(packing, part, x, upper, depths.rowY[upper.storey]?.[symbol.row] ?? upper.y);
}

/** Of two busbars the one in the higher storey; in one storey the one the part stands under. */
function upperOf(bars: BusPlace[], x: number): BusPlace | undefined {
  const [a, b] = bars;
  if (!a || !b || a === b) return a;
  if (a.storey !== b.storey) return a.storey < b.storey ? a : b;
  return x >= a.x1 && x <= a.x2 ? a : b;
}

function shapeOf({ study }: Packing, part: Part): SymbolShape {
  return symbolShape(part, symbolSetOf(study));
}

function textOf({ align, name, plateLines, readings, columns }: TextPlan): PartText {
  return { align, name, plateLines, readings, columns };
}

function straight(bus: string, x: number, from: number, to: number): PartEnd {
  return {
    bus,
    path: [
      { x, y: from },
      { x, y: to },
    ],
  };
}

function placeLeaf(packing: Packing, part: Part, x: number, bar: BusPlace, rowY: number): PartPlace {
  const plan = packing.texts.under(part);
  const y = rowY + SYMBOL_DEPTH;
  return {
    id: part.id,
    kind: part.kind,
    bus: bar.id,
    x,
    y,
    hang: 'below',
    top: { x, y: bar.y },
    ends: [straight(bar.id, x, bar.y, y - shapeOf(packing, part).reach)],
    text: textOf(plan),
    label: { x: x - plan.width / 2, y: rowY + LEAF_TEXT_DEPTH, width: plan.width, height: plan.height },
    mark: { x: x + MARK_OFFSET, y: rowY + MARK_DEPTH, width: MARK_WIDTH, height: MARK_HEIGHT },
    letters: { x: x - MARK_OFFSET, y: rowY + MARK_DEPTH + BASELINE },
  };
}

/** Depth of the text of a source above its busbar. */
export function sourceDepth(texts: TextPlans, part: Part): number {
  return Math.max(texts.beside(part).height, LEAST_SOURCE) + SOURCE_LIFT + MARK_DEPTH + 4;
}

function placeFeed(packing: Packing, part: Part, x: number, bar: BusPlace): PartPlace {
  const plan = packing.texts.beside(part);
  const top = bar.y - SOURCE_LIFT - Math.max(plan.height, LEAST_SOURCE);
  const y = top + LEAD - 6;
  return {
    id: part.id,
    kind: part.kind,
    bus: bar.id,
    x,
    y,
    hang: 'above',
    top: { x, y: bar.y },
    ends: [straight(bar.id, x, bar.y, y + shapeOf(packing, part).reach)],
    text: textOf(plan),
    label: { x: x + SIDE_TEXT_OFFSET, y: top, width: plan.width, height: plan.height },
    ...markLeft(x - MARK_OFFSET - SOURCE_HALF, top - 4),
  };
}

/** Room for mark and letters left of a conductor or symbol. */
function markLeft(right: number, top: number): Pick<PartPlace, 'mark' | 'letters'> {
  return {
    mark: { x: right - MARK_WIDTH, y: top, width: MARK_WIDTH, height: MARK_HEIGHT },
    letters: { x: right - MARK_DISC, y: top + BASELINE + 1 },
  };
}

function placeLead(
  packing: Packing,
  part: Part,
  x: number,
  upper: BusPlace,
  lower: BusPlace,
  route: Route | undefined,
): PartPlace {
  const plan = packing.texts.beside(part);
  const { reach } = shapeOf(packing, part);
  const y = upper.y + SYMBOL_DEPTH;
  const foot = { x: route?.x ?? x, y: lower.y };
  const bends: Point[] =
    route && foot.x !== x
      ? [
          { x: foot.x, y: route.y },
          { x, y: route.y },
        ]
      : [];
  return {
    id: part.id,
    kind: part.kind,
    bus: upper.id,
    x,
    y,
    hang: 'leads-on',
    top: { x, y: upper.y },
    foot: { ...foot, bus: lower.id },
    ends: [
      straight(upper.id, x, upper.y, y - reach),
      { bus: lower.id, path: [foot, ...bends, { x, y: y + reach }] },
    ],
    text: textOf(plan),
    label: { x: x + SIDE_TEXT_OFFSET, y: upper.y + SIDE_TEXT_DEPTH, width: plan.width, height: plan.height },
    ...markLeft(x - MARK_OFFSET, upper.y + MARK_DEPTH),
  };
}

/** A tie lies on its side between the ends of two bars, mark, letters and text below it. */
export function placeTie(packing: Packing, part: SeriesElement, left: BusPlace, right: BusPlace): PartPlace {
  const plan = packing.texts.under(part);
  const { reach } = shapeOf(packing, part);
  const [x, y] = [(left.x2 + right.x1) / 2, left.y];
  const along = (bar: BusPlace, from: number, to: number): PartEnd => ({
    bus: bar.id,
    path: [
      { x: from, y },
      { x: to, y },
    ],
  });
  return {
    id: part.id,
    kind: part.kind,
    bus: left.id,
    x,
    y,
    hang: 'across',
    top: { x: left.x2, y },
    foot: { x: right.x1, y, bus: right.id },
    ends: [along(left, left.x2, x - reach), along(right, right.x1, x + reach)],
    text: textOf(plan),
    label: {
      x: x - plan.width / 2,
      y: y + TIE_TEXT_DEPTH + TIE_MARK_HEIGHT,
      width: plan.width,
      height: plan.height,
    },
    mark: { x: x - 18, y: y + TIE_TEXT_DEPTH, width: BUS_MARK_ROOM, height: TIE_MARK_HEIGHT },
    letters: { x: x - 22, y: y + TIE_TEXT_DEPTH + BASELINE },
  };
}
