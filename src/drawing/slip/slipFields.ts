import { type BankStep, type Field, formatQuantity, stepsText } from '../../study/index.ts';

/** Fields with a place of their own at the head of the slip. */
const headKeys: ReadonlySet<string> = new Set(['name', 'on']);

export interface SlipSections {
  /** What the result hangs on. */
  essential: Field[];
  /** Under "more data": the busbars, which are chosen on the drawing, and what seldom matters. */
  more: Field[];
  groups: Extract<Field, { type: 'group' }>[];
}

/** The fields of a record as the slip lays them out; opaque data belongs to other places of the screen. */
export function slipSections(fields: readonly Field[]): SlipSections {
  const shown = fields.filter((field) => !headKeys.has(field.key) && field.type !== 'opaque');
  const plain = shown.filter((field) => field.type !== 'group');
  const isEssential = (field: Field) => !field.rare && field.type !== 'busRef';
  return {
    essential: plain.filter(isEssential),
    more: [
      ...plain.filter((field) => field.type === 'busRef'),
      ...plain.filter((field) => field.rare && field.type !== 'busRef'),
    ],
    groups: shown.filter((field): field is Extract<Field, { type: 'group' }> => field.type === 'group'),
  };
}

function isSteps(value: unknown): value is BankStep[] {
  return (
    Array.isArray(value) &&
    value.length > 0 &&
    value.every((item: unknown) => typeof item === 'object' && item !== null && 'kvar' in item)
  );
}

/** A value in short words, for "base: 140 kW": steps as they are typed, other lists counted. */
export function shortValue(value: unknown, unit: string): string {
  if (value === undefined || value === null) return 'not given';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (isSteps(value)) {
    const on = value.reduce((sum, step) => sum + (step.on === false ? 0 : step.kvar), 0);
    return `${stepsText(value)}, ${formatQuantity(on, 'kvar')} switched in`;
  }
  if (Array.isArray(value)) return `${value.length} ${value.length === 1 ? 'row' : 'rows'}`;
  return unit === '' || typeof value !== 'number' ? String(value) : `${value} ${unit}`;
}
