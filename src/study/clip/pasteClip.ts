import { counted, countedTogether } from '../counted.ts';
import { freshName } from '../edits/copyParts.ts';
import { freshId, makeEdit, sameData } from '../edits/edit.ts';
import { originPath, putOrigins } from '../edits/origins.ts';
import { busById } from '../lookup.ts';
import { busName, fullNameOf, nameOf } from '../names.ts';
import { builtInSpectrum } from '../spectra/builtIn.ts';
import type { Bus, DataOrigin, Edit, Spectrum, Study, StudyElement } from '../types.ts';
import { formatQuantity } from '../units/formatQuantity.ts';
import type { PartsClip } from './PartsClip.ts';

export interface PasteEdit extends Edit {
  /** Ids of what was pasted, in the clip's order. */
  elementIds: string[];
  busIds: string[];
  /** What the person should know about it, a sentence each, without full stop. */
  remarks: string[];
}

/** What a clip becomes in a study: its records under ids and names that are free there. */
interface Arrivals {
  buses: Bus[];
  elements: StudyElement[];
  spectra: Spectrum[];
  origins: Record<string, DataOrigin>;
  orderAlong: Record<string, string[]>;
}

/**
 * Pastes copied parts onto a busbar; what they hung from is that busbar now. Without one (an empty study) the
 * busbar they hung from comes along. Ids are made afresh, names kept where they are free, spectra shared
 * where the study has the same one. Values set by cases stay behind.
 */
export function pasteClip(study: Study, clip: PartsClip, busId: string | null): PasteEdit {
  const target = busId === null ? undefined : busById(study, busId);
  const arrivals = arrivalsOf(study, clip, target);
  const { buses, elements } = arrivals;
  const [only] = elements;
  const what =
    elements.length === 1 && buses.length === 0 && only
      ? fullNameOf(only)
      : countedTogether([
          [elements.length, 'part'],
          [buses.length, 'busbar'],
        ]);
  const where = target && clip.hangsFrom.length > 0 ? ` at ${busName(study, target.id)}` : '';
  const edit = makeEdit('parts.paste', `paste ${what}${where}`, (current) =>
    elements.length + buses.length === 0 ? current : withArrivals(current, arrivals),
  );
  return {
    ...edit,
    elementIds: elements.map((element) => element.id),
    busIds: buses.map((bus) => bus.id),
    remarks: remarksOf(study, clip, target),
  };
}

function withArrivals(study: Study, arrivals: Arrivals): Study {
  const next: Study = {
    ...study,
    buses: [...study.buses, ...arrivals.buses],
    elements: [...study.elements, ...arrivals.elements],
  };
  if (arrivals.spectra.length > 0) next.spectra = [...(study.spectra ?? []), ...arrivals.spectra];
  if (Object.keys(arrivals.orderAlong).length > 0)
    next.view = { ...study.view, orderAlong: { ...study.view?.orderAlong, ...arrivals.orderAlong } };
  return putOrigins(next, arrivals.origins);
}

function arrivalsOf(study: Study, clip: PartsClip, target: Bus | undefined): Arrivals {
  const stays = new Set(target ? clip.hangsFrom : []);
  const [busIds, buses] = arrivingBuses(study, clip, stays);
  for (const id of stays) busIds.set(id, target?.id ?? id);
  const [spectrumIds, spectra] = arrivingSpectra(study, clip);
  const elementIds = new Map<string, string>();
  const taken = [...study.elements];
  const elements = clip.study.elements.map((original) => {
    const copy = {
      ...original,
      id: freshId(taken, original.kind),
      ...freeName(taken, original),
      ...movedEnds(original, busIds),
      ...movedSpectrum(original, spectrumIds),
    } as StudyElement;
    taken.push(copy);
    elementIds.set(original.id, copy.id);
    return copy;
  });
  return {
    buses,
    elements,
    spectra,
    origins: arrivingOrigins(clip, elementIds, busIds, stays),
    orderAlong: arrivingOrder(clip, elementIds, busIds, stays),
  };
}

function arrivingBuses(
  study: Study,
  clip: PartsClip,
  stays: ReadonlySet<string>,
): [Map<string, string>, Bus[]] {
  const ids = new Map<string, string>();
  const hasPcc = study.buses.some((bus) => bus.pcc);
  const taken = [...study.buses];
  const buses = clip.study.buses
    .filter((bus) => !stays.has(bus.id))
    .map((original) => {
      const { pcc, ...rest } = original;
      const kept = pcc === undefined || hasPcc ? rest : { ...rest, pcc };
      const copy: Bus = { ...kept, id: freshId(taken, 'bus'), ...freeName(taken, original) };
      taken.push(copy);
      ids.set(original.id, copy.id);
      return copy;
    });
  return [ids, buses];
}

