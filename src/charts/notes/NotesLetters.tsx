import type { Verdict } from '../../checks/index.ts';
import { FoldMark } from '../figure/FoldMark.tsx';
import { type NoteSubject, pinKey, pinSubject, subjectKey } from './noteLetters.ts';
import type { Reading } from './Reading.ts';
import { VerdictMark } from './VerdictMark.tsx';
import { byMargin } from './verdictOrder.ts';
import { verdictHeadline } from './verdictWords.ts';

export interface NotesLettersProps {
  readings: readonly Reading[];
  verdicts: readonly Verdict[];
  letters: ReadonlyMap<string, string>;
  nameOf(subject: NoteSubject): string;
  stale: boolean;
  onSubject?(subject: NoteSubject | null, noteKey: string | null): void;
  /** Opens the column, at a note where one was chosen. */
  onOpen(noteKey: string | null): void;
}

interface LetterRow {
  key: string;
  subject: NoteSubject;
  verdict: Verdict['verdict'] | null;
  words: string;
}

/** The notes column folded: a letter for each note that asks for a look, with the mark of its verdict. */
export function NotesLetters(props: NotesLettersProps) {
  const { readings, verdicts, letters, nameOf, onSubject } = props;
  const rows: LetterRow[] = [
    ...readings.map(({ pin, title }) => ({
      key: pinKey(pin),
      subject: pinSubject(pin),
      verdict: null,
      words: title,
    })),
    ...verdicts
      .filter(({ verdict }) => verdict !== 'pass')
      .sort(byMargin)
      .map((verdict) => ({
        key: verdict.key,
        subject: verdict.subject,
        verdict: verdict.verdict,
        words: verdictHeadline(verdict, nameOf(verdict.subject)),
      })),
  ];
  return (
    <section className={props.stale ? 'notes notes-letters stale' : 'notes notes-letters'} aria-label="Notes">
      <button type="button" className="fold" aria-label="Open the notes" onClick={() => props.onOpen(null)}>
        <FoldMark way="left" />
      </button>
      <ul>
        {rows.map(({ key, subject, verdict, words }) => (
          <li key={key}>
            <button
              type="button"
              data-note={key}
              title={words}
              aria-label={`Open the note: ${words}`}
              className={verdict ? `word-${verdict}` : undefined}
              onClick={() => props.onOpen(key)}
              onPointerEnter={() => onSubject?.(subject, key)}
              onPointerLeave={() => onSubject?.(null, null)}
              onFocus={() => onSubject?.(subject, key)}
              onBlur={() => onSubject?.(null, null)}
            >
              {verdict && <VerdictMark verdict={verdict} size={13} />}
              {letters.get(subjectKey(subject)) ?? ''}
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}
