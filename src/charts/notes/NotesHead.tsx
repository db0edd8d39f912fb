import type { VerdictWord } from '../../checks/index.ts';
import { FoldMark } from '../figure/FoldMark.tsx';
import { VerdictMark } from './VerdictMark.tsx';
import type { VerdictGrouping } from './verdictOrder.ts';

interface NotesHeadProps {
  counts: Record<VerdictWord, number>;
  shown: ReadonlySet<VerdictWord>;
  grouping: VerdictGrouping;
  /** The verdicts are of every case. */
  everyCase: boolean;
  onShown(shown: ReadonlySet<VerdictWord>): void;
  onGrouping(grouping: VerdictGrouping): void;
  /** Folds the column to its letters. */
  onFold: (() => void) | undefined;
}

const CHOICES: readonly { word: VerdictWord; label: string }[] = [
  { word: 'fail', label: 'fail' },
  { word: 'watch', label: 'watch' },
  { word: 'unknown', label: 'no verdict' },
  { word: 'pass', label: 'pass' },
];

/** The column's head: which verdicts are listed, how they are gathered, and the fold. */
export function NotesHead(props: NotesHeadProps) {
  const { counts, shown, grouping, everyCase, onShown, onGrouping, onFold } = props;
  const toggle = (word: VerdictWord) => {
    const next = new Set(shown);
    if (!next.delete(word)) next.add(word);
    onShown(next);
  };
  const any = Object.values(counts).some((count) => count > 0);
  return (
    <div className="notes-head">
      <fieldset hidden={!any}>
        <legend className="visually-hidden">Verdicts shown</legend>
        {CHOICES.map(({ word, label }) => (
          <button
            key={word}
            type="button"
            className={`word-${word}`}
            title={`${counts[word]} ${label}: ${shown.has(word) ? 'listed' : 'left out'}`}
            aria-pressed={shown.has(word)}
            onClick={() => toggle(word)}
          >
            <VerdictMark verdict={word} size={14} hidden />
            {counts[word]}
            <span className="visually-hidden"> {label}</span>
          </button>
        ))}
      </fieldset>
      <select
        hidden={!any}
        aria-label="Order of the verdicts"
        value={grouping}
        onChange={(event) => onGrouping(groupingFrom(event.target.value))}
      >
        <option value="margin">by margin</option>
        <option value="part">by part</option>
        <option value="check">by check</option>
        {everyCase && <option value="case">by case</option>}
      </select>
      {onFold && (
        <button type="button" className="fold" aria-label="Fold the notes to their letters" onClick={onFold}>
          <FoldMark way="right" />
        </button>
      )}
    </div>
  );
}

function groupingFrom(text: string): VerdictGrouping {
  return text === 'part' || text === 'check' || text === 'case' ? text : 'margin';
}
