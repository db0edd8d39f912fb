import { type KeyboardEvent, useState } from 'react';

export interface TextInputProps {
  id: string;
  value: string;
  placeholder?: string | undefined;
  label?: string;
  describedBy?: string | undefined;
  suggestions?: readonly string[] | undefined;
  className?: string;
  onFocus?(): void;
  /** Takes the text, trimmed; returns why it cannot, as a sentence. */
  onCommit(text: string): string | null;
}

/** A line of text, taken on Enter and on leaving, put back by Escape, with suggestions where there are any. */
export function TextInput(props: TextInputProps) {
  const { id, value, suggestions, describedBy } = props;
  const [draft, setDraft] = useState<string | null>(null);
  const [error, setError] = useState<string | null>(null);
  const text = draft ?? value;
  const commit = () => {
    const outcome = text.trim() === value ? null : props.onCommit(text.trim());
    setError(outcome);
    if (outcome === null) setDraft(null);
  };
  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key === 'Enter') commit();
    else if (event.key === 'Escape' && (draft !== null || error !== null)) {
      event.preventDefault();
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
        onFocus={props.onFocus}
        onBlur={() => draft !== null && commit()}
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
