import type { Study } from './types.ts';

/**
 * One text for one value: keys sorted by code unit, no white space, numbers in their shortest form, absent
 * fields left out. Throws RangeError for a number that is not finite, naming its path.
 */
export function canonicalValue(value: unknown, path = '$'): string {
  if (typeof value === 'number') {
    if (!Number.isFinite(value))
      throw new RangeError(`${path} is ${value}; only finite numbers can be written`);
    return JSON.stringify(value);
  }
  if (Array.isArray(value)) {
    return `[${value.map((item, index) => canonicalValue(item ?? null, `${path}[${index}]`)).join(',')}]`;
  }
  if (typeof value !== 'object' || value === null) return JSON.stringify(value ?? null);
  const fields = Object.entries(value)
    .filter(([, item]) => item !== undefined)
    .sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0))
    .map(([key, item]) => `${JSON.stringify(key)}:${canonicalValue(item, `${path}.${key}`)}`);
  return `{${fields.join(',')}}`;
}

/** The study as canonical JSON without its view: what the fingerprint is taken of. */
export function canonicalJson(study: Study): string {
  const { view: _view, ...decisive } = study;
  return canonicalValue(decisive);
}
