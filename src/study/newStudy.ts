import type { Study } from './types.ts';

/** An empty study: no busbars, no parts, defaults everywhere. */
export function newStudy(values: { title?: string; frequencyHz?: 50 | 60 } = {}): Study {
  return {
    format: 'varwright-study',
    version: 1,
    title: values.title ?? 'Untitled study',
    frequencyHz: values.frequencyHz ?? 50,
    buses: [],
    elements: [],
  };
}
