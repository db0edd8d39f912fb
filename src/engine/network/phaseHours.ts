import type { SeriesPart } from './Network.ts';

export interface PhaseHours {
  /** Hours by which each node lags the first node of its island in positive sequence, 0 … 11. */
  hours: Int32Array;
  /** Transformers or ties that close a ring whose shifts do not add up to zero. */
  clashes: SeriesPart[];
}

/** No-load phase of every node from the clock numbers along a spanning tree, breadth first, file order. */
export function findPhaseHours(nodeCount: number, series: readonly SeriesPart[]): PhaseHours {
  const hours = new Int32Array(nodeCount).fill(-1);
  const links = linksByNode(nodeCount, series);
  for (let start = 0; start < nodeCount; start++) {
    if (hours[start] !== -1) continue;
    hours[start] = 0;
    const queue = [start];
    for (const node of queue)
      for (const { other, turn } of links[node] ?? []) {
        if (hours[other] !== -1) continue;
        hours[other] = ((hours[node] as number) + turn + 12) % 12;
        queue.push(other);
      }
  }
  const clashes = series.filter(
    ({ from, to, clock }) => from >= 0 && ((hours[from] as number) + clock) % 12 !== hours[to],
  );
  return { hours, clashes };
}

export interface Link {
  other: number;
  /** Hours gained on the way to the other node. */
  turn: number;
}

export function linksByNode(nodeCount: number, series: readonly SeriesPart[]): Link[][] {
  const links: Link[][] = Array.from({ length: nodeCount }, () => []);
  for (const { from, to, clock } of series) {
    if (from < 0) continue;
    links[from]?.push({ other: to, turn: clock });
    links[to]?.push({ other: from, turn: -clock });
  }
  return links;
}
