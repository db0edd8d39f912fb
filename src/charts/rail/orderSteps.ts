import type { OrderAxis } from './orderAxis.ts';

const NEARLY = 1e-9;
const SNAP_PX = 4;
const SNAP_SHARE = 0.25;

/** The next whole order above (+1) or below (−1) a real order. */
export function wholeOrderStep(order: number, direction: 1 | -1): number {
  return direction === 1 ? Math.floor(order + NEARLY) + 1 : Math.ceil(order - NEARLY) - 1;
}

/** The next hundredth of an order. */
export function fineOrderStep(order: number, direction: 1 | -1): number {
  const hundredths = order * 100;
  const next = direction === 1 ? Math.floor(hundredths + 1e-6) + 1 : Math.ceil(hundredths - 1e-6) - 1;
  return next / 100;
}

/** The next of a list of orders (the injected ones) in a direction, or null at its end. */
export function listedOrderStep(orders: readonly number[], order: number, direction: 1 | -1): number | null {
  const ahead = orders.filter((h) => (h - order) * direction > NEARLY);
  if (ahead.length === 0) return null;
  return direction === 1 ? Math.min(...ahead) : Math.max(...ahead);
}

/**
 * The order under a pointer, drawn to a whole order within a few units. Where whole orders lie close
 * together the catch shrinks with their spacing, so that the space between them stays within reach.
 */
export function snappedOrder(axis: OrderAxis, x: number): number {
  const order = axis.order(x);
  const whole = Math.round(order);
  if (whole < 1) return order;
  const catchPx = Math.min(SNAP_PX, SNAP_SHARE * (axis.x(whole + 1) - axis.x(whole)));
  return Math.abs(axis.x(whole) - x) <= catchPx ? whole : order;
}
