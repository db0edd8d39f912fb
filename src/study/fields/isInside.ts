import type { NumberField } from './Field.ts';

/** Whether a number lies in the range its field allows, in the field's unit. */
export function isInside(value: number, field: NumberField): boolean {
  const { min, max } = field;
  if (min !== undefined && (field.minExclusive ? value <= min : value < min)) return false;
  return !(max !== undefined && (field.maxExclusive ? value >= max : value > max));
}
