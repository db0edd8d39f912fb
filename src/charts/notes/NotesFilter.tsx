import type { VerdictWord } from '../../checks/index.ts';
import { VerdictMark } from './VerdictMark.tsx';
import type { VerdictGrouping } from './verdictOrder.ts';

interface NotesFilterProps {
  counts: Record<VerdictWord, number>;
  shown: ReadonlySet<VerdictWord>;
  grouping: VerdictGrouping;
  onShown(shown: ReadonlySet<VerdictWord>): void;
  onGrouping(grouping: VerdictGrouping): void;
}

const CHOICES: readonly { word: VerdictWord; label: string }[] = [
  { word: 'fail', label: 'fail' },
  { word: 'watch', label: 'watch' },
  { word: 'unknown', label: 'no verdict' },
  { word: 'pass', label: 'pass' },
];

/** Counts that switch which verdicts are listed, and how they are gathered. */
export function NotesFilter({ counts, shown, grouping, onShown, onGrouping }: NotesFilterProps) {
  const toggle = (word: VerdictWord) => {
    const next = new Set(shown);
    if (!next.delete(word)) next.add(word);
    onShown(next);
  };
  return (
    <div className="notes-filter">
      <fieldset>
        <legend className="visually-hidden">Verdicts shown</legend>
        {CHOICES.map(({ word, label }) => (
          <button
            key={word}
            type="button"
            className={`word-${word}`}
            title={`${shown.has(word) ? 'Hide' : 'Show'}: ${label}`}
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
        aria-label="Order of the verdicts"
        value={grouping}
        onChange={(event) => onGrouping(groupingFrom(event.target.value))}
      >
        <option value="margin">by margin</option>
        <option value="part">by part</option>
        <option value="check">by check</option>
      </select>
    </div>
  );
}

function groupingFrom(text: string): VerdictGrouping {
  return text === 'part' || text === 'check' ? text : 'margin';
}
