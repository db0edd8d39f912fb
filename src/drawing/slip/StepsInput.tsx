import {
  type BankStep,
  fieldsOf,
  formatQuantity,
  type NumberField,
  parseSteps,
  stepsFromLines,
  stepsText,
} from '../../study/index.ts';
import { QuantityInput } from './QuantityInput.tsx';
import { TextInput } from './TextInput.tsx';

export interface StepsInputProps {
  id: string;
  steps: readonly BankStep[];
  describedBy: string;
  onFocus(): void;
  onCommit(steps: BankStep[]): string | null;
}

const kvarField = fieldsOf('step').find(
  (field): field is NumberField => field.key === 'kvar' && field.type === 'number',
);

/** A bank's steps: all at once as "6x25", or one by one with its kvar and whether it is switched in. */
export function StepsInput({ id, steps, describedBy, onFocus, onCommit }: StepsInputProps) {
  const on = steps.reduce((sum, step) => sum + (step.on === false ? 0 : step.kvar), 0);
  const all = steps.reduce((sum, step) => sum + step.kvar, 0);
  const replace = (index: number, step: BankStep | null) =>
    onCommit(step === null ? steps.toSpliced(index, 1) : steps.with(index, step));
  return (
    <div className="slip-steps">
      <TextInput
        id={id}
        value={stepsText(steps)}
        placeholder="6x25"
        describedBy={describedBy}
        onFocus={onFocus}
        ofPasted={stepsFromLines}
        onCommit={(text) => {
          const parsed = parseSteps(text);
          return parsed.ok ? onCommit(parsed.steps) : parsed.error;
        }}
      />
      <p className="slip-summary">
        {formatQuantity(on, 'kvar')} of {formatQuantity(all, 'kvar')} switched in
      </p>
      <ol className="slip-step-list">
        {keyed(steps).map(({ step, index, key }) => (
          <li key={key}>
            <input
              type="checkbox"
              checked={step.on !== false}
              aria-label={`Step ${index + 1} switched in`}
              onChange={(event) => {
                const { on: _on, ...rest } = step;
                replace(index, event.target.checked ? rest : { ...rest, on: false });
              }}
            />
            {kvarField && (
              <QuantityInput
                id={`${id}-${index}`}
                field={kvarField}
                label={`Step ${index + 1}, rated kvar`}
                value={step.kvar}
                onFocus={onFocus}
                onCommit={(kvar) => replace(index, kvar === undefined ? null : { ...step, kvar })}
              />
            )}
            <button
              type="button"
              className="slip-small"
              aria-label={`Remove step ${index + 1}`}
              onClick={() => replace(index, null)}
            >
              ×
            </button>
          </li>
        ))}
      </ol>
      <button
        type="button"
        className="slip-small"
        onClick={() => onCommit([...steps, { kvar: steps.at(-1)?.kvar ?? 25 }])}
      >
        Add a step
      </button>
    </div>
  );
}

/** A step has no identity but its place in the bank. */
function keyed(steps: readonly BankStep[]) {
  return steps.map((step, index) => ({ step, index, key: `step ${index}` }));
}
