import { fieldOf } from '../fields/fieldsOf.ts';
import { fullNameOf } from '../names.ts';
import type { ElementKind, StudyElement } from '../types.ts';
import { formatQuantity } from '../units/formatQuantity.ts';
import { type Said, type State, saidOfPart, setFields } from './Said.ts';

interface Customary {
  kind: ElementKind;
  field: string;
  /** Per cent; a value a hundred times as large must fall within for the fraction to be told. */
  least: number;
  most: number;
}

/** What such values are in practice; a fraction of 1 written for per cent falls a hundred times below. */
const customary: readonly Customary[] = [
  { kind: 'transformer', field: 'ukPercent', least: 2, most: 20 },
  { kind: 'generator', field: 'xdSubtransientPercent', least: 5, most: 60 },
  { kind: 'supply', field: 'setpointPercent', least: 80, most: 120 },
  { kind: 'generator', field: 'setpointPercent', least: 80, most: 120 },
  { kind: 'motor', field: 'loadPercent', least: 10, most: 150 },
  { kind: 'bank', field: 'detuningPercent', least: 4, most: 15 },
];

/** Fractions of 1 that were meant as per cent: "uk 0.06 %". */
export function fractionFindings(state: State): Said[] {
  return state.here.elements.flatMap((part) =>
    customary.flatMap(({ kind, ...range }) => (part.kind === kind ? asFraction(state, part, range) : [])),
  );
}

function asFraction(
  state: State,
  part: StudyElement,
  { field, least, most }: Omit<Customary, 'kind'>,
): Said[] {
  const value = new Map<string, unknown>(Object.entries(part)).get(field);
  if (typeof value !== 'number' || value >= least / 2) return [];
  const percent = Number((100 * value).toPrecision(12));
  if (percent < least || percent > most) return [];
  const label = fieldOf(part.kind, field)?.label ?? field;
  const words = `set the ${label} of ${fullNameOf(part)} to ${formatQuantity(percent, '%')}`;
  return [
    saidOfPart(part, field, {
      code: 'fraction-for-percent',
      severity: 'warning',
      text: `the ${label} of ${formatQuantity(value, '%')} reads as a fraction of 1; customary are ${least} to ${formatQuantity(most, '%')}`,
      mend: words,
      repair: setFields(state, part.id, { [field]: percent }, words),
    }),
  ];
}
