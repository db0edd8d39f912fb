import { useMemo } from 'react';
import { statesOf } from '../../sizing/index.ts';
import { freshWorst, useWorkbench } from '../../store/index.ts';
import { counted, type Study } from '../../study/index.ts';
import type { WorstQuestion } from '../../worker/index.ts';

interface Props {
  study: Study;
  question: WorstQuestion;
}

/** How many states there are and how far the search over them is. */
export function RunState({ study, question }: Props) {
  const worst = useWorkbench((state) =>
    state.worst?.revision === state.revision && state.worst.question === state.worstQuestion
      ? state.worst
      : null,
  );
  const result = useWorkbench(freshWorst);
  const count = useMemo(() => statesOf(study, question.families).count, [study, question.families]);
  if (worst?.tooMany)
    return (
      <p className="states-too-many" role="status">
        {worst.tooMany} states are more than 2000: untick a family, or take fewer steps. None was solved.
      </p>
    );
  const words = counted(count, 'state');
  if (result)
    return (
      <p className="quiet-line" role="status">
        {words}
        {question.tolerances ? ` and their tolerances, ${result.points} points solved` : ' at rated values'}:
        done.
        {result.unsolved.length > 0 && ` ${counted(result.unsolved.length, 'point')} without a solution.`}
      </p>
    );
  const { done = 0, total = count, points = 0 } = worst?.progress ?? {};
  return (
    <div className="states-progress">
      <progress aria-label="States searched" value={done} max={Math.max(1, total)} />
      <span className="quiet">
        {done} of {words}, {points} points
      </span>
    </div>
  );
}
