import type { Field, FieldType } from './Field.ts';

/** Data a reviewer asks the origin of; names, places and choices have none. */
const withOrigin: ReadonlySet<FieldType> = new Set([
  'number',
  'integer',
  'vectorGroup',
  'spectrum',
  'rows',
  'steps',
  'skin',
  'tolerance',
]);

/** Whether a field's value comes from somewhere a reviewer asks for. */
export function takesOrigin(field: Field): boolean {
  return withOrigin.has(field.type);
}
