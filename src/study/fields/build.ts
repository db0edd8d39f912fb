import type { Unit } from '../units/unit.ts';
import type {
  BooleanField,
  BusRefField,
  Choice,
  ChoiceField,
  DefaultContext,
  Field,
  GroupField,
  ListField,
  NumberField,
  OpaqueField,
  PairField,
  TextField,
} from './Field.ts';

interface Manner {
  required?: boolean;
  rare?: boolean;
  typical?: string;
}

interface NumberManner extends Manner {
  default?: number;
  defaultFor?: (context: DefaultContext) => number | undefined;
  /** Inclusive bounds. */
  min?: number;
  max?: number;
  /** Exclusive bounds. */
  above?: number;
  below?: number;
  usual?: string;
}

function base(key: string, label: string, help: string, manner: Manner) {
  return {
    key,
    label,
    help,
    required: manner.required ?? false,
    rare: manner.rare ?? false,
    ...(manner.typical === undefined ? {} : { typical: manner.typical }),
  };
}

function numeric(type: 'number' | 'integer') {
  return (key: string, label: string, unit: Unit, help: string, manner: NumberManner = {}): NumberField => ({
    ...base(key, label, help, manner),
    type,
    unit,
    ...(manner.default === undefined ? {} : { default: manner.default }),
    ...(manner.defaultFor === undefined ? {} : { defaultFor: manner.defaultFor }),
    ...(manner.min === undefined ? {} : { min: manner.min }),
    ...(manner.max === undefined ? {} : { max: manner.max }),
    ...(manner.above === undefined ? {} : { min: manner.above, minExclusive: true }),
    ...(manner.below === undefined ? {} : { max: manner.below, maxExclusive: true }),
    ...(manner.usual === undefined ? {} : { usual: manner.usual }),
  });
}

export const number = numeric('number');
export const integer = numeric('integer');

interface BooleanManner extends Manner {
  default?: boolean;
  defaultFor?: (context: DefaultContext) => boolean | undefined;
}

export function boolean(key: string, label: string, help: string, manner: BooleanManner = {}): BooleanField {
  return {
    ...base(key, label, help, manner),
    type: 'boolean',
    ...(manner.default === undefined ? {} : { default: manner.default }),
    ...(manner.defaultFor === undefined ? {} : { defaultFor: manner.defaultFor }),
  };
}

export function choice(
  key: string,
  label: string,
  help: string,
  options: readonly Choice[],
  manner: Manner & { default?: string | number } = {},
): ChoiceField {
  return {
    ...base(key, label, help, manner),
    type: 'choice',
    options,
    ...(manner.default === undefined ? {} : { default: manner.default }),
  };
}

export function text(
  key: string,
  label: string,
  help: string,
  manner: Manner & { type?: TextField['type']; suggestions?: readonly string[] } = {},
): TextField {
  return {
    ...base(key, label, help, manner),
    type: manner.type ?? 'text',
    ...(manner.suggestions === undefined ? {} : { suggestions: manner.suggestions }),
  };
}

export function busRef(key: string, label: string, help: string): BusRefField {
  return { ...base(key, label, help, { required: true }), type: 'busRef' };
}

export function list(
  type: ListField['type'],
  key: string,
  label: string,
  help: string,
  manner: Manner = {},
): ListField {
  return { ...base(key, label, help, manner), type };
}

export function pair(
  type: PairField['type'],
  key: string,
  label: string,
  help: string,
  manner: Manner & { default?: readonly [number, number] } = {},
): PairField {
  return {
    ...base(key, label, help, manner),
    type,
    ...(manner.default === undefined ? {} : { default: manner.default }),
  };
}

export function group(key: string, label: string, help: string, fields: readonly Field[]): GroupField {
  return { ...base(key, label, help, { rare: true }), type: 'group', fields };
}

export function opaque(key: string, label: string, help: string, manner: Manner = {}): OpaqueField {
  return { ...base(key, label, help, { rare: true, ...manner }), type: 'opaque' };
}
