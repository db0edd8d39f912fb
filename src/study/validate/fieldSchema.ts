import { z } from 'zod';
import type { Field, NumberField } from '../fields/Field.ts';
import { type FieldOwner, fieldsOf } from '../fields/fieldsOf.ts';
import { parseVectorGroup } from '../vectorGroup.ts';
import { allowedOf } from './allowed.ts';
import { isRecord, valueText } from './issue.ts';

// A strict Content-Security-Policy forbids the evaluation zod would otherwise try at start.
z.config({ jitless: true });

type Schema = z.ZodType<unknown>;

function sentence(field: Field): (issue: { input?: unknown }) => string {
  return ({ input }) =>
    input === undefined
      ? `${field.label} is missing; allowed is ${allowedOf(field)}`
      : `${field.label} is ${valueText(input)}; allowed is ${allowedOf(field)}`;
}

function numberSchema(field: NumberField): Schema {
  const error = sentence(field);
  let schema = z.number({ error });
  if (field.type === 'integer') schema = schema.int({ error });
  if (field.min !== undefined)
    schema = field.minExclusive ? schema.gt(field.min, { error }) : schema.gte(field.min, { error });
  if (field.max !== undefined)
    schema = field.maxExclusive ? schema.lt(field.max, { error }) : schema.lte(field.max, { error });
  return schema;
}

function refined(field: Field, accepts: (value: unknown) => boolean): Schema {
  return z.unknown().refine(accepts, { error: sentence(field) });
}

function isPair(value: unknown): value is [number, number] {
  return (
    Array.isArray(value) &&
    value.length === 2 &&
    value.every((item) => typeof item === 'number' && Number.isFinite(item))
  );
}

function vectorGroupSchema(field: Field): Schema {
  return z.string({ error: sentence(field) }).superRefine((value, context) => {
    const read = parseVectorGroup(value);
    if (typeof read === 'string')
      context.addIssue({ code: 'custom', message: `${field.label} ${valueText(value)} ${read}` });
  });
}

function listSchema(field: Field, owner: FieldOwner): Schema {
  return z.array(recordSchema(owner, field.label), { error: sentence(field) });
}

/** Text is taken for an id, anything else has to be rows: no union, so that a row's own finding survives. */
function spectrumSchema(field: Field): Schema {
  const rows = listSchema(field, 'harmonicRow');
  const id = z.string({ error: sentence(field) }).min(1, { error: sentence(field) });
  return z.unknown().superRefine((value, context) => {
    const outcome = (typeof value === 'string' ? id : rows).safeParse(value);
    for (const issue of outcome.error?.issues ?? []) {
      context.addIssue({ code: 'custom', path: issue.path, message: issue.message });
    }
  });
}

function requiredSchema(field: Field): Schema {
  switch (field.type) {
    case 'number':
    case 'integer':
      return numberSchema(field);
    case 'boolean':
      return z.boolean({ error: sentence(field) });
    case 'choice':
      return refined(field, (value) => field.options.some((option) => option.value === value));
    case 'text':
      return z.string({ error: sentence(field) });
    case 'vectorGroup':
      return vectorGroupSchema(field);
    case 'busRef':
      return z.string({ error: sentence(field) }).min(1, { error: sentence(field) });
    case 'spectrum':
      return spectrumSchema(field);
    case 'rows':
      return listSchema(field, 'harmonicRow');
    case 'steps':
      return listSchema(field, 'step');
    case 'skin':
      return refined(
        field,
        (value) => isPair(value) && value[0] >= 0 && value[0] <= 1 && value[1] >= 0 && value[1] <= 5,
      );
    case 'tolerance':
      return refined(field, (value) => isPair(value) && value[0] > -100 && value[0] <= value[1]);
    case 'group':
      return z.looseObject(shapeOf(field.fields), { error: sentence(field) });
    case 'opaque':
      return z.unknown();
  }
}

/** The schema of one field of the catalogue: absent is accepted unless the field is required. */
function fieldSchema(field: Field): Schema {
  const schema = requiredSchema(field);
  return field.required ? schema : schema.optional();
}

/** An object shape from a field table. Required choices refuse undefined by themselves. */
function shapeOf(fields: readonly Field[]): Record<string, Schema> {
  return Object.fromEntries(fields.map((field) => [field.key, fieldSchema(field)]));
}

const recordSchemas = new Map<FieldOwner, Schema>();

/** The schema of a record the catalogue describes; fields it does not know pass through. */
export function recordSchema(owner: FieldOwner, label: string = owner): Schema {
  const known = recordSchemas.get(owner);
  if (known) return known;
  const schema = z.looseObject(shapeOf(fieldsOf(owner)), {
    error: ({ input }) => `${label} is ${valueText(input)}; allowed is a record of fields`,
  });
  recordSchemas.set(owner, schema);
  return schema;
}

/** Path and message of everything a schema refuses. */
export function refusals(schema: Schema, value: unknown): { path: (string | number)[]; message: string }[] {
  const outcome = schema.safeParse(value);
  return (outcome.error?.issues ?? []).map((issue) => ({
    path: issue.path.map((step) => (typeof step === 'symbol' ? String(step) : step)),
    message: issue.message,
  }));
}

/** The value at a path inside data of unknown shape. */
export function valueAt(data: unknown, path: readonly (string | number)[]): unknown {
  return path.reduce<unknown>((value, step) => {
    if (Array.isArray(value) && typeof step === 'number') return value[step];
    return isRecord(value) && typeof step === 'string' && Object.hasOwn(value, step)
      ? value[step]
      : undefined;
  }, data);
}
