import {
  type Assumption,
  type BankStep,
  formatQuantity,
  nameOf,
  type Study,
  spectrumById,
  stepsText,
} from '../../study/index.ts';

/** What was assumed in short words: "load loss P_k 7.6 kW". Lists and records stand by their label alone. */
export function assumptionWords(study: Study, { label, value, unit, key }: Assumption): string {
  const words = valueWords(study, key, value, unit);
  return words === '' ? label : `${label} ${words}`;
}

function valueWords(study: Study, key: string, value: unknown, unit: string): string {
  if (typeof value === 'number') return formatQuantity(value, unit);
  if (key === 'steps' && Array.isArray(value)) return `${stepsText(value as BankStep[])} kvar`;
  if (typeof value !== 'string') return value === undefined && key !== 'cases' ? 'not stated' : '';
  if (key === 'spectrum') return `“${nameOf(spectrumById(study, value) ?? { id: value })}”`;
  return value;
}