/** The name itself where it is free, else the next number of it. */
function freeName<T extends { id: string; name?: string }>(
  taken: readonly T[],
  original: T,
): { name: string } {
  const name = nameOf(original);
  return { name: taken.some((item) => nameOf(item) === name) ? freshName(taken, name) : name };
}

function movedEnds(element: StudyElement, busIds: ReadonlyMap<string, string>): Record<string, string> {
  const there = (bus: string) => busIds.get(bus) ?? bus;
  return 'from' in element
    ? { from: there(element.from), to: there(element.to) }
    : { bus: there(element.bus) };
}

function movedSpectrum(element: StudyElement, ids: ReadonlyMap<string, string>): { spectrum?: string } {
  if (element.kind !== 'converter' || typeof element.spectrum !== 'string') return {};
  return { spectrum: ids.get(element.spectrum) ?? element.spectrum };
}

/** Spectra of the study's own: shared where name and rows are the same, else brought under a free id. */
function arrivingSpectra(study: Study, clip: PartsClip): [Map<string, string>, Spectrum[]] {
  const ids = new Map<string, string>();
  const taken = [...(study.spectra ?? [])];
  const brought: Spectrum[] = [];
  for (const original of clip.study.spectra ?? []) {
    const twin = taken.find(
      (item) => nameOf(item) === nameOf(original) && sameData(item.orders, original.orders),
    );
    if (twin) {
      ids.set(original.id, twin.id);
      continue;
    }
    const free = !taken.some((item) => item.id === original.id) && !builtInSpectrum(original.id);
    const id = free ? original.id : freshId(taken, 'spectrum');
    const copy: Spectrum = { ...original, id, ...freeName(taken, original) };
    taken.push(copy);
    brought.push(copy);
    ids.set(original.id, id);
  }
  return [ids, brought];
}

function arrivingOrigins(
  clip: PartsClip,
  elementIds: ReadonlyMap<string, string>,
  busIds: ReadonlyMap<string, string>,
  stays: ReadonlySet<string>,
): Record<string, DataOrigin> {
  const entries = Object.entries(clip.study.origins ?? {}).flatMap(([path, origin]) => {
    const [list, ...rest] = path.split('.');
    const field = rest.at(-1);
    const owner = rest.slice(0, -1).join('.');
    if (field === undefined) return [];
    if (list === 'elements') {
      const id = elementIds.get(owner);
      return id === undefined ? [] : [[originPath('elements', id, field), origin] as const];
    }
    const id = list === 'buses' && !stays.has(owner) ? busIds.get(owner) : undefined;
    return id === undefined ? [] : [[originPath('buses', id, field), origin] as const];
  });
  return Object.fromEntries(entries);
}

/** Order along the busbars that come along; along the busbar pasted on the new parts follow its own. */
function arrivingOrder(
  clip: PartsClip,
  elementIds: ReadonlyMap<string, string>,
  busIds: ReadonlyMap<string, string>,
  stays: ReadonlySet<string>,
): Record<string, string[]> {
  const entries = Object.entries(clip.study.view?.orderAlong ?? {}).flatMap(([bus, order]) => {
    const id = busIds.get(bus);
    if (id === undefined || stays.has(bus)) return [];
    return [[id, order.flatMap((item) => elementIds.get(item) ?? [])] as const];
  });
  return Object.fromEntries(entries);
}

function remarksOf(study: Study, clip: PartsClip, target: Bus | undefined): string[] {
  const remarks: string[] = [];
  const from = clip.study.buses.filter((bus) => clip.hangsFrom.includes(bus.id));
  const other = from.find((bus) => target && bus.nominalV !== target.nominalV);
  if (other && target) {
    const volts = (bus: Bus) => formatQuantity(bus.nominalV, 'V');
    remarks.push(`They hung at ${volts(other)} and hang at ${volts(target)} now: check their ratings`);
  }
  if (clip.study.frequencyHz !== study.frequencyHz)
    remarks.push(
      `They come from a ${clip.study.frequencyHz} Hz study: check reactances and rated values at ${study.frequencyHz} Hz`,
    );
  if (clip.caseValues > 0) remarks.push(`${counted(clip.caseValues, 'value')} set by cases stayed behind`);
  return remarks;
}
