import type { StudyElement } from '../../study/index.ts';
import { otherEnd } from './alongBusbar.ts';
import type { SiteGraph } from './siteGraph.ts';
import type { Storeys } from './storeys.ts';

/** A busbar leading to fewer lower busbars a tier than this is not folded. */
const BUSBARS_A_TIER = 2;

/**
 * Folds a very wide site: the busbars a busbar leads down to are dealt in turns into at most `tiers` tiers below
 * each other, each with all that hangs below it. The conductors of a lower tier pass between the busbars of
 * the upper ones.
 */
export function foldStoreys(
  graph: SiteGraph,
  storeys: Storeys,
  order: readonly StudyElement[][],
  tiers: number,
): Storeys {
  if (tiers < 2) return storeys;
  const below = graph.study.buses.map((_, bus) => lowerBusbars(graph, storeys, order[bus] ?? [], bus));
  const beside = graph.study.buses.map((_, bus) =>
    storeys.beside.flatMap((left, other) => (left === bus ? [other] : [])),
  );
  const storey = [...storeys.storey];
  /** Sets the storeys of a busbar and of all below and beside it; returns how many storeys that takes. */
  const settle = (bus: number, at: number): number => {
    storey[bus] = at;
    const lower = below[bus] ?? [];
    const count = Math.max(1, Math.min(tiers, Math.floor(lower.length / BUSBARS_A_TIER)));
    let depth = 1;
    for (let tier = 0; tier < count; tier++) {
      const own = lower.filter((_, index) => index % count === tier);
      depth += Math.max(0, ...own.map((other) => settle(other, at + depth)));
    }
    return Math.max(depth, ...(beside[bus] ?? []).map((other) => settle(other, at)));
  };
  for (const tops of storeys.tops) for (const top of tops) settle(top, 0);
  return { ...storeys, storey };
}

function lowerBusbars(
  graph: SiteGraph,
  storeys: Storeys,
  order: readonly StudyElement[],
  bus: number,
): number[] {
  const lower = order.map((part) => otherEnd(graph, bus, part));
  return [...new Set(lower)].filter((other) => other >= 0 && storeys.above[other] === bus);
}
