import {
  isSeries,
  type SeriesElement,
  type ShuntElement,
  type Study,
  type StudyElement,
} from '../../study/index.ts';

export function isSource(part: StudyElement): boolean {
  return part.kind === 'supply' || part.kind === 'generator';
}

/** One series part seen from a busbar: the part and the busbar at its other end. */
export interface Join {
  part: SeriesElement;
  other: number;
}

/** The site as busbar numbers: who joins whom, who hangs where. Parts at unknown busbars are left out. */
export interface SiteGraph {
  study: Study;
  busIndex: Map<string, number>;
  /** By busbar, in file order. */
  joins: Join[][];
  hanging: ShuntElement[][];
  /** Busbars of each island, in file order; islands by their first busbar. */
  islands: number[][];
}

/** In service or not plays no part: switching must not move the drawing. */
export function siteGraph(study: Study): SiteGraph {
  const busIndex = new Map(study.buses.map((bus, index) => [bus.id, index]));
  const joins: Join[][] = study.buses.map(() => []);
  const hanging: ShuntElement[][] = study.buses.map(() => []);
  for (const part of study.elements) {
    if (isSeries(part)) {
      const from = busIndex.get(part.from);
      const to = busIndex.get(part.to);
      if (from === undefined || to === undefined || from === to) continue;
      joins[from]?.push({ part, other: to });
      joins[to]?.push({ part, other: from });
    } else {
      const bus = busIndex.get(part.bus);
      if (bus !== undefined) hanging[bus]?.push(part);
    }
  }
  return { study, busIndex, joins, hanging, islands: findIslands(joins) };
}

function findIslands(joins: Join[][]): number[][] {
  const seen = new Set<number>();
  const islands: number[][] = [];
  for (let start = 0; start < joins.length; start++) {
    if (seen.has(start)) continue;
    const island = [start];
    seen.add(start);
    for (let at = 0; at < island.length; at++) {
      for (const { other } of joins[island[at] ?? 0] ?? []) {
        if (seen.has(other)) continue;
        seen.add(other);
        island.push(other);
      }
    }
    islands.push(island.sort((a, b) => a - b));
  }
  return islands;
}
