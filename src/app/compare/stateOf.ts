import { baseStateId, type Study, studyInCase } from '../../study/index.ts';

/** The study as it stands in a case, or the base study itself. */
export function stateOf(study: Study, id: string): Study {
  return id === baseStateId ? study : studyInCase(study, id);
}
