import type { Edit, Study } from '../types.ts';

export function makeEdit(label: string, words: string, apply: (study: Study) => Study): Edit {
  return { label, words, apply };
}

/** Several edits as one step of undo: each is made on the study the earlier ones left. */
export function joinEdits(label: string, words: string, makers: readonly ((study: Study) => Edit)[]): Edit {
  return {
    label,
    words,
    apply: (study) => makers.reduce((current, make) => make(current).apply(current), study),
  };
}

/** Whether two plain values are the same data, whatever the order of their keys. */
export function sameData(a: unknown, b: unknown): boolean {
  if (Object.is(a, b)) return true;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return a === b;
  if (Array.isArray(a) !== Array.isArray(b)) return false;
  const left = Object.entries(a).filter(([, value]) => value !== undefined);
  const right = new Map(Object.entries(b).filter(([, value]) => value !== undefined));
  return (
    left.length === right.size &&
    left.every(([key, value]) => right.has(key) && sameData(value, right.get(key)))
  );
}

/** Fields to set; undefined or null removes a field. */
export type Patch = Readonly<Record<string, unknown>>;

/**
 * The record with the patch applied, or the same object where nothing changes. `fixed` keys stay. Entries
 * are copied, never assigned, so a key of any name is only data.
 */
export function patched<T extends object>(record: T, patch: Patch, fixed: readonly string[] = []): T {
  const entries = new Map<string, unknown>(Object.entries(record));
  let changed = false;
  for (const [key, value] of Object.entries(patch)) {
    if (fixed.includes(key) || sameData(entries.get(key) ?? null, value ?? null)) continue;
    changed = true;
    if (value === undefined || value === null) entries.delete(key);
    else entries.set(key, value);
  }
  return changed ? (Object.fromEntries(entries) as unknown as T) : record;
}

/** The study with one of its fields replaced, or without it where the value is undefined or empty. */
export function withField<K extends keyof Study>(study: Study, key: K, value: Study[K] | undefined): Study {
  return patched(study, { [key]: value });
}

/** The list with the record of that id passed through `change`; the same list where nothing changes. */
export function mapById<T extends { id: string }>(list: T[], id: string, change: (item: T) => T): T[] {
  const index = list.findIndex((item) => item.id === id);
  const item = list[index];
  if (!item) return list;
  const next = change(item);
  return next === item ? list : list.with(index, next);
}

/** The lowest free id of a stem: "bank1", "bank2", … Deterministic for a given list. */
export function freshId(records: readonly { id: string }[], stem: string): string {
  const taken = new Set(records.map((record) => record.id));
  let counter = 1;
  while (taken.has(`${stem}${counter}`)) counter += 1;
  return `${stem}${counter}`;
}

/** The counter at the end of an id made by freshId. */
export function counterOf(id: string): string {
  return /\d+$/.exec(id)?.[0] ?? '';
}
