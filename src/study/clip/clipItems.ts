import { withBelow } from '../below.ts';
import type { Chosen } from '../edits/removeParts.ts';
import { busById, busesOf, elementById, elementsAt, isSeries } from '../lookup.ts';
import { newStudy } from '../newStudy.ts';
import type { Bus, Study, StudyElement } from '../types.ts';
import type { PartsClip } from './PartsClip.ts';

/**
 * Copies chosen parts with what hangs below them, and chosen busbars with what hangs from them: their data,
 * origins, order along the busbars and the spectra they use. Values set by cases stay behind and are
 * counted. A tie between two busbars that both stay takes a bare copy of its lower one along.
 */
export function clipItems(study: Study, chosen: Chosen): PartsClip {
  const { elements, buses } = itemsOf(study, chosen);
  const parts = inOrder(chosen.parts, study.elements).filter((element) => elements.has(element.id));
  const ends = new Set(parts.flatMap((part) => farBusbars(part, buses)));
  const carried = study.buses.filter((bus) => buses.has(bus.id) || ends.has(bus.id));
  const upper = new Set(parts.flatMap(busesOf).filter((bus) => !buses.has(bus) && !ends.has(bus)));
  const standing = study.buses.filter((bus) => upper.has(bus.id));
  return {
    format: 'varwright-parts',
    version: 1,
    study: smallStudy(study, parts, [...standing, ...carried]),
    hangsFrom: standing.map((bus) => bus.id),
    caseValues: caseValuesOf(study, elements),
  };
}

function itemsOf(study: Study, { parts, buses }: Chosen) {
  const whole = buses.filter((id) => busById(study, id));
  const hanging = whole.flatMap((bus) =>
    elementsAt(study, bus).filter((element) => !isSeries(element) || element.from === bus),
  );
  const taken = withBelow(study, [...parts, ...hanging.map((element) => element.id)]);
  for (const bus of whole) taken.buses.add(bus);
  for (const element of hanging) {
    const leaves = isSeries(element) && !taken.buses.has(element.to) && !parts.includes(element.id);
    if (leaves) taken.elements.delete(element.id);
  }
  return taken;
}

/** Chosen parts in the order they were chosen, the others after them as the study has them. */
function inOrder(chosen: readonly string[], elements: readonly StudyElement[]): StudyElement[] {
  const rank = new Map(chosen.map((id, at) => [id, at]));
  return elements.toSorted((a, b) => (rank.get(a.id) ?? chosen.length) - (rank.get(b.id) ?? chosen.length));
}

/** The lower busbar of a part that has neither end among the copied busbars. */
function farBusbars(part: StudyElement, buses: ReadonlySet<string>): string[] {
  return isSeries(part) && !buses.has(part.to) && !buses.has(part.from) ? [part.to] : [];
}

function smallStudy(study: Study, elements: StudyElement[], buses: Bus[]): Study {
  const used = new Set(
    elements.flatMap((element) =>
      element.kind === 'converter' && typeof element.spectrum === 'string' ? [element.spectrum] : [],
    ),
  );
  const spectra = (study.spectra ?? []).filter((spectrum) => used.has(spectrum.id));
  const origins = ownEntries(study, elements, buses);
  const order = Object.entries(study.view?.orderAlong ?? {}).flatMap(([bus, ids]) => {
    const own = ids.filter((id) => elements.some((element) => element.id === id));
    return buses.some((item) => item.id === bus) && own.length > 0 ? [[bus, own] as const] : [];
  });
  return {
    ...newStudy({ title: study.title, frequencyHz: study.frequencyHz }),
    ...(study.maxOrder === undefined ? {} : { maxOrder: study.maxOrder }),
    buses,
    elements,
    ...(spectra.length > 0 ? { spectra } : {}),
    ...(origins.length > 0 ? { origins: Object.fromEntries(origins) } : {}),
    ...(order.length > 0 ? { view: { orderAlong: Object.fromEntries(order) } } : {}),
  };
}

function ownEntries(study: Study, elements: readonly StudyElement[], buses: readonly Bus[]) {
  const owners = new Set([
    ...elements.map((element) => `elements.${element.id}`),
    ...buses.map((bus) => `buses.${bus.id}`),
  ]);
  return Object.entries(study.origins ?? {}).filter(([path]) =>
    owners.has(path.slice(0, path.lastIndexOf('.'))),
  );
}

function caseValuesOf(study: Study, elements: ReadonlySet<string>): number {
  const changes = (study.cases ?? []).flatMap((item) => item.changes);
  return changes
    .filter((change) => elements.has(change.element) && elementById(study, change.element))
    .reduce((count, change) => count + Object.keys(change.set).length, 0);
}
