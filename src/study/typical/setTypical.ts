import { joinEdits, makeEdit } from '../edits/edit.ts';
import { originPath, putOrigins } from '../edits/origins.ts';
import { updateElement } from '../edits/updates.ts';
import { elementById } from '../lookup.ts';
import { fullNameOf } from '../names.ts';
import type { DataOrigin, Edit, Study } from '../types.ts';

/**
 * Sets typical values of a part in the base study and marks each of them typical with its source, as one
 * step of undo. Values that stood as measured or nameplate data are replaced with their mark.
 */
export function setTypical(
  study: Study,
  id: string,
  typical: { values: object; origins: Readonly<Record<string, DataOrigin>> },
): Edit {
  const element = elementById(study, id);
  const words = `set typical values of ${element ? fullNameOf(element) : id}`;
  const marks = Object.fromEntries(
    Object.entries(typical.origins).map(([field, origin]) => [originPath('elements', id, field), origin]),
  );
  return joinEdits(`${element?.kind ?? 'element'}.setTypical`, words, [
    (current) => updateElement(current, id, { ...typical.values }),
    () =>
      makeEdit('origin.set', words, (current) =>
        elementById(current, id) ? putOrigins(current, marks) : current,
      ),
  ]);
}
