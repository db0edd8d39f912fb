import type { StudyState } from '../../sizing/index.ts';
import { type AddCaseEdit, addCase, type Study } from '../../study/index.ts';

/** Makes a generated state a case of the study, to be named and kept. */
export function promote(study: Study, { name, role, hoursPerDay, changes }: StudyState): AddCaseEdit {
  return addCase(study, {
    name,
    changes: [...changes],
    ...(role === undefined ? {} : { role }),
    ...(hoursPerDay === undefined ? {} : { hoursPerDay }),
  });
}
