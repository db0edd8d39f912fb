import { busById, elementById } from './lookup.ts';
import type { ElementKind, Study, StudyElement } from './types.ts';

/** The trade word for a kind of part, lower case. */
export const kindWords: Readonly<Record<ElementKind, string>> = {
  supply: 'supply',
  generator: 'generator',
  transformer: 'transformer',
  cable: 'cable',
  reactor: 'reactor',
  coupler: 'bus coupler',
  branch: 'R-L-C, series',
  load: 'load',
  motor: 'motor',
  converter: 'drive or converter',
  bank: 'capacitor bank',
  filter: 'filter',
  shunt: 'R-L-C, to neutral',
};

/** Several of a kind, lower case. */
export const kindsWords: Readonly<Record<ElementKind, string>> = {
  supply: 'supplies',
  generator: 'generators',
  transformer: 'transformers',
  cable: 'cables',
  reactor: 'reactors',
  coupler: 'bus couplers',
  branch: 'R-L-C, series',
  load: 'loads',
  motor: 'motors',
  converter: 'drives and converters',
  bank: 'capacitor banks',
  filter: 'filters',
  shunt: 'R-L-C, to neutral',
};

/** The kind in one short word, as the tray and the reader's ear have it. */
export const shortKindWords: Readonly<Record<ElementKind, string>> = {
  ...kindWords,
  coupler: 'coupler',
  converter: 'drive',
  bank: 'bank',
};

/** Display name of a busbar, part, spectrum or case: its name, or its id where it has none. */
export function nameOf(named: { id: string; name?: string }): string {
  const name = named.name?.trim();
  return name ? name : named.id;
}

/** Kind and name together: "transformer T1". A name that holds a word of the kind stands alone: "Bank 1". */
export function fullNameOf(element: StudyElement): string {
  const name = nameOf(element);
  const word = kindWords[element.kind];
  const telling = word.split(/[ ,]+/).filter((part) => part.length > 2);
  return telling.some((part) => name.toLowerCase().includes(part.toLowerCase())) ? name : `${word} ${name}`;
}

/** Display name of a busbar id; the id itself where the study has no such busbar. */
export function busName(study: Study, id: string): string {
  const bus = busById(study, id);
  return bus ? nameOf(bus) : id;
}

/** Display name of a part id; the id itself where the study has no such part. */
export function elementName(study: Study, id: string): string {
  const element = elementById(study, id);
  return element ? nameOf(element) : id;
}
