import { minusSign } from '../units/formatQuantity.ts';
import type { Field, NumberField } from './Field.ts';

/** Bounds that need no saying: they are refused in words where they are broken. */
const plain: ReadonlySet<string> = new Set(['', 'above 0', 'from 0']);

/**
 * Range and usual values of a number in few words, to stand at its field: "up to 100 %, typical 4…8". That a
 * rating lies above zero is not said. A typical value known for this very part stands instead of the usual
 * ones of its kind.
 */
export function hintOf(field: Field, known?: string): string {
  if (field.type !== 'number' && field.type !== 'integer') return '';
  const unit = field.unit === '' || field.unit === '°' ? field.unit : ` ${field.unit}`;
  const range = rangeWords(field);
  const usual = known ?? field.usual;
  const bounds = plain.has(range) ? '' : `${range}${unit}`;
  if (usual === undefined) return bounds;
  return bounds === '' ? `typical ${usual}${unit}` : `${bounds}, typical ${usual}`;
}

function rangeWords({ min, max, minExclusive }: NumberField): string {
  const low = min === undefined ? '' : signed(min);
  if (max === undefined) return min === undefined ? '' : `${minExclusive ? 'above' : 'from'} ${low}`;
  if (min === undefined || (min === 0 && minExclusive)) return `up to ${max}`;
  return `${low}…${max}`;
}

function signed(value: number): string {
  return value < 0 ? `${minusSign}${-value}` : String(value);
}
