import type { Field, NumberField } from '../fields/Field.ts';

/** What a field accepts, in words: "a number above 0 % and at most 100 %". */
export function allowedOf(field: Field): string {
  switch (field.type) {
    case 'number':
    case 'integer':
      return allowedNumber(field);
    case 'boolean':
      return 'true or false';
    case 'choice':
      return field.options.map((option) => JSON.stringify(option.value)).join(', ');
    case 'text':
      return 'text';
    case 'vectorGroup':
      return 'a vector group such as Dyn11';
    case 'busRef':
      return 'the id of a busbar';
    case 'spectrum':
      return 'the id of a spectrum, or a list of rows with h and percent';
    case 'rows':
      return 'a list of rows with h, percent and, where known, angleDeg';
    case 'steps':
      return 'a list of steps with kvar';
    case 'skin':
      return 'two numbers s and e with 0 ≤ s ≤ 1 and 0 ≤ e ≤ 5';
    case 'tolerance':
      return 'two percentages, minus and plus, above −100 and in rising order';
    case 'group':
      return 'a record of fields';
    case 'opaque':
      return 'any data';
  }
}

function allowedNumber(field: NumberField): string {
  const unit = field.unit ? ` ${field.unit}` : '';
  const noun = field.type === 'integer' ? 'a whole number' : 'a number';
  const parts: string[] = [];
  if (field.min !== undefined) parts.push(`${field.minExclusive ? 'above' : 'from'} ${field.min}${unit}`);
  if (field.max !== undefined)
    parts.push(`${field.maxExclusive ? 'below' : parts.length > 0 ? 'to' : 'up to'} ${field.max}${unit}`);
  if (parts.length === 0) return unit ? `${noun} in${unit}` : noun;
  return `${noun} ${parts.join(parts[1]?.startsWith('to') && field.minExclusive !== true ? ' ' : ' and ').replace(' and to ', ' and at most ')}`;
}
