import type { SiteGraph } from './siteGraph.ts';

/** Which storey each busbar stands on and below which busbar it is drawn. */
export interface Storeys {
  /** 0 is the topmost. */
  storey: number[];
  /** The busbar it is drawn below, or −1. */
  above: number[];
  /** The busbar of the same storey it is reached from by a coupler alone, or −1. */
  beside: number[];
  /** Topmost busbars of each island, left to right. */
  tops: number[][];
}

/**
 * Storeys by fewest series parts from the top busbars. A coupler joins busbars of one storey unless the
 * busbar is reached otherwise, so couplers count only for busbars nothing else reaches.
 */
export function storeysOf(graph: SiteGraph): Storeys {
  const count = graph.study.buses.length;
  const result: Storeys = {
    storey: new Array<number>(count).fill(-1),
    above: new Array<number>(count).fill(-1),
    beside: new Array<number>(count).fill(-1),
    tops: [],
  };
  for (const island of graph.islands) {
    const tops = topBusbars(graph, island);
    result.tops.push(tops);
    descend(graph, tops, result);
  }
  return result;
}

function topBusbars(graph: SiteGraph, island: number[]): number[] {
  const volts = (bus: number) => graph.study.buses[bus]?.nominalV ?? 0;
  const has = (bus: number, kind: string) => (graph.hanging[bus] ?? []).some((part) => part.kind === kind);
  for (const kind of ['supply', 'generator']) {
    const fed = island.filter((bus) => has(bus, kind));
    const highest = Math.max(...fed.map(volts));
    // A supply at a lower voltage is a second infeed of the site, not a second top of it.
    if (fed.length > 0) return fed.filter((bus) => volts(bus) > 0.9 * highest);
  }
  const highest = Math.max(...island.map(volts));
  return island.filter((bus) => volts(bus) === highest).slice(0, 1);
}

function descend(graph: SiteGraph, tops: number[], into: Storeys): void {
  const reached = [...tops];
  for (const top of tops) into.storey[top] = 0;
  for (let at = 0; ; ) {
    for (; at < reached.length; at++) {
      const bus = reached[at] ?? 0;
      for (const { part, other } of graph.joins[bus] ?? []) {
        if (part.kind === 'coupler' || into.storey[other] !== -1) continue;
        into.storey[other] = (into.storey[bus] ?? 0) + 1;
        into.above[other] = bus;
        reached.push(other);
      }
    }
    const next = firstCoupled(graph, reached, into);
    if (!next) return;
    into.storey[next.bus] = into.storey[next.beside] ?? 0;
    into.beside[next.bus] = next.beside;
    reached.push(next.bus);
  }
}

function firstCoupled(graph: SiteGraph, reached: number[], { storey }: Storeys) {
  for (const beside of reached) {
    const join = graph.joins[beside]?.find(({ other }) => storey[other] === -1);
    if (join) return { bus: join.other, beside };
  }
  return undefined;
}
