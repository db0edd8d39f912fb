import type { VerdictWord } from '../../checks/index.ts';
import { countVerdicts, useWorkbench } from '../../store/index.ts';

const marks: Record<VerdictWord, { mark: string; words: string }> = {
  fail: { mark: '×', words: 'fail' },
  watch: { mark: '!', words: 'watch' },
  pass: { mark: '✓', words: 'pass' },
  unknown: { mark: '?', words: 'without a verdict' },
};

interface CountProps {
  word: VerdictWord;
  count: number | null;
}

/** One count under its mark; none of a kind is said quietly. */
function Count({ word, count }: CountProps) {
  const { mark, words } = marks[word];
  return (
    <span className="count" data-verdict={word} data-some={count ? '' : undefined} title={words}>
      {mark} {count ?? '…'} <span className="visually-hidden">{words}</span>
    </span>
  );
}

/** How many checks fail, here and in all cases. */
function FailCount() {
  const here = useWorkbench(countVerdicts('fail', 'case'));
  const inAll = useWorkbench(countVerdicts('fail', 'all'));
  return (
    <span className="count" data-verdict="fail" title="checks that fail in this case · in all cases">
      <span data-some={here ? '' : undefined}>
        {marks.fail.mark} {here ?? '…'} fail<span className="when-wide"> in this case</span>
      </span>
      {' · '}
      <span data-some={inAll ? '' : undefined}>{inAll ?? '…'} in all</span>
    </span>
  );
}

/** How the checks of this case, and of all cases, end. Not-yet-known counts show as such. */
export function VerdictCounts() {
  const watch = useWorkbench(countVerdicts('watch', 'case'));
  const pass = useWorkbench(countVerdicts('pass', 'case'));
  const unknown = useWorkbench(countVerdicts('unknown', 'case'));
  const hasSite = useWorkbench((state) => state.study !== null && state.study.buses.length > 0);
  if (!hasSite) return <div className="counts quiet">no verdicts yet</div>;
  return (
    <output className="counts" aria-label="Verdicts">
      <FailCount />
      <Count word="watch" count={watch} />
      <Count word="pass" count={pass} />
      <Count word="unknown" count={unknown} />
    </output>
  );
}
