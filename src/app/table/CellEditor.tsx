import { type KeyboardEvent, useLayoutEffect, useRef } from 'react';
import {
  builtInSpectra,
  hintOf,
  nameOf,
  type Study,
  type TableColumn,
  understoodAs,
} from '../../study/index.ts';

/** Where the keyboard goes when a cell is left. */
export type Leaving = 'down' | 'up' | 'right' | 'left' | 'stay';

export interface CellEditorProps {
  study: Study;
  column: TableColumn;
  label: string;
  draft: string;
  /** A cell written over by typing gives the arrows to the table; one opened keeps them. */
  typed: boolean;
  error: string | null;
  /** Above the cell, where there is no room below. */
  above: boolean;
  onDraft(draft: string): void;
  /** Takes the draft and leaves; false where it is refused and stays, with its error. */
  onTake(draft: string, leaving: Leaving): boolean;
  onGiveUp(): void;
}

const ways: Readonly<Record<string, Leaving>> = {
  ArrowUp: 'up',
  ArrowDown: 'down',
  ArrowLeft: 'left',
  ArrowRight: 'right',
};

/** A cell being written in: a line of text, or a list where only some words are possible. */
export function CellEditor(props: CellEditorProps) {
  const { column, label, draft, typed, error, above, onDraft, onTake, onGiveUp } = props;
  const input = useRef<HTMLInputElement & HTMLSelectElement>(null);
  const choices = choicesOf(props.study, column, draft);
  const left = useRef(false);
  // Before the next key, which belongs into the cell.
  useLayoutEffect(() => {
    input.current?.focus({ preventScroll: true });
    if (!typed && input.current instanceof HTMLInputElement) input.current.select();
  }, [typed]);
  const take = (leaving: Leaving) => {
    left.current = true;
    left.current = onTake(input.current?.value ?? draft, leaving);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.nativeEvent.isComposing) return;
    const way = typed && !choices && !event.shiftKey ? ways[event.key] : undefined;
    if (event.key === 'Enter') take(event.shiftKey ? 'up' : 'down');
    else if (event.key === 'Tab') take(event.shiftKey ? 'left' : 'right');
    else if (event.key === 'Escape') {
      left.current = true;
      onGiveUp();
    } else if (way && !event.ctrlKey && !event.metaKey) take(way);
    else {
      if (!event.ctrlKey && !event.metaKey) event.stopPropagation();
      return;
    }
    event.preventDefault();
    event.stopPropagation();
  };
  const described = 'cell-editor-note';
  const shared = {
    ref: input,
    className: 'cell-editor',
    'aria-label': label,
    'aria-invalid': error !== null,
    'aria-describedby': described,
    onKeyDown,
    onBlur: () => {
      if (!left.current) onTake(input.current?.value ?? draft, 'stay');
    },
  };
  const note = error ?? noteOf(column, draft);
  return (
    <>
      {choices ? (
        <select {...shared} value={draft} onChange={(event) => onDraft(event.target.value)}>
          {choices.map(({ value, words }) => (
            <option key={value} value={value}>
              {words}
            </option>
          ))}
        </select>
      ) : (
        <input
          {...shared}
          type="text"
          autoComplete="off"
          spellCheck={false}
          value={draft}
          onChange={(event) => onDraft(event.target.value)}
        />
      )}
      <span
        id={described}
        className={above ? 'cell-note cell-note-above' : 'cell-note'}
        data-error={error !== null}
        role={error === null ? 'status' : 'alert'}
        hidden={note === ''}
      >
        {note}
      </span>
    </>
  );
}

/** What was understood while one types, else what the field takes. */
function noteOf({ field }: TableColumn, draft: string): string {
  const understood = 'unit' in field ? understoodAs(draft, field.unit) : null;
  return understood ?? hintOf(field);
}

interface ChoiceWords {
  /** As the cell is read. */
  value: string;
  words: string;
}

/** The words a cell can hold, where it can hold no others; null for a line of text. */
function choicesOf(study: Study, { field }: TableColumn, draft: string): ChoiceWords[] | null {
  const own = (words: readonly string[]): ChoiceWords[] => words.map((one) => ({ value: one, words: one }));
  const absent = field.required ? [] : [{ value: '', words: 'default' }];
  switch (field.type) {
    case 'boolean':
      return [...absent, ...own(['yes', 'no'])];
    case 'choice':
      return [...absent, ...own(field.options.map(({ label }) => label))];
    case 'busRef':
      return own(study.buses.map(nameOf));
    case 'spectrum': {
      const names = [...(study.spectra ?? []), ...builtInSpectra].map(nameOf);
      const rows = names.includes(draft) ? [] : [{ value: draft, words: 'rows of its own' }];
      return [...rows, ...own([...new Set(names)])];
    }
    default:
      return null;
  }
}

/** The first choice that begins with a letter typed over a cell; the letter itself for a line of text. */
export function firstDraft(study: Study, column: TableColumn, letter: string): string {
  const choices = choicesOf(study, column, '');
  if (!choices) return letter;
  const found = choices.find(({ words }) => words.toLowerCase().startsWith(letter.toLowerCase()));
  return (found ?? choices[0])?.value ?? '';
}
