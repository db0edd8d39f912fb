import type { ElementKind } from '../types.ts';
import { bankFields, controllerFields, stepFields } from './bank.ts';
import { branchFields } from './branch.ts';
import { cableFields } from './cable.ts';
import { converterFields } from './converter.ts';
import { couplerFields } from './coupler.ts';
import type { Field } from './Field.ts';
import { filterFields } from './filter.ts';
import { generatorFields } from './generator.ts';
import { loadFields } from './load.ts';
import { motorFields } from './motor.ts';
import { reactorFields } from './reactor.ts';
import { shuntPartFields } from './shunt.ts';
import {
  busFields,
  caseFields,
  criteriaFields,
  harmonicRowFields,
  limitFields,
  scanFields,
  spectrumFields,
  studyFields,
} from './studyFields.ts';
import { supplyFields } from './supply.ts';
import { transformerFields } from './transformer.ts';

const byOwner = {
  supply: supplyFields,
  generator: generatorFields,
  transformer: transformerFields,
  cable: cableFields,
  reactor: reactorFields,
  coupler: couplerFields,
  branch: branchFields,
  load: loadFields,
  motor: motorFields,
  converter: converterFields,
  bank: bankFields,
  filter: filterFields,
  shunt: shuntPartFields,
  bus: busFields,
  study: studyFields,
  case: caseFields,
  criteria: criteriaFields,
  limits: limitFields,
  scan: scanFields,
  spectrum: spectrumFields,
  harmonicRow: harmonicRowFields,
  step: stepFields,
  controller: controllerFields,
} as const satisfies Record<string, readonly Field[]>;

/** Everything the catalogue describes: the thirteen kinds of part and the records around them. */
export type FieldOwner = keyof typeof byOwner;

export const elementKinds: readonly ElementKind[] = [
  'supply',
  'generator',
  'transformer',
  'cable',
  'reactor',
  'coupler',
  'branch',
  'load',
  'motor',
  'converter',
  'bank',
  'filter',
  'shunt',
];

export const seriesKinds: readonly ElementKind[] = ['transformer', 'cable', 'reactor', 'coupler', 'branch'];

/**
 * The fields of a kind of part, or of the study, a busbar, a case, a row. One table serves validation,
 * defaults, the data slip and the results sheet. Throws RangeError for an owner it does not describe.
 */
export function fieldsOf(owner: FieldOwner): readonly Field[] {
  const fields: readonly Field[] | undefined = Object.hasOwn(byOwner, owner) ? byOwner[owner] : undefined;
  if (!fields) throw new RangeError(`no fields for "${owner}"; known are ${Object.keys(byOwner).join(', ')}`);
  return fields;
}

/** One field of an owner, or undefined where the catalogue has none of that key. */
export function fieldOf(owner: FieldOwner, key: string): Field | undefined {
  return fieldsOf(owner).find((field) => field.key === key);
}
