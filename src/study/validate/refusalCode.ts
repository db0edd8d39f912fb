import type { Field } from '../fields/Field.ts';
import { type FieldOwner, fieldsOf } from '../fields/fieldsOf.ts';
import type { PathStep } from './issue.ts';

/** The field a path ends in: a row's or step's own field, or the one at the top. */
function leafField(owner: FieldOwner, path: readonly PathStep[]): Field | undefined {
  let fields = fieldsOf(owner);
  let leaf: Field | undefined;
  for (const step of path) {
    if (typeof step === 'number') continue;
    leaf = fields.find((field) => field.key === step);
    fields = leaf ? innerFields(leaf) : [];
  }
  return typeof path.at(-1) === 'number' ? undefined : leaf;
}

function innerFields(field: Field): readonly Field[] {
  if (field.type === 'group') return field.fields;
  if (field.type === 'steps') return fieldsOf('step');
  return field.type === 'rows' || field.type === 'spectrum' ? fieldsOf('harmonicRow') : [];
}

/** The kind of refusal: missing, non-finite, range, choice or type. */
export function refusalCode(owner: FieldOwner, path: readonly PathStep[], value: unknown): string {
  if (value === undefined) return 'missing';
  if (typeof value === 'number' && !Number.isFinite(value)) return 'non-finite';
  const field = leafField(owner, path);
  switch (field?.type) {
    case 'number':
    case 'integer':
      return typeof value === 'number' ? 'range' : 'type';
    case 'choice':
      return 'choice';
    case 'vectorGroup':
      return typeof value === 'string' ? 'choice' : 'type';
    case 'skin':
    case 'tolerance':
      return Array.isArray(value) ? 'range' : 'type';
    default:
      return 'type';
  }
}
