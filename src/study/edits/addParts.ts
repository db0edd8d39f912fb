import { seriesKinds } from '../fields/fieldsOf.ts';
import { busById } from '../lookup.ts';
import { busName, fullNameOf, kindWords } from '../names.ts';
import { type PartPlace, placeKeys, typicalValues } from '../newPart.ts';
import type { Bus, DataOrigin, Edit, ElementKind, Study, StudyElement } from '../types.ts';
import { formatQuantity } from '../units/formatQuantity.ts';
import { counterOf, freshId, makeEdit, type Patch } from './edit.ts';
import { originPath, putOrigins } from './origins.ts';

/** An edit that brings a new busbar or part, and the ids it will have. */
export interface AddBusEdit extends Edit {
  busId: string;
}

export interface AddPartEdit extends Edit {
  elementId: string;
  /** The busbar a series part brings with it; absent where it joins one that stands. */
  busId?: string;
}

/** Adds a busbar; without volts it takes those of the last busbar, or 20 kV / 12.47 kV on an empty study. */
export function addBus(study: Study, values: Partial<Omit<Bus, 'id'>> = {}): AddBusEdit {
  const id = freshId(study.buses, 'bus');
  const nominalV =
    values.nominalV ?? study.buses.at(-1)?.nominalV ?? (study.frequencyHz === 60 ? 12470 : 20000);
  const bus: Bus = { id, name: `Busbar ${counterOf(id)}`, nominalV, ...values };
  const edit = makeEdit('bus.add', `add ${bus.name ?? id}`, (current) =>
    busById(current, id) ? current : { ...current, buses: [...current.buses, bus] },
  );
  return { ...edit, busId: id };
}

export interface AddPartOptions {
  kind: ElementKind;
  /** The busbar it hangs from, or the upper busbar of a series part. */
  bus: string;
  /** Lower busbar of a series part; absent: it brings a new one with it. */
  to?: string;
  /** Values instead of the typical ones. */
  values?: Patch;
}

const shortNames: Partial<Record<ElementKind, string>> = {
  supply: 'Grid',
  generator: 'G',
  transformer: 'T',
  coupler: 'Tie ',
  converter: 'Drive ',
  bank: 'Bank ',
  branch: 'R-L-C ',
  shunt: 'R-L-C ',
};

/** The kind's short name with the first number from the id's on that no other part has: "T2". */
function nameFor(study: Study, kind: ElementKind, id: string): string {
  const short = shortNames[kind] ?? `${kindWords[kind].charAt(0).toUpperCase()}${kindWords[kind].slice(1)} `;
  const taken = new Set(study.elements.map((element) => element.name));
  const numbered = (counter: number): string => {
    if (kind === 'supply') return counter === 1 ? short : `${short} ${counter}`;
    return `${short}${counter}`;
  };
  let counter = Number(counterOf(id));
  while (taken.has(numbered(counter))) counter += 1;
  return numbered(counter);
}

/**
 * Adds a part with typical values, noted as typical in `origins`. A series part brings its lower busbar
 * unless `to` names one. Throws RangeError for a busbar the study does not have.
 */
export function addPart(study: Study, options: AddPartOptions): AddPartEdit {
  const upper = requiredBus(study, options.bus);
  const lower = options.to === undefined ? undefined : requiredBus(study, options.to);
  const id = freshId(study.elements, options.kind);
  const place: PartPlace = {
    nominalV: upper.nominalV,
    frequencyHz: study.frequencyHz,
    lowerV: lower?.nominalV,
  };
  const typical: Record<string, unknown> = { ...typicalValues(options.kind, place) };
  const given = Object.entries(options.values ?? {}).filter(
    ([, value]) => value !== undefined && value !== null,
  );
  const values = { ...typical, ...Object.fromEntries(given) };
  const isSeriesKind = seriesKinds.includes(options.kind);
  const brought = isSeriesKind && !lower ? broughtBus(study, options.kind, values, upper) : undefined;
  const ends = isSeriesKind ? { from: upper.id, to: lower?.id ?? brought?.id ?? '' } : { bus: upper.id };
  const element = {
    id,
    kind: options.kind,
    name: nameFor(study, options.kind, id),
    ...ends,
    ...values,
  } as unknown as StudyElement;
  const origins = typicalOrigins(id, typical, new Set(given.map(([key]) => key)));
  const words = `add ${fullNameOf(element)} at ${busName(study, upper.id)}`;
  const edit = makeEdit(`${options.kind}.add`, words, (current) => {
    if (current.elements.some((item) => item.id === id)) return current;
    const buses = brought && !busById(current, brought.id) ? [...current.buses, brought] : current.buses;
    return putOrigins({ ...current, buses, elements: [...current.elements, element] }, origins);
  });
  return { ...edit, elementId: id, ...(brought ? { busId: brought.id } : {}) };
}

function requiredBus(study: Study, id: string): Bus {
  const bus = busById(study, id);
  if (!bus)
    throw new RangeError(
      `no busbar "${id}"; the study has ${study.buses.map((item) => item.id).join(', ') || 'none'}`,
    );
  return bus;
}

function broughtBus(study: Study, kind: ElementKind, values: Patch, upper: Bus): Bus {
  const id = freshId(study.buses, 'bus');
  const nominalV = kind === 'transformer' && typeof values.lvV === 'number' ? values.lvV : upper.nominalV;
  const volts = nominalV >= 1000 ? formatQuantity(nominalV / 1000, 'kV') : formatQuantity(nominalV, 'V');
  return { id, name: `${volts.replace('\u2009', ' ')} busbar ${counterOf(id)}`, nominalV };
}

/** Whether a busbar's name is the one it got when a series part brought it. */
export function isBroughtName(name: string | undefined): boolean {
  return name !== undefined && /^[\d.\s]+k?V busbar \d+$/.test(name);
}

function typicalOrigins(id: string, typical: Patch, given: ReadonlySet<string>): Record<string, DataOrigin> {
  const keys = Object.keys(typical).filter((key) => !given.has(key) && !placeKeys.has(key));
  return Object.fromEntries(keys.map((key) => [originPath('elements', id, key), { origin: 'typical' }]));
}
