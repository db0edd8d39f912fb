import { busName, nameOf } from '../names.ts';
import { spectrumById } from '../spectra/spectrumOf.ts';
import type { BankStep, Study } from '../types.ts';
import { formatQuantity } from '../units/formatQuantity.ts';
import { stepsText } from '../units/parseSteps.ts';
import type { Field } from './Field.ts';
import { type FieldOwner, fieldOf } from './fieldsOf.ts';

/** A field's value in words with its unit, as it is spoken of beside the drawing. Never throws. */
export function valueWords(study: Study, owner: FieldOwner, key: string, value: unknown): string {
  if (value === undefined || value === null) return 'not given';
  if (key === 'on') return value === false ? 'out of service' : 'in service';
  const field = fieldOf(owner, key);
  if (!field) return String(value);
  if (field.type === 'choice')
    return field.options.find((option) => option.value === value)?.label ?? String(value);
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'number') return numberWords(field, value);
  if (typeof value === 'string') return textWords(study, field, value);
  return Array.isArray(value) ? listWords(field, value) : 'given';
}

function numberWords(field: Field, value: number): string {
  if (!Number.isFinite(value)) return 'not given';
  const unit = 'unit' in field ? field.unit : '';
  if (unit === 'V' && Math.abs(value) >= 1000) return formatQuantity(value / 1000, 'kV');
  return formatQuantity(value, unit);
}

function textWords(study: Study, field: Field, value: string): string {
  if (field.type === 'busRef') return busName(study, value);
  const spectrum = field.type === 'spectrum' ? spectrumById(study, value) : undefined;
  return spectrum ? nameOf(spectrum) : value;
}

function listWords(field: Field, value: readonly unknown[]): string {
  if (field.type === 'steps') return stepsWords(value as BankStep[]);
  if (field.type === 'skin' || field.type === 'tolerance') return value.join(' … ');
  return `${value.length} ${value.length === 1 ? 'row' : 'rows'} of its own`;
}

/** "3 × 80 kvar, 2 of 3 in"; unequal steps one by one. */
function stepsWords(steps: readonly BankStep[]): string {
  const sizes = stepsText(steps.map(({ kvar }) => ({ kvar })));
  const on = steps.filter((step) => step.on !== false).length;
  const state = on === steps.length ? 'all in' : on === 0 ? 'all out' : `${on} of ${steps.length} in`;
  return `${sizes || '0'} kvar, ${state}`;
}
