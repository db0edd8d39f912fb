import type { CheckContext } from './CheckContext.ts';
import { commonPractice } from './source.ts';
import type { Source } from './types.ts';
import type { Row } from './verdict.ts';

/** What a row about one part begins with; the source is common practice unless a document is named. */
export function partRow(
  context: CheckContext,
  id: string,
  named: { check: string; title: string; unit: string; source?: Source; part?: string },
): Row {
  return {
    source: commonPractice,
    ...named,
    subject: { kind: 'element', id },
    caseId: context.caseId,
    working: [],
  };
}
