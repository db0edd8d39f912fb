import { isInside, type NumberField } from '../../study/index.ts';

/**
 * The next value up or down from the arrow keys: whole numbers by one, others by one unit of their second
 * digit (1000 → 1100, 0.85 → 0.86, 5.67 → 5.7), ten times that with `coarse`. Stays inside the field's range.
 */
export function stepValue(value: number, direction: 1 | -1, field: NumberField, coarse: boolean): number {
  const step = stepSize(value, field, direction) * (coarse ? 10 : 1);
  const grid = value / step;
  const onGrid = Math.abs(grid - Math.round(grid)) < 1e-9;
  const raw = onGrid ? value + direction * step : (direction > 0 ? Math.ceil(grid) : Math.floor(grid)) * step;
  const next = Number(raw.toPrecision(12));
  return isInside(next, field) ? next : nearestEnd(value, next, field);
}

/** At a power of ten the step down is the smaller one, so that up and down again returns. */
function stepSize(value: number, field: NumberField, direction: 1 | -1): number {
  if (field.type === 'integer') return 1;
  const magnitude = Math.abs(value);
  if (magnitude === 0) return smallestStep(field);
  const inward = direction * Math.sign(value) < 0;
  const decade = Math.floor(Math.log10(magnitude) + 1e-12);
  const isPower = Math.abs(magnitude / 10 ** decade - 1) < 1e-9;
  return 10 ** (decade - (inward && isPower ? 2 : 1));
}

/** From zero a field in degrees or per cent starts with 1, a ratio with 0.1. */
function smallestStep(field: NumberField): number {
  return field.unit === '' ? 0.1 : 1;
}

function nearestEnd(value: number, next: number, field: NumberField): number {
  if (next > value && field.max !== undefined && !field.maxExclusive) return field.max;
  if (next < value && field.min !== undefined && !field.minExclusive) return field.min;
  return value;
}
