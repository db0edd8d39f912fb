import type { DefaultContext, Field } from './fields/Field.ts';
import { fieldsOf } from './fields/fieldsOf.ts';
import { busById, homeBusOf } from './lookup.ts';
import type { Bus, ElementKind, ElementOf, Study, StudyElement } from './types.ts';

/** Keys that withDefaults always fills, by kind; a test holds this list equal to the catalogue. */
export const filledKeys = {
  supply: ['on', 'z0OverZ1', 'setpointPercent', 'angleDeg', 'skin', 'background', 'neutral'],
  generator: ['on', 'xOverR', 'z0OverZ1', 'setpointPercent', 'neutral'],
  transformer: ['on', 'tapPercent', 'neutralOhm', 'noLoadLossKW', 'noLoadCurrentPercent', 'skin', 'ukTested'],
  cable: ['on', 'capacitanceNFPerKm', 'r0OverR1', 'x0OverX1', 'c0OverC1', 'runs', 'skin'],
  reactor: ['on', 'resistanceOhm', 'skin'],
  coupler: ['on', 'resistanceMOhm', 'reactanceMOhm'],
  branch: ['on'],
  load: ['on', 'leading', 'model', 'connection', 'neutral'],
  motor: [
    'on',
    'count',
    'loadPercent',
    'efficiency',
    'powerFactor',
    'lockedRotorRatio',
    'lockedRotorPowerFactor',
    'noLoadCurrentRatio',
  ],
  converter: ['on', 'leading', 'wires', 'connection', 'filterCapacitanceUF'],
  bank: [
    'on',
    'detuningPercent',
    'reactorQ',
    'reactorSkin',
    'lossWPerKvar',
    'connection',
    'tolerancePercent',
    'reactorTolerancePercent',
  ],
  filter: ['on', 'lossWPerKvar', 'connection'],
  shunt: ['on', 'neutral'],
} as const satisfies { [K in ElementKind]: readonly (keyof ElementOf<K>)[] };

type Filled<T, D> = Omit<T, D & keyof T> & { [P in D & keyof T]-?: Exclude<T[P], undefined> };

/**
 * A part with its defaults filled in, so that no reader repeats them. Left optional: what has no default,
 * among it a generator's angle and a transformer's z0OverZ1 (absent only for Yyn, where it is an error).
 */
export type Resolved<K extends ElementKind> = Filled<ElementOf<K>, (typeof filledKeys)[K][number]>;
export type ResolvedElement = { [K in ElementKind]: Resolved<K> }[ElementKind];

/** The default of a field in its surroundings, or undefined where it has none. */
export function defaultOf(field: Field, context: DefaultContext): unknown {
  if (field.type === 'rows') return [];
  if ('defaultFor' in field && field.defaultFor) return field.defaultFor(context);
  return 'default' in field ? field.default : undefined;
}

function nominalVoltsFor(element: StudyElement, place: Study | Bus | number): number | undefined {
  if (typeof place === 'number') return place;
  return 'nominalV' in place ? place.nominalV : busById(place, homeBusOf(element))?.nominalV;
}

/**
 * The part with every default filled. The neutral of a load or shunt is true up to 1000 V nominal, so the
 * busbar decides: pass the study, the busbar or its nominal line-to-line volts. A bus the study does not
 * have throws RangeError.
 */
export function withDefaults<E extends StudyElement>(
  element: E,
  place: Study | Bus | number,
): Resolved<E['kind']> {
  const nominalV = nominalVoltsFor(element, place);
  if (nominalV === undefined)
    throw new RangeError(`part "${element.id}" stands at no busbar of the study: "${homeBusOf(element)}"`);
  const resolved: Record<string, unknown> = { ...element };
  for (const field of fieldsOf(element.kind)) {
    if (resolved[field.key] !== undefined) continue;
    const value = defaultOf(field, { owner: resolved, nominalV });
    if (value !== undefined) resolved[field.key] = Array.isArray(value) ? [...value] : value;
  }
  return resolved as unknown as Resolved<E['kind']>;
}
