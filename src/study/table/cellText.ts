import type { Field } from '../fields/Field.ts';
import { busName, nameOf } from '../names.ts';
import { isHarmonicRows, spectrumById } from '../spectra/spectrumOf.ts';
import type { BankStep, Study } from '../types.ts';
import { editText, formatNumber } from '../units/formatQuantity.ts';
import { stepsText } from '../units/parseSteps.ts';
import { rowsLine } from '../units/rowsLine.ts';

/** How a cell's number stands: with every digit to be edited or copied, or in trade formatting to be read. */
export type CellStyle = 'plain' | 'shown';

/** A value as a cell of a table holds it, without its unit; reading it back gives the value again. */
export function cellText(study: Study, field: Field, value: unknown, style: CellStyle): string {
  if (value === undefined || value === null) return '';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (field.type === 'choice')
    return field.options.find((option) => option.value === value)?.label ?? String(value);
  if (typeof value === 'number')
    return style === 'plain' ? editText(value) : formatNumber(value, { digits: 6 });
  if (typeof value === 'string') return textCell(study, field, value);
  if (!Array.isArray(value)) return '';
  if (field.type === 'steps') return stepsText(value as BankStep[]);
  if (isHarmonicRows(value)) return rowsLine(value);
  const numbers = value.map(Number);
  return numbers.map((part) => (style === 'plain' ? editText(part) : formatNumber(part))).join(' … ');
}

function textCell(study: Study, field: Field, value: string): string {
  if (field.type === 'busRef') return busName(study, value);
  const spectrum = field.type === 'spectrum' ? spectrumById(study, value) : undefined;
  return spectrum ? nameOf(spectrum) : value;
}
