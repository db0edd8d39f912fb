import { useMemo } from 'react';
import type { Verdict } from '../../checks/index.ts';
import { useWorkbench } from '../../store/index.ts';

const none: readonly Verdict[] = [];

/**
 * The verdicts the notes list: of the case on screen, or of every case as far as judged. Of several cases each
 * verdict's key names its case as well, as one check stands in many.
 */
export function useListedVerdicts(): { verdicts: readonly Verdict[]; everyCase: boolean } {
  const everyCase = useWorkbench((state) => state.view.verdictScope === 'all');
  const here = useWorkbench((state) => state.answer?.verdicts ?? none);
  const byCase = useWorkbench(({ allVerdicts, revision }) =>
    allVerdicts?.revision === revision ? allVerdicts.byCase : null,
  );
  const all = useMemo(
    () =>
      Object.values(byCase ?? {})
        .flat()
        .map((verdict) => ({ ...verdict, key: `${verdict.caseId}|${verdict.key}` })),
    [byCase],
  );
  return { verdicts: everyCase ? all : here, everyCase };
}
