import type { SeriesPart, ShuntPart } from './Network.ts';
import { linksByNode } from './phaseHours.ts';

/**
 * Gives generators without an angle the no-load angle of their bus relative to the nearest source of the
 * island that has one (fewest series parts, then file order): a supply, else a generator with an angle,
 * else the island's first generator at 0. Radians, written into each part's EMF.
 */
export function settleGeneratorAngles(
  nodeCount: number,
  shunts: readonly ShuntPart[],
  series: readonly SeriesPart[],
): void {
  const sources = shunts.filter((part) => part.emf);
  const open = sources.filter(
    ({ element }) => element.kind === 'generator' && element.angleDeg === undefined,
  );
  if (open.length === 0) return;
  const links = linksByNode(nodeCount, series);
  for (const part of open) {
    const reach = walk(links, part.node);
    const inIsland = sources.filter(({ node }) => reach.steps[node] !== -1);
    const supplies = inIsland.filter(({ element }) => element.kind === 'supply');
    const given = inIsland.filter(
      ({ element }) => element.kind === 'generator' && element.angleDeg !== undefined,
    );
    const candidates = supplies.length > 0 ? supplies : given.length > 0 ? given : inIsland.slice(0, 1);
    const reference = candidates.reduce((best, next) =>
      (reach.steps[next.node] as number) < (reach.steps[best.node] as number) ? next : best,
    );
    const angle =
      given.includes(reference) || supplies.includes(reference) ? (reference.emf?.angleRad ?? 0) : 0;
    // The walk turned from this bus to the reference; the way back turns the other way.
    if (part.emf) part.emf.angleRad = angle + ((reach.hours[reference.node] as number) * Math.PI) / 6;
  }
}

function walk(
  links: ReturnType<typeof linksByNode>,
  start: number,
): { steps: Int32Array; hours: Int32Array } {
  const steps = new Int32Array(links.length).fill(-1);
  const hours = new Int32Array(links.length);
  steps[start] = 0;
  const queue = [start];
  for (const node of queue)
    for (const { other, turn } of links[node] ?? []) {
      if (steps[other] !== -1) continue;
      steps[other] = (steps[node] as number) + 1;
      hours[other] = (hours[node] as number) + turn;
      queue.push(other);
    }
  return { steps, hours };
}
