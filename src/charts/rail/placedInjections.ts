import { type Box, boxesMeet, boxInside } from '../figure/box.ts';
import { type CurveHeight, curveCrossings } from '../figure/curveCrossings.ts';
import { ampereParts, joinParts } from '../figure/quantityParts.ts';
import { textWidth } from '../figure/textWidth.ts';
import { type InjectedOrder, type Injection, injectedOrders, injectionHeights } from './injections.ts';
import type { OrderAxis } from './orderAxis.ts';
import type { RailLayout } from './railLayout.ts';

export interface PlacedInjection extends InjectedOrder {
  x: number;
  height: number;
  /** Its current over the tick, where there is room. */
  words: { text: string; box: Box } | null;
}

/** The ticks of the injected orders in view, as high as their current. */
export function placedInjections(
  injections: readonly Injection[],
  axis: OrderAxis,
  layout: RailLayout,
): PlacedInjection[] {
  const orders = injectedOrders(injections);
  const heights = injectionHeights(orders, Math.min(40, (layout.axisY - layout.curveTop) * 0.3));
  return orders
    .map((order, i) => ({ ...order, x: axis.x(order.h), height: heights[i] ?? 0, words: null }))
    .filter((order) => order.h >= axis.domain.low && order.h <= axis.domain.high);
}

/** Over the tick, else beside its head. */
function places(tick: PlacedInjection, axisY: number, width: number, letterSize: number): Box[] {
  const height = letterSize * 1.25;
  const top = axisY - tick.height;
  const beside = Math.min(top, axisY - height - 1);
  return [
    { x: tick.x - width / 2, y: top - height - 2, width, height },
    { x: tick.x + 7, y: beside, width, height },
    { x: tick.x - 7 - width, y: beside, width, height },
  ];
}

/** What the words over the ticks keep clear of. */
export interface TickRoom {
  bounds: Box;
  curves: readonly CurveHeight[];
  flags: readonly Box[];
  letterSize: number;
}

const TELLING_SHARE = 0.02;

/**
 * The ticks with their currents written over them, the largest first; one whose words would lie on a curve, a
 * flag, another tick or other words goes without.
 */
export function withCurrents(
  ticks: readonly PlacedInjection[],
  axisY: number,
  { bounds, curves, flags, letterSize }: TickRoom,
): PlacedInjection[] {
  const bars = ticks.map((tick) => ({
    x: tick.x - 4,
    y: axisY - tick.height,
    width: 8,
    height: tick.height,
  }));
  const taken: Box[] = [...flags];
  const words = new Map<number, PlacedInjection['words']>();
  const largest = Math.max(0, ...ticks.map((tick) => tick.amps));
  for (const tick of [...ticks].sort((a, b) => b.amps - a.amps)) {
    if (tick.amps <= largest * TELLING_SHARE) continue;
    const text = joinParts(ampereParts(tick.amps, 2));
    const others = bars.filter((bar) => Math.abs(bar.x + 4 - tick.x) > 0.5);
    const free = (box: Box) =>
      boxInside(box, { ...bounds, height: axisY - bounds.y }) &&
      curveCrossings(box, curves) === 0 &&
      ![...taken, ...others].some((one) => boxesMeet(one, box, 2));
    const box = places(tick, axisY, textWidth(text, letterSize), letterSize).find(free);
    if (!box) continue;
    taken.push(box);
    words.set(tick.h, { text, box });
  }
  return ticks.map((tick) => ({ ...tick, words: words.get(tick.h) ?? null }));
}
