import type { NumberField, PairField } from '../../study/index.ts';
import { QuantityInput } from './QuantityInput.tsx';

export interface PairInputProps {
  id: string;
  field: PairField;
  value: readonly [number, number] | undefined;
  fallback: readonly [number, number] | undefined;
  describedBy: string;
  onFocus(): void;
  onCommit(value: [number, number] | undefined): string | null;
}

interface Half {
  name: string;
  sign: string;
  field: NumberField;
}

function half(name: string, sign: string, unit: NumberField['unit'], range: Partial<NumberField>): Half {
  const field: NumberField = {
    key: name,
    label: name,
    help: '',
    required: false,
    rare: false,
    type: 'number',
    unit,
    ...range,
  };
  return { name, sign, field };
}

const halves: Readonly<Record<PairField['type'], readonly [Half, Half]>> = {
  skin: [half('s', 's', '', { min: 0, max: 1 }), half('e', 'e', '', { min: 0, max: 5 })],
  tolerance: [
    half('minus', 'from', '%', { min: -100, minExclusive: true, max: 100 }),
    half('plus', 'to', '%', { min: -100, minExclusive: true, max: 1000 }),
  ],
};

/** Two numbers that belong together: s and e of the skin-effect law, or a minus and plus tolerance. */
export function PairInput({ id, field, value, fallback, describedBy, onFocus, onCommit }: PairInputProps) {
  const standing = value ?? fallback;
  return (
    <fieldset className="slip-pair" aria-label={field.label}>
      {halves[field.type].map(({ name, sign, field: part }, index) => (
        <span key={name} className="slip-pair-half">
          <span className="slip-unit">{sign}</span>
          <QuantityInput
            id={index === 0 ? id : `${id}-${name}`}
            field={part}
            label={`${field.label}: ${name}`}
            value={value?.[index]}
            fallback={fallback?.[index]}
            describedBy={describedBy}
            onFocus={onFocus}
            onCommit={(typed) => {
              if (typed === undefined && (value === undefined || fallback === undefined))
                return onCommit(undefined);
              const filled = typed ?? fallback?.[index] ?? 0;
              const other = standing?.[1 - index] ?? filled;
              return onCommit(index === 0 ? [filled, other] : [other, filled]);
            }}
          />
        </span>
      ))}
    </fieldset>
  );
}
