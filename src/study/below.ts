import { busesOf, elementById, isSeries } from './lookup.ts';
import type { SeriesElement, Study, StudyElement } from './types.ts';

/** Ids of parts and of busbars. */
export interface Items {
  elements: Set<string>;
  buses: Set<string>;
}

const none: ReadonlySet<string> = new Set();

/**
 * The given parts with what hangs below them: the busbars and parts that lose every source, and every other
 * way to the busbar above, once the given parts are gone. In or out of service plays no part. `gone` names
 * busbars that are removed anyway and count as the upper end of what hangs from them.
 */
export function withBelow(study: Study, ids: readonly string[], gone: ReadonlySet<string> = none): Items {
  const elements = new Set(ids.filter((id) => elementById(study, id)));
  const left = study.elements.filter((element) => !elements.has(element.id));
  const buses = new Set<string>();
  for (const element of study.elements) {
    if (!elements.has(element.id) || !isSeries(element)) continue;
    for (const bus of unfedSide(element, left, gone)) buses.add(bus);
  }
  for (const element of left) if (busesOf(element).some((bus) => buses.has(bus))) elements.add(element.id);
  return { elements, buses };
}

/** The busbars at one end of a series part that nothing else feeds; the lower end where both are unfed. */
function unfedSide(
  part: SeriesElement,
  left: readonly StudyElement[],
  gone: ReadonlySet<string>,
): Set<string> {
  const [lower, upper] = [islandOf(part.to, left), islandOf(part.from, left)];
  if (lower.has(part.from)) return new Set();
  if (!hasSource(lower, left)) return gone.has(part.to) ? new Set() : lower;
  return hasSource(upper, left) || gone.has(part.from) ? new Set() : upper;
}

function hasSource(island: ReadonlySet<string>, elements: readonly StudyElement[]): boolean {
  return elements.some(
    (element) => (element.kind === 'supply' || element.kind === 'generator') && island.has(element.bus),
  );
}

/** Every busbar reached from one through series parts. */
function islandOf(start: string, elements: readonly StudyElement[]): Set<string> {
  const neighbours = new Map<string, string[]>();
  const join = (from: string, to: string) => {
    const known = neighbours.get(from);
    if (known) known.push(to);
    else neighbours.set(from, [to]);
  };
  for (const element of elements) {
    if (!isSeries(element)) continue;
    join(element.from, element.to);
    join(element.to, element.from);
  }
  const island = new Set([start]);
  for (const bus of island) for (const next of neighbours.get(bus) ?? []) island.add(next);
  return island;
}

/** Busbars with a way to a source, in or out of service. */
export function fedBuses(study: Study): Set<string> {
  const fed = new Set<string>();
  for (const element of study.elements) {
    if (element.kind !== 'supply' && element.kind !== 'generator') continue;
    if (!fed.has(element.bus)) for (const bus of islandOf(element.bus, study.elements)) fed.add(bus);
  }
  return fed;
}
