import { type ReactNode, useState } from 'react';
import {
  type DataOrigin,
  type Edit,
  type Field,
  type Finding,
  hintOf,
  type Study,
} from '../../study/index.ts';
import { FieldControl } from './FieldControl.tsx';
import { FieldRow } from './FieldRow.tsx';

export interface SlipFieldProps {
  id: string;
  field: Field;
  study: Study;
  value: unknown;
  fallback: unknown;
  findings: readonly Finding[];
  origin?: DataOrigin | undefined;
  onOrigin?: ((origin: DataOrigin | null) => void) | undefined;
  remark?: ReactNode;
  /** What is typical for this very part, where a table knows it. */
  typical?: string | undefined;
  onFocus(field: Field): void;
  onCommit(value: unknown): string | null;
  setReference?: ((study: Study, spectrumId: string) => Edit) | undefined;
  onEdit(edit: Edit): string | null;
}

const wideTypes: ReadonlySet<Field['type']> = new Set(['steps', 'rows', 'spectrum']);

/** Controls that act at once have no place for an error of their own; it stands in their row. */
const instantTypes: ReadonlySet<Field['type']> = new Set([
  'boolean',
  'choice',
  'busRef',
  'steps',
  'spectrum',
]);

/** One field of a part or busbar: its row and its control, and why a choice was refused. */
export function SlipField(props: SlipFieldProps) {
  const { id, field, findings, origin, onOrigin, remark } = props;
  const [refusal, setRefusal] = useState<string | null>(null);
  const instant = instantTypes.has(field.type);
  const noted = (outcome: string | null) => {
    if (instant) setRefusal(outcome);
    return outcome;
  };
  return (
    <FieldRow
      id={id}
      field={field}
      unit={'unit' in field ? field.unit : ''}
      hint={hintOf(field, props.typical)}
      wide={wideTypes.has(field.type)}
      findings={findings}
      origin={origin}
      onOrigin={onOrigin}
      onFocusOrigin={() => props.onFocus(field)}
      remark={remark}
    >
      <FieldControl
        id={id}
        field={field}
        study={props.study}
        value={props.value}
        fallback={props.fallback}
        onFocus={() => props.onFocus(field)}
        onCommit={(value) => noted(props.onCommit(value))}
        setReference={props.setReference}
        onEdit={(edit) => noted(props.onEdit(edit))}
      />
      {refusal !== null && (
        <span className="slip-error" role="alert">
          {refusal}
        </span>
      )}
    </FieldRow>
  );
}
