import { useDeferredValue, useMemo } from 'react';
import { useWorkbench } from '../../store/index.ts';
import type { Study } from '../../study/index.ts';
import { FamilyChoice } from './FamilyChoice.tsx';
import { RunState } from './RunState.tsx';
import { ToleranceChoice } from './ToleranceChoice.tsx';
import { WorstList } from './WorstList.tsx';
import './states.css';

/** Operating states and tolerances in the margin: which are searched, how far the search is, and the worst it found. */
export function StatesMargin({ study }: { study: Study }) {
  // An edit is drawn before its states are counted.
  const shown = useDeferredValue(study);
  const question = useWorkbench((state) => state.worstQuestion);
  const hasSite = useMemo(() => shown.elements.length > 0, [shown]);
  if (!hasSite)
    return <div className="margin-list quiet">Nothing to search: the study has no parts yet.</div>;
  return (
    <div className="margin-list">
      <RunState study={shown} question={question} />
      <details className="states-searched">
        <summary>What is searched</summary>
        <FamilyChoice study={shown} question={question} />
        <ToleranceChoice study={shown} question={question} />
      </details>
      <WorstList study={shown} />
    </div>
  );
}
