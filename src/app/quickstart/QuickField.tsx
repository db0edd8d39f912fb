import { type ReactNode, useId } from 'react';
import { QuantityInput } from '../../drawing/index.ts';
import type { AnswerIssue, ChoiceField, NumberField } from '../../study/index.ts';

interface RowProps {
  id: string;
  field: NumberField | ChoiceField;
  unit?: string;
  issues: readonly AnswerIssue[];
  /** What stands in for an empty field, where it is no number. */
  remark?: string | undefined;
  children: ReactNode;
}

function QuickRow({ id, field, unit = '', issues, remark, children }: RowProps) {
  return (
    <div className="quick-field" data-answer={field.key}>
      <label htmlFor={id} title={field.help}>
        {field.label}
      </label>
      <div className="quick-value">
        {children}
        {unit !== '' && <span className="unit">{unit}</span>}
      </div>
      <span id={`${id}-help`} className="visually-hidden">
        {field.help}
      </span>
      {remark && <span className="quick-remark">{remark}</span>}
      {issues.map(({ severity, message }) => (
        <span key={message} className="quick-issue" data-severity={severity} role="alert">
          {`${message.charAt(0).toUpperCase()}${message.slice(1)}.`}
        </span>
      ))}
    </div>
  );
}

interface QuantityProps {
  field: NumberField;
  value: number | undefined;
  fallback?: number | undefined;
  issues: readonly AnswerIssue[];
  remark?: string | undefined;
  alternative?: { field: NumberField; onCommit(value: number | undefined): string | null };
  onCommit(value: number | undefined): string | null;
}

/** A quantity of the quick start; what is left empty is taken as the number shown in its place. */
export function QuickQuantity({
  field,
  value,
  fallback,
  issues,
  remark,
  alternative,
  onCommit,
}: QuantityProps) {
  const id = useId();
  const rounded = fallback === undefined ? undefined : Number(fallback.toPrecision(4));
  return (
    <QuickRow id={id} field={field} unit={field.unit} issues={issues} remark={remark}>
      <QuantityInput
        id={id}
        field={field}
        value={value}
        fallback={rounded}
        describedBy={`${id}-help`}
        {...(alternative ? { alternative } : {})}
        onCommit={onCommit}
      />
    </QuickRow>
  );
}

interface ChoiceProps {
  field: ChoiceField;
  value: string | undefined;
  onChange(value: string): void;
}

export function QuickChoice({ field, value, onChange }: ChoiceProps) {
  const id = useId();
  return (
    <QuickRow id={id} field={field} issues={[]}>
      <select
        id={id}
        aria-describedby={`${id}-help`}
        value={String(value ?? field.default ?? '')}
        onChange={(event) => onChange(event.target.value)}
      >
        {field.options.map((option) => (
          <option key={option.value} value={String(option.value)}>
            {option.label}
          </option>
        ))}
      </select>
    </QuickRow>
  );
}
