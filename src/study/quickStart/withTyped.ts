import type { NumberField } from '../fields/Field.ts';
import { parseQuantity } from '../units/parseQuantity.ts';
import { type AnswerKey, answerFields } from './answerFields.ts';
import type { SiteAnswers } from './SiteAnswers.ts';

/**
 * The answers as they would be with what is being typed into one field, so that the preview follows every
 * key; null while it is no quantity the field takes. The peak's line takes hours as well.
 */
export function withTyped(answers: SiteAnswers, key: AnswerKey, text: string): SiteAnswers | null {
  const field = answerFields[key];
  if (field.type === 'choice') return null;
  const { [key]: _before, ...others } = answers;
  if (text.trim() === '') return others;
  const value = quantityIn(text, field);
  if (value !== null) return { ...(key === 'peakKW' ? withoutHours(others) : others), [key]: value };
  const hours = key === 'peakKW' ? quantityIn(text, answerFields.hours) : null;
  return hours === null ? null : { ...others, hours };
}

function withoutHours({ hours: _hours, ...others }: SiteAnswers): SiteAnswers {
  return others;
}

function quantityIn(text: string, field: NumberField): number | null {
  const parsed = parseQuantity(text, field.unit);
  if (!parsed.ok) return null;
  const { value } = parsed;
  const aboveLow = field.min === undefined || (field.minExclusive ? value > field.min : value >= field.min);
  const belowHigh = field.max === undefined || (field.maxExclusive ? value < field.max : value <= field.max);
  return aboveLow && belowHigh ? value : null;
}
