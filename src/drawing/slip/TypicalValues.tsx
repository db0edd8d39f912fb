import { useId, useState } from 'react';
import {
  builtInSpectrum,
  type Edit,
  type Field,
  fieldOf,
  formatQuantity,
  type Study,
  type StudyElement,
  setTypical,
  type Typical,
} from '../../study/index.ts';
import { Formula } from './Formula.tsx';
import { fieldValue } from './SlipScope.ts';
import { shortValue } from './slipFields.ts';
import { chosenOf, type TypicalOffer, typicalOffer } from './typicalOffers.ts';

export interface TypicalValuesProps {
  /** As it stands in the base study: typical data belong to the part, not to a case. */
  element: StudyElement;
  study: Study;
  /** Makes the edit; returns why it cannot. */
  onEdit(edit: Edit): string | null;
}

/** Typical data of a part on request: what they depend on, what they are, where they come from. */
export function TypicalValues({ element, study, onEdit }: TypicalValuesProps) {
  const offer = typicalOffer(element, study);
  if (!offer) return null;
  return (
    <details className="slip-more slip-typical">
      <summary>typical values…</summary>
      <OfferedValues {...{ element, study, offer, onEdit }} />
    </details>
  );
}

function OfferedValues({ element, study, offer, onEdit }: TypicalValuesProps & { offer: TypicalOffer }) {
  const prefix = useId();
  const [chosen, setChosen] = useState<Readonly<Record<string, string>>>({});
  const [refusal, setRefusal] = useState<string | null>(null);
  const choices = offer.choices(chosen);
  const typical = offer.values(chosen);
  return (
    <>
      {choices.map(({ key, label, options }) => (
        <div key={key} className="slip-row">
          <label htmlFor={`${prefix}-${key}`}>{label}</label>
          <div className="slip-value">
            <select
              id={`${prefix}-${key}`}
              value={chosenOf(choices, chosen, key)}
              onChange={(event) => {
                setChosen({ ...chosen, [key]: event.target.value });
                setRefusal(null);
              }}
            >
              {options.map((option) => (
                <option key={option.value} value={option.value}>
                  {option.label}
                </option>
              ))}
            </select>
          </div>
        </div>
      ))}
      {typical.ok ? (
        <>
          <p className="slip-typical-values" role="status">
            <Formula text={valueWords(element, typical)} />
          </p>
          <p className="slip-remark">
            <Formula text={typical.source} />
          </p>
          <button
            type="button"
            className="slip-small"
            onClick={() => setRefusal(onEdit(setTypical(study, element.id, typical)))}
          >
            Use these, marked typical
          </button>
        </>
      ) : (
        <span className="slip-error" role="alert">
          {typical.error}
        </span>
      )}
      {refusal !== null && (
        <span className="slip-error" role="alert">
          {refusal}
        </span>
      )}
    </>
  );
}

/** "impedance voltage u_k 5 %, load loss P_k 7.6 kW", values in the fields' own units. */
function valueWords(element: StudyElement, typical: Extract<Typical<object>, { ok: true }>): string {
  return Object.keys(typical.values)
    .map((key) => {
      const field: Field | undefined = fieldOf(element.kind, key);
      return `${field?.label ?? key} ${shownValue(fieldValue(typical.values, key), field)}`;
    })
    .join(', ');
}

function shownValue(value: unknown, field: Field | undefined): string {
  if (field?.type === 'choice')
    return field.options.find((option) => option.value === value)?.label ?? String(value);
  if (field?.type === 'spectrum') return `“${builtInSpectrum(String(value))?.name ?? value}”`;
  if (typeof value === 'number') return formatQuantity(value, field && 'unit' in field ? field.unit : '');
  return shortValue(value, '');
}
