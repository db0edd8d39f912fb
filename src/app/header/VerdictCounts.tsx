import type { VerdictWord } from '../../checks/index.ts';
import { countVerdicts, useWorkbench } from '../../store/index.ts';

const marks: Record<VerdictWord, { mark: string; words: string }> = {
  fail: { mark: '×', words: 'fail' },
  watch: { mark: '!', words: 'watch' },
  pass: { mark: '✓', words: 'pass' },
  unknown: { mark: '?', words: 'without a verdict' },
};

/** How the checks of this case, and of all cases, end. Not-yet-known counts show as such. */
export function VerdictCounts() {
  const fail = useWorkbench(countVerdicts('fail', 'case'));
  const watch = useWorkbench(countVerdicts('watch', 'case'));
  const pass = useWorkbench(countVerdicts('pass', 'case'));
  const unknown = useWorkbench(countVerdicts('unknown', 'case'));
  const failInAll = useWorkbench(countVerdicts('fail', 'all'));
  const hasStudy = useWorkbench((state) => state.study !== null);
  if (!hasStudy) return <div className="counts" />;
  return (
    <output className="counts" aria-label="Verdicts">
      <span className="count" data-verdict="fail" title="checks that fail in this case · in all cases">
        {marks.fail.mark} {fail ?? '…'} fail in this case · {failInAll ?? '…'} in all
      </span>
      {(
        [
          ['watch', watch],
          ['pass', pass],
          ['unknown', unknown],
        ] as const
      ).map(([word, count]) => (
        <span key={word} className="count" data-verdict={word} title={marks[word].words}>
          {marks[word].mark} {count ?? '…'} <span className="visually-hidden">{marks[word].words}</span>
        </span>
      ))}
    </output>
  );
}
