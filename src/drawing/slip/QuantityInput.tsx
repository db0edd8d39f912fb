import { type KeyboardEvent, useEffect, useRef, useState } from 'react';
import {
  editText,
  formatNumber,
  type NumberField,
  parseQuantity,
  readQuantity,
  understoodAs,
} from '../../study/index.ts';
import { stepValue } from './stepValue.ts';
import { useDraft } from './useDraft.ts';

/** A quantity a line takes, and who takes its value. */
interface Reading {
  field: NumberField;
  /** Takes the value, or undefined to fall back; returns why it cannot, as a sentence. */
  onCommit(value: number | undefined): string | null;
}

export interface QuantityInputProps extends Reading {
  id: string;
  value: number | undefined;
  /** Shown as placeholder and taken as the start of the arrow keys where the value is absent. */
  fallback?: number | undefined;
  /** Accessible name where no visible label points here. */
  label?: string;
  describedBy?: string;
  /** Another quantity the same line takes, told apart by the unit typed: a peak in kW, or hours in h. */
  alternative?: Reading;
  onFocus?(): void;
}

/** Arrow presses in a row make one edit: it is made when they pause this long. */
const arrowPauseMs = 300;

/**
 * A number with its unit as text: at rest in trade formatting, while edited with every digit; read on Enter and on leaving, put back by Escape, stepped by the arrows.
 * What was understood stands below while it differs from what was typed; an error stays until it is mended.
 */
export function QuantityInput(props: QuantityInputProps) {
  const { id, field, value, fallback, label, describedBy } = props;
  const [draft, draftNow, setDraft] = useDraft();
  const [error, setError] = useState<string | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const standing = value === undefined ? '' : editText(value);
  const [editing, setEditing] = useState(false);
  const atRest = value === undefined ? '' : formatNumber(value, { digits: 6 });
  const text = draft ?? (editing ? standing : atRest);
  const said = draft !== null && error === null ? understoodAs(draft, field.unit) : null;
  const input = useRef<HTMLInputElement>(null);
  useEffect(() => () => clearTimeout(timer.current), []);
  useEffect(() => {
    if (editing) input.current?.select();
  }, [editing]);

  /** Whether the text was taken; one that was not stays, with the reason. */
  const commit = (typed: string): boolean => {
    clearTimeout(timer.current);
    const outcome = typed.trim() === standing ? null : read(typed, props, props.alternative);
    setError(outcome);
    if (outcome === null) setDraft(null);
    return outcome === null;
  };
  const stepBy = (direction: 1 | -1, coarse: boolean) => {
    const typed = parseQuantity(text, field.unit);
    const from = typed.ok ? typed.value : (value ?? fallback ?? 0);
    const next = editText(stepValue(from, direction, field, coarse));
    setDraft(next);
    setError(null);
    clearTimeout(timer.current);
    timer.current = setTimeout(() => commit(next), arrowPauseMs);
  };
  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key === 'Enter') {
      if (!commit(text)) event.preventDefault();
    } else if (event.key === 'ArrowUp' || event.key === 'ArrowDown') {
      event.preventDefault();
      stepBy(event.key === 'ArrowUp' ? 1 : -1, event.shiftKey);
    } else if (event.key === 'Escape' && (draft !== null || error !== null)) {
      clearTimeout(timer.current);
      setDraft(null);
      setError(null);
    }
  };
  const notes = [error !== null ? `${id}-error` : null, said !== null ? `${id}-said` : null, describedBy];
  return (
    <>
      <input
        ref={input}
        id={id}
        className="slip-quantity"
        type="text"
        autoComplete="off"
        spellCheck={false}
        aria-label={label}
        aria-invalid={error !== null}
        aria-describedby={notes.filter(Boolean).join(' ') || undefined}
        placeholder={fallback === undefined ? undefined : formatNumber(fallback)}
        value={text}
        onChange={(event) => {
          setDraft(event.target.value);
          setError(null);
        }}
        onPaste={(event) => {
          // A line of text would run several cells together to one number.
          if (!/[\t\n]/.test(event.clipboardData.getData('text').trim()) || event.defaultPrevented) return;
          event.preventDefault();
          setError('Several values are on the clipboard and this field takes one; a table takes them all.');
        }}
        onFocus={() => {
          setEditing(true);
          props.onFocus?.();
        }}
        onBlur={() => {
          setEditing(false);
          if (draftNow.current !== null) commit(draftNow.current);
        }}
        onKeyDown={onKeyDown}
      />
      {said !== null && (
        <span id={`${id}-said`} className="slip-said" role="status">
          {said}
        </span>
      )}
      {error !== null && (
        <span id={`${id}-error`} className="slip-error" role="alert">
          {error}
        </span>
      )}
    </>
  );
}

function read(typed: string, { field, onCommit }: Reading, alternative?: Reading): string | null {
  const outcome = readQuantity(typed, field);
  if (outcome.ok) return onCommit(outcome.value);
  const isOther = alternative !== undefined && parseQuantity(typed, alternative.field.unit).ok;
  return isOther && !parseQuantity(typed, field.unit).ok ? read(typed, alternative) : outcome.error;
}
