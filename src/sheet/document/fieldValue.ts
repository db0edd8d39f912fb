import { builtInSpectrum, busName, type Field, type Study } from '../../study/index.ts';
import { stepsInWords } from './correctionParts.ts';
import { entered } from './formatNumber.ts';

const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

function scaled(value: number, unit: string): string {
  if (unit === 'V' && Math.abs(value) >= 1000) return `${entered(value / 1000)} kV`;
  return unit === '' ? entered(value) : `${entered(value)} ${unit}`;
}

function harmonicRows(rows: readonly unknown[]): string {
  if (rows.length === 0) return 'none';
  return rows
    .flatMap((row) => {
      if (!isRecord(row) || typeof row.h !== 'number' || typeof row.percent !== 'number') return [];
      const angle = typeof row.angleDeg === 'number' ? `∠${entered(row.angleDeg)}°` : '';
      return [`h${row.h} ${entered(row.percent)} %${angle}`];
    })
    .join(', ');
}

function steps(rows: readonly unknown[]): string {
  const list = rows.flatMap((row) =>
    isRecord(row) && typeof row.kvar === 'number' ? [{ kvar: row.kvar, on: row.on !== false }] : [],
  );
  const off = list.filter(({ on }) => !on);
  const kvar = list.filter(({ on }) => on).reduce((sum, step) => sum + step.kvar, 0);
  const state = off.length === 0 ? 'all in' : `${entered(kvar)} kvar in`;
  return `${stepsInWords(list)} kvar, ${state}`;
}

function pair(field: Field, value: readonly unknown[]): string {
  const [first, second] = value.map((item) =>
    typeof item === 'number' ? entered(Number(item.toPrecision(4))) : '–',
  );
  if (field.type === 'tolerance') return `${first} … +${second} %`;
  return `${first}, ${second}`;
}

function listValue(field: Field, value: readonly unknown[]): string {
  if (field.type === 'steps') return steps(value);
  if (field.type === 'skin' || field.type === 'tolerance') return pair(field, value);
  return harmonicRows(value);
}

function groupValue(study: Study, fields: readonly Field[], value: Record<string, unknown>): string {
  return fields
    .flatMap((field) => {
      const text = fieldValue(study, field, value[field.key]);
      return text === undefined ? [] : [`${field.label} ${text}`];
    })
    .join(', ');
}

function textValue(study: Study, field: Field, value: string): string {
  if (field.type === 'busRef') return busName(study, value);
  if (field.type === 'spectrum')
    return study.spectra?.find(({ id }) => id === value)?.name ?? builtInSpectrum(value)?.name ?? value;
  if (field.type === 'choice') return field.options.find((option) => option.value === value)?.label ?? value;
  return value;
}

/** A field's value in words with its unit; undefined for an absent value and for data kept unread. */
export function fieldValue(study: Study, field: Field, value: unknown): string | undefined {
  if (value === undefined || value === null || field.type === 'opaque') return undefined;
  if (typeof value === 'number') {
    if (field.type === 'choice')
      return field.options.find((option) => option.value === value)?.label ?? String(value);
    return scaled(value, 'unit' in field ? field.unit : '');
  }
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'string') return textValue(study, field, value);
  if (Array.isArray(value)) return listValue(field, value);
  return field.type === 'group' && isRecord(value) ? groupValue(study, field.fields, value) : undefined;
}
