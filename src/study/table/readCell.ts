import type { ChoiceField, Field, NumberField, PairField } from '../fields/Field.ts';
import { isInside } from '../fields/isInside.ts';
import { nameOf } from '../names.ts';
import { builtInSpectra } from '../spectra/builtIn.ts';
import type { Study } from '../types.ts';
import { formatQuantity } from '../units/formatQuantity.ts';
import { parseQuantity } from '../units/parseQuantity.ts';
import { parseSteps } from '../units/parseSteps.ts';
import type { DecimalMark } from '../units/readNumber.ts';
import { readQuantity } from '../units/readQuantity.ts';
import { parseRowsLine } from '../units/rowsLine.ts';
import type { Unit } from '../units/unit.ts';
import { unitOf } from '../units/unitTable.ts';
import { allowedOf } from '../validate/allowed.ts';
import { parseVectorGroup } from '../vectorGroup.ts';

export type ReadCell =
  | {
      ok: true;
      /** undefined: the field falls back to its default. */
      value: unknown;
    }
  | { ok: false; error: string };

export interface CellReading {
  /** The decimal mark of the table, where it is known. */
  decimal?: DecimalMark | undefined;
  /** The unit the column's head names; '' for the field's own. */
  unit?: string | undefined;
}

const yes: ReadonlySet<string> = new Set(['yes', 'y', 'true', '1', 'x', 'on', 'in', '✓']);
const no: ReadonlySet<string> = new Set(['no', 'n', 'false', '0', 'off', 'out', '-', '–']);

/** What is written in a cell of a table, held against the field; an error is a sentence with what is allowed. */
export function readCell(study: Study, field: Field, text: string, reading: CellReading = {}): ReadCell {
  const typed = text.trim();
  if (field.type === 'number' || field.type === 'integer') return readNumberCell(typed, field, reading);
  if (typed === '')
    return field.required
      ? refused(`A value is needed: ${allowedOf(field)}.`)
      : { ok: true, value: undefined };
  switch (field.type) {
    case 'boolean':
      return readBoolean(typed);
    case 'choice':
      return readChoice(typed, field);
    case 'busRef':
      return readNamed(typed, study.buses, 'busbar');
    case 'vectorGroup': {
      const group = parseVectorGroup(typed);
      return typeof group === 'string' ? refused(`"${typed}" ${group}.`) : { ok: true, value: typed };
    }
    case 'steps': {
      const parsed = parseSteps(typed);
      return parsed.ok ? { ok: true, value: parsed.steps } : parsed;
    }
    case 'spectrum':
      return readSpectrum(study, typed);
    case 'rows': {
      const parsed = parseRowsLine(typed);
      return parsed.ok ? { ok: true, value: parsed.rows } : parsed;
    }
    case 'skin':
    case 'tolerance':
      return readPair(typed, field, reading);
    default:
      return { ok: true, value: typed };
  }
}

function refused(error: string): ReadCell {
  return { ok: false, error };
}

/** A number in its own unit, or in the unit of the column's head, which is then brought to the field's. */
function readNumberCell(typed: string, field: NumberField, { decimal, unit }: CellReading): ReadCell {
  if (unit === undefined || unit === '' || unit === field.unit || typed === '')
    return readQuantity(typed, field, decimal);
  const [from, to] = [unitOf(unit), unitOf(field.unit)];
  if (typeof from !== 'object' || typeof to !== 'object' || from.dimension !== to.dimension)
    return refused(`The column is in ${unit}, which does not measure ${field.label}.`);
  const parsed = parseQuantity(typed, unit as Unit, decimal);
  if (!parsed.ok) return parsed;
  const value = Number(((parsed.value * from.factor) / to.factor).toPrecision(15));
  if (isInside(value, field) && (field.type !== 'integer' || Number.isInteger(value)))
    return { ok: true, value };
  return refused(
    `${formatQuantity(parsed.value, unit, { digits: 6 })} is not possible here; allowed is ${allowedOf(field)}.`,
  );
}

function readBoolean(typed: string): ReadCell {
  const word = typed.toLowerCase();
  if (yes.has(word)) return { ok: true, value: true };
  if (no.has(word)) return { ok: true, value: false };
  return refused(`"${typed}" is neither yes nor no.`);
}

/** Whether words typed in a hurry mean these words: the same, or their beginning. */
function means(typed: string, words: string): boolean {
  return words.toLowerCase().startsWith(typed.toLowerCase());
}

/** The one that is named so; else the only one that begins so. */
function named<T>(typed: string, list: readonly T[], words: (item: T) => readonly string[]): T | undefined {
  const exact = list.find((item) => words(item).some((word) => word.toLowerCase() === typed.toLowerCase()));
  const begun = list.filter((item) => words(item).some((word) => means(typed, word)));
  return exact ?? (begun.length === 1 ? begun[0] : undefined);
}

function readChoice(typed: string, field: ChoiceField): ReadCell {
  const option = named(typed, field.options, ({ value, label }) => [String(value), label]);
  if (option) return { ok: true, value: option.value };
  return refused(
    `"${typed}" is no ${field.label}; allowed is ${field.options.map(({ label }) => label).join(', ')}.`,
  );
}

function readNamed(typed: string, list: readonly { id: string; name?: string }[], what: string): ReadCell {
  const found = named(typed, list, (item) => [nameOf(item), item.id]);
  if (found) return { ok: true, value: found.id };
  const standing = list.map(nameOf).join(', ') || 'none';
  return refused(`There is no ${what} "${typed}"; the study has ${standing}.`);
}

/** A spectrum by its name or id, or its rows on one line. */
function readSpectrum(study: Study, typed: string): ReadCell {
  if (/^\d+\s*:/.test(typed)) {
    const parsed = parseRowsLine(typed);
    return parsed.ok ? { ok: true, value: parsed.rows } : parsed;
  }
  return readNamed(typed, [...(study.spectra ?? []), ...builtInSpectra], 'spectrum');
}

/** Two numbers parted by "…", "to", a slash or a semicolon. */
function readPair(typed: string, field: PairField, { decimal }: CellReading): ReadCell {
  const parts = typed.split(/…|\.{2,3}|;|\/|\bto\b/).map((part) => part.trim());
  const numbers = parts.map((part) => parseQuantity(part, field.type === 'tolerance' ? '%' : '', decimal));
  const [first, second, more] = numbers;
  if (!first?.ok || !second?.ok || more)
    return refused(`"${typed}" is no pair of numbers; write it as −5 … 10. Allowed is ${allowedOf(field)}.`);
  return { ok: true, value: [first.value, second.value] };
}
