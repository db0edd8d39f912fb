import type { VerdictWord } from '../../checks/index.ts';
import { countVerdicts, useWorkbench, workbench } from '../../store/index.ts';

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

function show(verdictScope: 'case' | 'all'): void {
  const { setPlace, setVerdictScope } = workbench.getState();
  setPlace('site');
  setVerdictScope(verdictScope);
}

/** How many checks fail, here and in all cases; each count lists its verdicts in the notes. */
function FailCount() {
  const here = useWorkbench(countVerdicts('fail', 'case'));
  const inAll = useWorkbench(countVerdicts('fail', 'all'));
  const scope = useWorkbench((state) => state.view.verdictScope);
  return (
    <span className="count" data-verdict="fail">
      <button
        type="button"
        data-some={here ? '' : undefined}
        aria-pressed={scope === 'case'}
        title="Checks that fail in this case; the notes list its verdicts"
        onClick={() => show('case')}
      >
        {marks.fail.mark} {here ?? '…'} fail<span className="when-wide"> in this case</span>
      </button>
      {' · '}
      <button
        type="button"
        data-some={inAll ? '' : undefined}
        aria-pressed={scope === 'all'}
        title="Checks that fail in all cases together; the notes list the verdicts of every case"
        onClick={() => show('all')}
      >
        {inAll ?? '…'} in all
      </button>
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
