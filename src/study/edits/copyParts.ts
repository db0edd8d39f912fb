import { elementById } from '../lookup.ts';
import { fullNameOf, nameOf } from '../names.ts';
import type { CaseChange, DataOrigin, Edit, Study, StudyElement } from '../types.ts';
import { freshId, makeEdit } from './edit.ts';
import { originPath, originsOf, putOrigins } from './origins.ts';

export interface CopyEdit extends Edit {
  /** Ids of the new parts, in the order of the originals. */
  elementIds: string[];
}

interface Twin {
  original: StudyElement;
  copy: StudyElement;
}

/** Duplicates parts beside themselves: hanging parts at their busbar, series parts in parallel. Cases and origins follow. */
export function duplicateParts(study: Study, ids: readonly string[]): CopyEdit {
  const originals = ids.flatMap((id) => elementById(study, id) ?? []);
  const twins = twinsOf(study, originals);
  const first = originals[0];
  const words =
    originals.length === 1 && first
      ? `duplicate ${fullNameOf(first)}`
      : `duplicate ${originals.length} parts`;
  const edit = makeEdit('parts.duplicate', words, (current) => {
    if (twins.length === 0) return current;
    const next: Study = { ...current, elements: [...current.elements, ...twins.map((twin) => twin.copy)] };
    if (current.cases) {
      next.cases = current.cases.map((item) => ({ ...item, changes: withTwinChanges(item.changes, twins) }));
    }
    return putOrigins(next, copiedOrigins(current, twins));
  });
  return { ...edit, elementIds: twins.map((twin) => twin.copy.id) };
}

function twinsOf(study: Study, originals: readonly StudyElement[]): Twin[] {
  const taken = [...study.elements];
  return originals.map((original) => {
    const copy = { ...original, id: freshId(taken, original.kind), name: freshName(taken, nameOf(original)) };
    taken.push(copy);
    return { original, copy };
  });
}

/** "Bank 1" becomes "Bank 2", or the next number nobody has. */
export function freshName(taken: readonly { id: string; name?: string }[], name: string): string {
  const names = new Set(taken.map(nameOf));
  const match = /^(.*?)(\d+)$/.exec(name);
  const stem = match?.[1] ?? `${name} `;
  let counter = match ? Number(match[2]) : 1;
  do counter += 1;
  while (names.has(`${stem}${counter}`));
  return `${stem}${counter}`;
}

function withTwinChanges(changes: CaseChange[], twins: readonly Twin[]): CaseChange[] {
  const added = twins.flatMap(({ original, copy }) =>
    changes
      .filter((change) => change.element === original.id)
      .map((change) => ({ ...change, element: copy.id })),
  );
  return added.length === 0 ? changes : [...changes, ...added];
}

function copiedOrigins(study: Study, twins: readonly Twin[]): Record<string, DataOrigin> {
  return Object.fromEntries(
    twins.flatMap(({ original, copy }) =>
      Object.entries(originsOf(study, 'elements', original.id)).map(([field, origin]) => [
        originPath('elements', copy.id, field),
        origin,
      ]),
    ),
  );
}
