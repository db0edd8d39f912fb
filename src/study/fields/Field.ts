import type { Unit } from '../units/unit.ts';

/** What a default may depend on besides the field itself: the owner's other fields and its bus voltage. */
export interface DefaultContext {
  owner: Readonly<Record<string, unknown>>;
  /** Line-to-line volts of the owner's bus, where it has one. */
  nominalV?: number | undefined;
}

interface FieldBase {
  key: string;
  /** Trade words, lower case: "impedance voltage u_k". */
  label: string;
  /** The formula it enters, or what it decides, in one line. */
  help: string;
  required: boolean;
  /** Under "more data" in the data slip; the others are what the result hangs on. */
  rare: boolean;
  /** A typical value in words, with where it comes from. */
  typical?: string;
}

export interface NumberField extends FieldBase {
  type: 'number' | 'integer';
  unit: Unit;
  default?: number;
  defaultFor?: (context: DefaultContext) => number | undefined;
  min?: number;
  max?: number;
  minExclusive?: boolean;
  maxExclusive?: boolean;
  /** Usual values in few words, without the unit: "4…8". Common practice where `typical` names no source. */
  usual?: string;
}

export interface BooleanField extends FieldBase {
  type: 'boolean';
  default?: boolean;
  defaultFor?: (context: DefaultContext) => boolean | undefined;
}

export interface Choice {
  value: string | number;
  label: string;
}

export interface ChoiceField extends FieldBase {
  type: 'choice';
  options: readonly Choice[];
  default?: string | number;
}

/** A vector group is text with a grammar of its own; other text is free. */
export interface TextField extends FieldBase {
  type: 'text' | 'vectorGroup';
  suggestions?: readonly string[];
}

export interface BusRefField extends FieldBase {
  type: 'busRef';
}

/** A spectrum id or its rows; harmonic rows alone; a bank's steps. */
export interface ListField extends FieldBase {
  type: 'spectrum' | 'rows' | 'steps';
}

/** Two numbers: [s, e] of the skin-effect law, or a [minus, plus] band in per cent. */
export interface PairField extends FieldBase {
  type: 'skin' | 'tolerance';
  default?: readonly [number, number];
}

/** A small record with fields of its own. */
export interface GroupField extends FieldBase {
  type: 'group';
  fields: readonly Field[];
}

/** Data kept and written back for other layers; this layer does not look inside. */
export interface OpaqueField extends FieldBase {
  type: 'opaque';
}

export type Field =
  | NumberField
  | BooleanField
  | ChoiceField
  | TextField
  | BusRefField
  | ListField
  | PairField
  | GroupField
  | OpaqueField;

export type FieldType = Field['type'];
