import { type KeyboardEvent, useState } from 'react';
import { useDraft } from './useDraft.ts';

export interface TextInputProps {
  id: string;
  value: string;
  placeholder?: string | undefined;
  label?: string;
  describedBy?: string | undefined;
  suggestions?: readonly string[] | undefined;
  className?: string;
  onFocus?(): void;
  /** What text of several lines from the clipboard becomes; a line of text would run them together. */
  ofPasted?(text: string): string;
  /** Takes the text, trimmed; returns why it cannot, as a sentence. */
  onCommit(text: string): string | null;
}

/** A line of text, taken on Enter and on leaving, put back by Escape, with suggestions where there are any. */
export function TextInput(props: TextInputProps) {
  const { id, value, suggestions, describedBy } = props;
  const [draft, draftNow, setDraft] = useDraft();
  const [error, setError] = useState<string | null>(null);
  const text = draft ?? value;
  /** Whether the text was taken; one that was not stays, with the reason. */
  const commit = (): boolean => {
    const outcome = text.trim() === value ? null : props.onCommit(text.trim());
    setError(outcome);
    if (outcome === null) setDraft(null);
    return outcome === null;
  };
  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key === 'Enter') {
      if (!commit()) event.preventDefault();
    } else if (event.key === 'Escape' && (draft !== null || error !== null)) {
      setDraft(null);
      setError(null);
    }
  };
  return (
    <>
      <input
        id={id}
        className={props.className ?? 'slip-text'}
        type="text"
        autoComplete="off"
        spellCheck={false}
        aria-label={props.label}
        aria-invalid={error !== null}
        aria-describedby={
          [error !== null ? `${id}-error` : null, describedBy].filter(Boolean).join(' ') || undefined
        }
        placeholder={props.placeholder}
        list={suggestions ? `${id}-list` : undefined}
        value={text}
        onChange={(event) => {
          setDraft(event.target.value);
          setError(null);
        }}
        onPaste={(event) => {
          const pasted = event.clipboardData.getData('text').trim();
          if (!props.ofPasted || !/[\t\n]/.test(pasted)) return;
          event.preventDefault();
          setDraft(props.ofPasted(pasted));
          setError(null);
        }}
        onFocus={props.onFocus}
        onBlur={() => draftNow.current !== null && commit()}
        onKeyDown={onKeyDown}
      />
      {suggestions && (
        <datalist id={`${id}-list`}>
          {suggestions.map((item) => (
            <option key={item} value={item} />
          ))}
        </datalist>
      )}
      {error !== null && (
        <span id={`${id}-error`} className="slip-error" role="alert">
          {error}
        </span>
      )}
    </>
  );
}
