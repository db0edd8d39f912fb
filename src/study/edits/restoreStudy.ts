import type { Edit, Study } from '../types.ts';
import { makeEdit } from './edit.ts';

/** Goes back to a former state of the study as a whole; what was done since stays behind in the undo. */
export function restoreStudy(former: Study, when: string): Edit {
  return makeEdit('study.restore', `go back to the state of ${when}`, () => former);
}
