import { readFileSync } from 'node:fs';
import { readStudy, type Study } from '../../src/study/index.ts';

export const studyFiles = ['1-detuned-400v', '2-four-wire-480v', '3-filters-6k6-alpha'] as const;

export function studyText(name: (typeof studyFiles)[number]): string {
  return readFileSync(new URL(`../reference/studies/${name}.json`, import.meta.url), 'utf8');
}

export function exampleStudy(name: (typeof studyFiles)[number]): Study {
  const { study } = readStudy(studyText(name));
  if (!study) throw new Error(`${name} is refused`);
  return study;
}

/** The study as loose data, to be spoilt by a test. */
export function looseStudy(name: (typeof studyFiles)[number]): LooseStudy {
  return JSON.parse(studyText(name)) as LooseStudy;
}

export type Loose = Record<string, unknown>;

export interface LooseStudy extends Loose {
  buses: Loose[];
  elements: Loose[];
  spectra: Loose[];
  cases: { id: unknown; changes: { element: unknown; set: Loose }[] }[];
  scans: Loose[];
}

/** The part of that id in loose data. */
export function part(study: LooseStudy, id: string): Loose {
  const found = study.elements.find((element) => element.id === id);
  if (!found) throw new Error(`no part ${id}`);
  return found;
}

/** Freezes data to the bottom, so that a change in place throws. */
export function deepFrozen<T>(value: T): T {
  if (typeof value === 'object' && value !== null && !Object.isFrozen(value)) {
    Object.freeze(value);
    for (const item of Object.values(value)) deepFrozen(item);
  }
  return value;
}
