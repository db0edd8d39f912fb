/** One source's current at an order; background distortion of the supply comes as a voltage instead. */
export interface Injection {
  h: number;
  /** rms amperes of the worst phase; 0 for a background entry. */
  amps: number;
  /** The source's name, or the supply's for background. */
  name: string;
  /** Background voltage in per cent of nominal, where the entry is one. */
  backgroundPercent?: number;
}

/** All that is injected at one order. */
export interface InjectedOrder {
  h: number;
  /** Currents of all sources added by magnitude: what they give if their angles fall together. */
  amps: number;
  backgroundPercent: number;
  sources: readonly Injection[];
}

/** Injections gathered by order, ascending. */
export function injectedOrders(injections: readonly Injection[]): InjectedOrder[] {
  const byOrder = new Map<number, Injection[]>();
  for (const injection of injections) {
    if (!(injection.h >= 2)) continue;
    byOrder.set(injection.h, [...(byOrder.get(injection.h) ?? []), injection]);
  }
  return [...byOrder.entries()]
    .map(([h, sources]) => ({
      h,
      amps: sources.reduce((sum, source) => sum + source.amps, 0),
      backgroundPercent: sources.reduce((sum, source) => sum + (source.backgroundPercent ?? 0), 0),
      sources,
    }))
    .sort((a, b) => a.h - b.h);
}

const SHORTEST = 2;

/** Height of each order's tick: proportional to its current, the largest `tallest` high, none invisible. */
export function injectionHeights(orders: readonly InjectedOrder[], tallest: number): number[] {
  const largest = Math.max(0, ...orders.map((order) => order.amps));
  return orders.map((order) =>
    order.amps > 0 && largest > 0 ? Math.max(SHORTEST, (order.amps / largest) * tallest) : 0,
  );
}
