import type { NumberField } from '../fields/Field.ts';
import { isInside } from '../fields/isInside.ts';
import { allowedOf } from '../validate/allowed.ts';
import { formatQuantity } from './formatQuantity.ts';
import { parseQuantity } from './parseQuantity.ts';
import type { DecimalMark } from './readNumber.ts';

export type ReadQuantity =
  | {
      ok: true;
      /** In the field's unit; undefined falls back to the default. */
      value: number | undefined;
    }
  | { ok: false; error: string };

/**
 * What is written in a number field: read in trade units and held against the field's range. Nothing written
 * means the default where the field has one to fall back to. The error names the value and what is allowed.
 */
export function readQuantity(typed: string, field: NumberField, decimal?: DecimalMark): ReadQuantity {
  if (typed.trim() === '')
    return field.required
      ? { ok: false, error: `A value is needed: ${allowedOf(field)}.` }
      : { ok: true, value: undefined };
  const parsed = parseQuantity(typed, field.unit, decimal);
  if (!parsed.ok) return parsed;
  const { value } = parsed;
  if (isInside(value, field) && (field.type !== 'integer' || Number.isInteger(value)))
    return { ok: true, value };
  return {
    ok: false,
    error: `${formatQuantity(value, field.unit, { digits: 6 })} is not possible here; allowed is ${allowedOf(field)}.`,
  };
}
