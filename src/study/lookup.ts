import type { Bus, ElementKind, ElementOf, Study, StudyElement } from './types.ts';

interface Index {
  buses: Map<string, Bus>;
  elements: Map<string, StudyElement>;
  atBus: Map<string, StudyElement[]>;
}

const indices = new WeakMap<Study, Index>();

function indexOf(study: Study): Index {
  const known = indices.get(study);
  if (known) return known;
  const atBus = new Map<string, StudyElement[]>(study.buses.map((bus) => [bus.id, []]));
  for (const element of study.elements) for (const bus of busesOf(element)) atBus.get(bus)?.push(element);
  const index: Index = {
    buses: new Map(study.buses.map((bus) => [bus.id, bus])),
    elements: new Map(study.elements.map((element) => [element.id, element])),
    atBus,
  };
  indices.set(study, index);
  return index;
}

/** The busbar of that id, or undefined. Constant time: the study is indexed once and never mutated. */
export function busById(study: Study, id: string): Bus | undefined {
  return indexOf(study).buses.get(id);
}

/** The part of that id, or undefined. Constant time. */
export function elementById(study: Study, id: string): StudyElement | undefined {
  return indexOf(study).elements.get(id);
}

/** Parts with a terminal at the busbar, in study order, in or out of service. */
export function elementsAt(study: Study, busId: string): readonly StudyElement[] {
  return indexOf(study).atBus.get(busId) ?? [];
}

/** Whether the part has two ends (`from`, `to`) rather than hanging from one busbar. */
export function isSeries(element: StudyElement): element is Extract<StudyElement, { from: string }> {
  return 'from' in element;
}

/** Busbar ids of the part's terminals: `from` before `to`, or the one `bus`. */
export function busesOf(element: StudyElement): readonly string[] {
  return isSeries(element) ? [element.from, element.to] : [element.bus];
}

/** The busbar a part's defaults and ratings refer to: its own, or the lower end of a series part. */
export function homeBusOf(element: StudyElement): string {
  return isSeries(element) ? element.to : element.bus;
}

/** Parts of one kind, in study order. */
export function elementsOfKind<K extends ElementKind>(study: Study, kind: K): ElementOf<K>[] {
  return study.elements.filter((element): element is ElementOf<K> => element.kind === kind);
}

/** In service: `on` absent means true. */
export function isOn(part: { on?: boolean }): boolean {
  return part.on !== false;
}
