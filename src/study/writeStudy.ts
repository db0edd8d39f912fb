import type { Study } from './types.ts';

/** Keys that open the file, in this order; the rest follows as it stands, the view last. */
const leading = [
  'format',
  'version',
  'title',
  'site',
  'preparedBy',
  'revision',
  'revisionDate',
  'notes',
  'frequencyHz',
];

const longestLine = 100;

/**
 * The study as JSON that people can read and compare: two spaces, short records on one line, a final line
 * feed. Unknown fields are written back.
 */
export function writeStudy(study: Study): string {
  const entries = Object.entries(study).filter(([, value]) => value !== undefined);
  const rank = ([key]: [string, unknown]) =>
    key === 'view' ? 1000 : leading.includes(key) ? leading.indexOf(key) : 100;
  const ordered = Object.fromEntries(entries.sort((a, b) => rank(a) - rank(b)));
  return `${pretty(ordered, '')}\n`;
}

function pretty(value: unknown, indent: string): string {
  const flat = onOneLine(value);
  if (indent !== '' && indent.length + flat.length <= longestLine) return flat;
  if (typeof value !== 'object' || value === null) return flat;
  const inner = `${indent}  `;
  if (Array.isArray(value)) {
    const items = value.map((item) => `${inner}${pretty(item, inner)}`);
    return items.length === 0 ? '[]' : `[\n${items.join(',\n')}\n${indent}]`;
  }
  const fields = Object.entries(value)
    .filter(([, item]) => item !== undefined)
    .map(([key, item]) => `${inner}${JSON.stringify(key)}: ${pretty(item, inner)}`);
  return fields.length === 0 ? '{}' : `{\n${fields.join(',\n')}\n${indent}}`;
}

function onOneLine(value: unknown): string {
  if (Array.isArray(value)) return value.length === 0 ? '[]' : `[${value.map(onOneLine).join(', ')}]`;
  if (typeof value !== 'object' || value === null) return JSON.stringify(value ?? null);
  const fields = Object.entries(value).filter(([, item]) => item !== undefined);
  if (fields.length === 0) return '{}';
  return `{ ${fields.map(([key, item]) => `${JSON.stringify(key)}: ${onOneLine(item)}`).join(', ')} }`;
}
