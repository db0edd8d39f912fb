import { scaleLinear } from 'd3';
import { type Box, boxesMeet } from '../figure/box.ts';
import { fixedNumber, plainNumber } from '../figure/quantityParts.ts';
import { textWidth } from '../figure/textWidth.ts';
import type { SpectrumBar } from './spectrumBars.ts';

export interface PlacedBar extends SpectrumBar {
  /** Middle of the bar. */
  x: number;
  top: number;
  limitY: number | null;
  /** Value words over the bar, where they have room. */
  words: { text: string; x: number; y: number } | null;
}

export interface SpectrumModel {
  left: number;
  right: number;
  top: number;
  bottom: number;
  barWidth: number;
  slot: number;
  bars: PlacedBar[];
  orderLabels: { h: number; x: number }[];
  valueTicks: { y: number; label: string }[];
  /** x of any order, for the mark of the rail's handle; null beyond the picture. */
  orderX(order: number): number | null;
}

export interface SpectrumPlace {
  width: number;
  height: number;
  smallSize: number;
  lastOrder: number;
}

const TELLING = [5, 7, 11, 13, 3, 17, 19, 25, 23, 9, 35, 37, 49, 47, 29, 31, 41, 43, 15, 21];
const EVERY_ORDER_SLOT = 15;

/** Bars, limits, labels and value words placed in figure units. */
export function spectrumModel(bars: readonly SpectrumBar[], place: SpectrumPlace): SpectrumModel {
  const { width, height, smallSize, lastOrder } = place;
  const shown = bars.filter((bar) => bar.h <= lastOrder);
  const left = smallSize * 3.2;
  const right = width - 4;
  const top = smallSize * 1.5;
  const bottom = height - smallSize * 1.9;
  const slot = (right - left) / Math.max(1, lastOrder - 1);
  const largest = Math.max(0.1, ...shown.map((bar) => Math.max(bar.percent, bar.limit ?? 0)));
  const y = scaleLinear()
    .domain([0, largest])
    .range([bottom, top + smallSize * 0.6])
    .nice(4);
  const orderX = (order: number) =>
    order < 1.5 || order > lastOrder + 0.5 ? null : left + (order - 1.5) * slot;
  const placed = shown.map((bar) => ({
    ...bar,
    x: left + (bar.h - 1.5) * slot,
    top: y(bar.percent),
    limitY: bar.limit === null ? null : y(bar.limit),
    words: null,
  }));
  return {
    left,
    right,
    top,
    bottom,
    slot,
    barWidth: Math.max(1.5, Math.min(11, slot * 0.62)),
    bars: withWords(placed, place, left),
    orderLabels: orderLabels(placed, smallSize),
    valueTicks: y.ticks(4).map((value) => ({ y: y(value), label: percentLabel(value) })),
    orderX,
  };
}

function percentLabel(value: number): string {
  return `${fixedNumber(value, value < 1 && value > 0 ? (value < 0.1 ? 2 : 1) : value % 1 === 0 ? 0 : 1)} %`;
}

function orderLabels(bars: readonly PlacedBar[], smallSize: number): { h: number; x: number }[] {
  const kept: { h: number; x: number; half: number }[] = [];
  const slot = bars.length > 1 ? (bars[1]?.x ?? 0) - (bars[0]?.x ?? 0) : 0;
  const inTurn = slot >= EVERY_ORDER_SLOT ? [...TELLING, ...bars.map((bar) => bar.h)] : TELLING;
  for (const h of inTurn) {
    const bar = bars.find((one) => one.h === h);
    if (!bar || kept.some((one) => one.h === h)) continue;
    const half = (String(h).length * smallSize * 0.52) / 2;
    if (kept.every((one) => Math.abs(one.x - bar.x) > one.half + half + 5)) kept.push({ h, x: bar.x, half });
  }
  return kept.sort((a, b) => a.h - b.h).map(({ h, x }) => ({ h, x }));
}

const WORDED_BARS = 4;
const WORDED_SHARE = 0.08;

/** Words over the failing and the largest bars, never over one another. */
function withWords(bars: readonly PlacedBar[], place: SpectrumPlace, left: number): PlacedBar[] {
  const taken: Box[] = [];
  const largest = Math.max(0, ...bars.map((bar) => bar.percent));
  const inTurn = [...bars]
    .filter((bar) => bar.fails || bar.percent > WORDED_SHARE * largest)
    .sort((a, b) => Number(b.fails) - Number(a.fails) || b.percent - a.percent)
    .slice(0, WORDED_BARS);
  const words = new Map<number, PlacedBar['words']>();
  for (const bar of inTurn) {
    const text = `${plainNumber(bar.percent, bar.percent < 1 ? 2 : 3)} %`;
    const mark = bar.fails ? place.smallSize : 0;
    const size = { width: textWidth(text, place.smallSize) + mark, height: place.smallSize * 1.2 };
    const x = Math.max(left, Math.min(place.width - size.width - 1, bar.x - size.width / 2));
    const box = { x, y: bar.top - size.height - 2, ...size };
    const hidden = bars.some((other) => other.h !== bar.h && coversBar(box, other));
    if (box.y < 0 || hidden || taken.some((one) => boxesMeet(one, box, 3))) continue;
    taken.push(box);
    words.set(bar.h, { text, x: x + mark, y: bar.top - 4 });
  }
  return bars.map((bar) => ({ ...bar, words: words.get(bar.h) ?? null }));
}

function coversBar(box: Box, bar: PlacedBar): boolean {
  const near = (reach: number) => bar.x > box.x - reach && bar.x < box.x + box.width + reach;
  const limitHit = bar.limitY !== null && bar.limitY > box.y - 2 && bar.limitY < box.y + box.height + 2;
  return (near(3) && bar.top < box.y + box.height) || (near(9) && limitHit);
}
