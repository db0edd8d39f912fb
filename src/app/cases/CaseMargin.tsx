import { useWorkbench } from '../../store/index.ts';
import type { Study } from '../../study/index.ts';
import { CaseActions } from './CaseActions.tsx';
import { CaseList } from './CaseList.tsx';
import { DifferenceList } from './DifferenceList.tsx';
import './cases.css';

/** The operating cases in the margin: all of them, what can be done with the one on screen, and what differs in it. */
export function CaseMargin({ study }: { study: Study }) {
  const caseId = useWorkbench((state) => state.view.caseId);
  return (
    <div className="margin-list">
      <CaseList study={study} caseId={caseId} />
      <CaseActions study={study} caseId={caseId} />
      <DifferenceList study={study} caseId={caseId} />
    </div>
  );
}
