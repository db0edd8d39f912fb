import { useEffect, useState } from 'react';
import { type ComparedCases, pageComputation, useWorkbench } from '../../store/index.ts';
import type { Study } from '../../study/index.ts';
import type { CaseDossier } from '../../worker/index.ts';

/** What is known of the two states, and whether it is of the study on screen. */
export interface Comparison {
  a: CaseDossier | null;
  b: CaseDossier | null;
  /** The study both were solved from. */
  study: Study | null;
  stale: boolean;
  /** What is being done, or why there is nothing; '' when all is there. */
  words: string;
}

const nothing: Comparison = { a: null, b: null, study: null, stale: true, words: 'Solving both cases' };

/** Both states solved, judged and scanned at the busbar looked at; older numbers stay, marked so, until the new come. */
export function useComparison(study: Study, { a, b }: ComparedCases): Comparison {
  const revision = useWorkbench((state) => state.revision);
  const focusBus = useWorkbench((state) => state.view.focusBus);
  const [known, setKnown] = useState<Comparison & { a0: string; b0: string }>({ ...nothing, a0: '', b0: '' });
  useEffect(() => {
    let current = true;
    setKnown((before) => ({ ...before, stale: true }));
    void pageComputation()
      .dossiers({ study, revision }, a === b ? [a] : [a, b], [focusBus], () => {})
      .then((settled) => {
        if (!current) return;
        if (settled.outcome === 'failed')
          setKnown({ ...nothing, words: `The cases could not be solved: ${settled.message}`, a0: a, b0: b });
        if (settled.outcome !== 'done') return;
        const [first, second] = settled.value;
        setKnown({
          a: first ?? null,
          b: second ?? first ?? null,
          study,
          stale: false,
          words: '',
          a0: a,
          b0: b,
        });
      });
    return () => {
      current = false;
    };
  }, [study, revision, a, b, focusBus]);
  const same = known.a0 === a && known.b0 === b;
  return same ? known : nothing;
}
