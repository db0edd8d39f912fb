import { formatNumber } from '../../study/index.ts';
import type { OrderAxis } from './orderAxis.ts';

/** A mark on the order axis; labels are absent where they would crowd a more telling one. */
export interface OrderTick {
  order: number;
  x: number;
  label: string | null;
  hzLabel: string | null;
}

/** Characteristic orders of six- and twelve-pulse bridges and the triplens a reader looks for first. */
const TELLING = [1, 5, 7, 11, 13, 3, 25, 17, 19, 23, 49, 35, 37, 29, 31, 47, 41, 43];
const FINE_STEPS = [0.5, 0.2, 0.1, 0.05, 0.02, 0.01];
const LABEL_GAP = 6;
const PLAIN_INTEGER_SPACING = 40;
const FINE_SPACING = 44;
const MARK_SPACING = 3.5;

/**
 * Ticks of the axis with order and hertz labels that never overlap; letters are `fontSize` high. `injected`
 * orders are labelled next after the characteristic ones.
 */
export function orderTicks(
  axis: OrderAxis,
  frequencyHz: number,
  fontSize: number,
  injected: readonly number[] = [],
): OrderTick[] {
  const shown = injected.filter((order) => Number.isInteger(order) && inView(axis, order));
  const labelled = [...tellingOrders(axis), ...shown, ...plainIntegers(axis), ...fineOrders(axis)];
  const ordersKept = keepApart(axis, labelled, (order) => orderLabel(order), fontSize);
  const hzKept = keepApart(axis, ordersKept, (order) => hzLabel(order * frequencyHz), fontSize);
  const marks = new Set([...ordersKept, ...bareIntegers(axis)]);
  return [...marks]
    .sort((a, b) => a - b)
    .map((order) => ({
      order,
      x: axis.x(order),
      label: ordersKept.includes(order) ? orderLabel(order) : null,
      hzLabel: hzKept.includes(order) ? hzLabel(order * frequencyHz) : null,
    }));
}

function inView(axis: OrderAxis, order: number): boolean {
  return order >= axis.domain.low && order <= axis.domain.high;
}

function tellingOrders(axis: OrderAxis): number[] {
  return TELLING.filter((order) => inView(axis, order));
}

function integersInView(axis: OrderAxis): number[] {
  const first = Math.ceil(axis.domain.low);
  const last = Math.floor(axis.domain.high);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => first + i).filter((h) => h >= 1);
}

function spacingAt(axis: OrderAxis, order: number, step: number): number {
  return axis.x(order + step) - axis.x(order);
}

function plainIntegers(axis: OrderAxis): number[] {
  return integersInView(axis).filter(
    (h) => !TELLING.includes(h) && spacingAt(axis, h, 1) >= PLAIN_INTEGER_SPACING,
  );
}

function bareIntegers(axis: OrderAxis): number[] {
  return integersInView(axis).filter((h) => spacingAt(axis, h, 1) >= MARK_SPACING);
}

/** Fractions are labelled step by step, and a step only when it fits along the whole view. */
function fineOrders(axis: OrderAxis): number[] {
  const found: number[] = [];
  for (const step of FINE_STEPS) {
    if (spacingAt(axis, axis.domain.high, step) < FINE_SPACING) break;
    const first = Math.ceil(axis.domain.low / step);
    const last = Math.floor(axis.domain.high / step);
    for (let i = first; i <= last; i++) found.push(Number((i * step).toFixed(2)));
  }
  return found.filter((order) => !Number.isInteger(order));
}

function keepApart(
  axis: OrderAxis,
  orders: readonly number[],
  text: (order: number) => string,
  fontSize: number,
): number[] {
  const kept: { order: number; low: number; high: number }[] = [];
  for (const order of orders) {
    const half = (text(order).length * fontSize * 0.52) / 2;
    const low = axis.x(order) - half;
    const high = axis.x(order) + half;
    const free = kept.every((other) => high + LABEL_GAP < other.low || low > other.high + LABEL_GAP);
    if (free && !kept.some((other) => other.order === order)) kept.push({ order, low, high });
  }
  return kept.map((tick) => tick.order);
}

function orderLabel(order: number): string {
  return String(order);
}

function hzLabel(hz: number): string {
  const rounded = Math.round(hz * 10) / 10;
  return formatNumber(rounded, { digits: 5 });
}
