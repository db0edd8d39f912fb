import { isBaseCase } from '../cases.ts';
import { elementById, isSeries } from '../lookup.ts';
import { builtInSpectrum } from '../spectra/builtIn.ts';
import type { Edit, Study } from '../types.ts';
import { joinEdits } from './edit.ts';
import { type End, moveEnd } from './moveParts.ts';
import { setOrigin } from './origins.ts';
import { type UpdateOptions, updateElement } from './updates.ts';

/**
 * Sets one field of a part as it is given in a slip or a table: a busbar is a move along which pins follow, a
 * built-in spectrum is typical and brings its source, anything else is the value itself.
 */
export function setField(
  study: Study,
  id: string,
  key: string,
  value: unknown,
  options: UpdateOptions = {},
): Edit {
  const plain = updateElement(study, id, { [key]: value }, options);
  const element = elementById(study, id);
  const inCase = options.caseId !== undefined && !isBaseCase(study, options.caseId);
  if (!element || inCase) return plain;
  if (key === 'bus' || key === 'from' || key === 'to') {
    // Both ends at one busbar is no move; the plain edit is what a check then refuses in words.
    const other = isSeries(element) && (key === 'from' ? element.to : element.from);
    return value === other ? plain : moveEnd(study, id, key satisfies End, String(value));
  }
  const spectrum = key === 'spectrum' && typeof value === 'string' ? builtInSpectrum(value) : undefined;
  if (!spectrum) return plain;
  return joinEdits(plain.label, plain.words, [
    () => plain,
    (current) => setOrigin(current, element, key, { origin: 'typical', note: spectrum.origin }),
  ]);
}
