import type { Edit, Finding, Study } from '../types.ts';
import { checkStudy } from '../validate/checkStudy.ts';

/**
 * What would refuse the study after an edit, in the base study or in any case; empty where the edit is
 * sound or changes nothing. A data field asks before it commits, so an open study is always a valid one.
 */
export function errorsAfter(study: Study, edit: Edit): Finding[] {
  const after = edit.apply(study);
  if (after === study) return [];
  return checkStudy(after).findings.filter((finding) => finding.severity === 'error');
}
