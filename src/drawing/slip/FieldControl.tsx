import {
  type BankStep,
  type Bus,
  type Edit,
  type Field,
  type HarmonicRow,
  inPhaseNames,
  isHarmonicRows,
  nameOf,
  type Study,
} from '../../study/index.ts';
import { PairInput } from './PairInput.tsx';
import { QuantityInput } from './QuantityInput.tsx';
import { RowsTable } from './RowsTable.tsx';
import { storedValue } from './SlipScope.ts';
import { SpectrumInput } from './SpectrumInput.tsx';
import { StepsInput } from './StepsInput.tsx';
import { TextInput } from './TextInput.tsx';

export interface FieldControlProps {
  id: string;
  field: Field;
  study: Study;
  value: unknown;
  fallback: unknown;
  onFocus(): void;
  /** Takes the new value, undefined to fall back; returns why it cannot. */
  onCommit(value: unknown): string | null;
  setReference?: ((study: Study, spectrumId: string) => Edit) | undefined;
  onEdit(edit: Edit): string | null;
}

/** The control that fits a field of the catalogue. */
export function FieldControl(props: FieldControlProps) {
  const { id, field, study, value, fallback, onFocus, onCommit } = props;
  const describedBy = `${id}-help`;
  switch (field.type) {
    case 'number':
    case 'integer':
      return (
        <QuantityInput
          id={id}
          field={field}
          value={asNumber(value)}
          fallback={asNumber(fallback)}
          describedBy={describedBy}
          onFocus={onFocus}
          onCommit={onCommit}
        />
      );
    case 'text':
    case 'vectorGroup':
      return (
        <TextInput
          id={id}
          value={typeof value === 'string' ? value : ''}
          describedBy={describedBy}
          suggestions={field.suggestions}
          onFocus={onFocus}
          onCommit={(text) => onCommit(text === '' && !field.required ? undefined : text)}
        />
      );
    case 'boolean':
      return (
        <input
          id={id}
          type="checkbox"
          aria-describedby={describedBy}
          checked={(value ?? fallback) === true}
          onFocus={onFocus}
          onChange={(event) => onCommit(storedValue(event.target.checked, fallback))}
        />
      );
    case 'choice':
      return <ChoiceSelect {...props} />;
    case 'busRef':
      return (
        <BusSelect
          id={id}
          buses={study.buses}
          value={String(value ?? '')}
          describedBy={describedBy}
          onFocus={onFocus}
          onCommit={onCommit}
        />
      );
    case 'skin':
    case 'tolerance':
      return (
        <PairInput
          id={id}
          field={field}
          value={asPair(value)}
          fallback={asPair(fallback)}
          describedBy={describedBy}
          onFocus={onFocus}
          onCommit={onCommit}
        />
      );
    case 'steps':
      return (
        <StepsInput
          id={id}
          steps={Array.isArray(value) ? (value as BankStep[]) : []}
          describedBy={describedBy}
          onFocus={onFocus}
          onCommit={onCommit}
        />
      );
    case 'rows':
      return (
        <RowsTable
          id={id}
          caption={field.label}
          rows={isHarmonicRows(value) ? value : []}
          onFocus={onFocus}
          onCommit={(rows) => onCommit(rows.length === 0 ? undefined : rows)}
        />
      );
    case 'spectrum':
      return (
        <SpectrumInput
          {...props}
          value={typeof value === 'string' ? value : (value as HarmonicRow[])}
          describedBy={describedBy}
        />
      );
    case 'group':
    case 'opaque':
      return null;
  }
}

function asNumber(value: unknown): number | undefined {
  return typeof value === 'number' ? value : undefined;
}

function asPair(value: unknown): [number, number] | undefined {
  return Array.isArray(value) && value.length === 2 ? [Number(value[0]), Number(value[1])] : undefined;
}

function ChoiceSelect({ id, field, study, value, fallback, onFocus, onCommit }: FieldControlProps) {
  if (field.type !== 'choice') return null;
  const standing = value ?? fallback;
  return (
    <select
      id={id}
      aria-describedby={`${id}-help`}
      value={standing === undefined ? '' : String(standing)}
      onFocus={onFocus}
      onChange={(event) => {
        const chosen = field.options.find((option) => String(option.value) === event.target.value)?.value;
        onCommit(field.required ? chosen : storedValue(chosen, fallback));
      }}
    >
      {standing === undefined && <option value="">not stated</option>}
      {field.options.map((option) => (
        <option key={option.value} value={String(option.value)}>
          {inPhaseNames(study, option.label)}
        </option>
      ))}
    </select>
  );
}

interface BusSelectProps {
  id: string;
  buses: readonly Bus[];
  value: string;
  describedBy: string;
  onFocus(): void;
  onCommit(value: string): string | null;
}

function BusSelect({ id, buses, value, describedBy, onFocus, onCommit }: BusSelectProps) {
  return (
    <select
      id={id}
      aria-describedby={describedBy}
      value={value}
      onFocus={onFocus}
      onChange={(event) => onCommit(event.target.value)}
    >
      {buses.map((bus) => (
        <option key={bus.id} value={bus.id}>
          {nameOf(bus)}
        </option>
      ))}
    </select>
  );
}
