import { scaleLog } from 'd3';

/** The stretch of the frequency axis in view, in harmonic orders h = f/fn; 0 < low < high. */
export interface OrderDomain {
  low: number;
  high: number;
}

/** Maps orders to figure units and back on a logarithmic axis. */
export interface OrderAxis {
  domain: OrderDomain;
  left: number;
  right: number;
  x(order: number): number;
  order(x: number): number;
}

export function orderAxis(domain: OrderDomain, left: number, right: number): OrderAxis {
  if (!(domain.low > 0 && domain.high > domain.low)) {
    throw new RangeError(`order axis from ${domain.low} to ${domain.high}: allowed is 0 < low < high`);
  }
  const scale = scaleLog().domain([domain.low, domain.high]).range([left, right]);
  return { domain, left, right, x: (order) => scale(order), order: (x) => scale.invert(x) };
}

export function clampOrder(order: number, domain: OrderDomain): number {
  return Math.min(domain.high, Math.max(domain.low, order));
}

const NARROWEST_RATIO = 1.02;

/** The domain stretched by `factor` (< 1 zooms in) about an order that keeps its place, within `full`. */
export function zoomDomain(view: OrderDomain, full: OrderDomain, about: number, factor: number): OrderDomain {
  const fullSpan = Math.log(full.high / full.low);
  const span = Math.log(view.high / view.low);
  const wanted = Math.min(fullSpan, Math.max(Math.log(NARROWEST_RATIO), span * factor));
  const share = Math.log(clampOrder(about, view) / view.low) / span;
  return slideInside(Math.log(clampOrder(about, view)) - share * wanted, wanted, full);
}

/** The domain moved along the axis by `shift` natural-logarithm units, stopped at the ends of `full`. */
export function panDomain(view: OrderDomain, full: OrderDomain, shift: number): OrderDomain {
  return slideInside(Math.log(view.low) + shift, Math.log(view.high / view.low), full);
}

/** The domain moved just far enough to show an order with a little room beside it. */
export function revealOrder(view: OrderDomain, full: OrderDomain, order: number): OrderDomain {
  const span = Math.log(view.high / view.low);
  const at = Math.log(order);
  if (order < view.low) return slideInside(at - span * 0.1, span, full);
  if (order > view.high) return slideInside(at - span * 0.9, span, full);
  return view;
}

function slideInside(logLow: number, span: number, full: OrderDomain): OrderDomain {
  const low = Math.min(Math.log(full.high) - span, Math.max(Math.log(full.low), logLow));
  return { low: Math.max(full.low, Math.exp(low)), high: Math.min(full.high, Math.exp(low + span)) };
}
