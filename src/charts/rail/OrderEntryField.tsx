import { type KeyboardEvent, useEffect, useId, useRef, useState } from 'react';
import { readOrderEntry } from './orderEntry.ts';

interface OrderEntryFieldProps {
  initialText: string;
  frequencyHz: number;
  limits: { low: number; high: number };
  onOrder(order: number): void;
  onClose(): void;
}

/** The small entry that opens when a digit is typed on the rail; Enter goes there, Escape closes it. */
export function OrderEntryField(props: OrderEntryFieldProps) {
  const { initialText, frequencyHz, limits, onOrder, onClose } = props;
  const [text, setText] = useState(initialText);
  const [problem, setProblem] = useState<string | null>(null);
  const field = useRef<HTMLInputElement>(null);
  const problemId = useId();
  useEffect(() => {
    const input = field.current;
    input?.focus();
    input?.setSelectionRange(input.value.length, input.value.length);
  }, []);

  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    event.stopPropagation();
    if (event.key === 'Escape') onClose();
    if (event.key !== 'Enter') return;
    event.preventDefault();
    const entry = readOrderEntry(text, frequencyHz, limits);
    if ('problem' in entry) setProblem(entry.problem);
    else {
      onOrder(entry.order);
      onClose();
    }
  };

  return (
    <div className="rail-entry">
      <label>
        order or Hz{' '}
        <input
          ref={field}
          value={text}
          size={9}
          inputMode="decimal"
          autoComplete="off"
          aria-invalid={problem !== null}
          {...(problem ? { 'aria-describedby': problemId } : {})}
          onChange={(event) => {
            setText(event.target.value);
            setProblem(null);
          }}
          onKeyDown={onKeyDown}
          onBlur={onClose}
        />
      </label>
      {problem && (
        <span id={problemId} role="alert" className="rail-entry-problem">
          {problem}
        </span>
      )}
    </div>
  );
}
