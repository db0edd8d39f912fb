import { type ReactNode, useId, useState } from 'react';
import {
  addPin,
  type Bus,
  busById,
  type DataOrigin,
  type Edit,
  type Field,
  type Finding,
  fieldsOf,
  nameOf,
  originOf,
  type Pin,
  removePin,
  type Study,
  sameData,
  setOrigin,
  takesOrigin,
  updateBus,
} from '../../study/index.ts';
import { busSubject } from '../subject.ts';
import { FindingLine } from './FieldRow.tsx';
import { MoreData } from './MoreData.tsx';
import { OriginTally } from './OriginTally.tsx';
import { SlipField } from './SlipField.tsx';
import { SlipFrame } from './SlipFrame.tsx';
import { fallbackOf, fieldValue, findingsAt, refusalOf } from './SlipScope.ts';
import { slipSections } from './slipFields.ts';
import { TextInput } from './TextInput.tsx';

export interface BusSlipProps {
  bus: Bus;
  study: Study;
  /** Busbars are the same in every case; taken so that both slips are opened alike. */
  caseId?: string;
  findings: readonly Finding[];
  onEdit(edit: Edit): void;
  /** Takes the busbar away with its parts. */
  onRemove(): void;
  onClose(): void;
}

/** The data slip of a busbar. */
export function BusSlip(props: BusSlipProps) {
  return <Nameplate key={props.bus.id} {...props} />;
}

function Nameplate({ bus: { id }, study, findings, onEdit, onRemove, onClose }: BusSlipProps) {
  const prefix = useId();
  const [focused, setFocused] = useState<Field | null>(null);
  const bus = busById(study, id);
  if (!bus) return null;
  const path = `$.buses[${study.buses.indexOf(bus)}]`;
  const attempt = (edit: Edit): string | null => {
    const refusal = refusalOf(study, edit, `busbar ${nameOf(bus)}`);
    if (refusal === null && edit.apply(study) !== study) onEdit(edit);
    return refusal;
  };
  const pin: Pin = { quantity: 'voltage', bus: id };
  const pinned = study.view?.pins?.some((other) => sameData(other, pin)) ?? false;
  const { essential, more } = slipSections(fieldsOf('bus'));
  const row = (field: Field): ReactNode => (
    <SlipField
      key={`${id} ${field.key}`}
      id={`${prefix}-${field.key}`}
      field={field}
      study={study}
      value={fieldValue(bus, field.key)}
      fallback={fallbackOf(field, bus, bus.nominalV)}
      findings={findingsAt(findings, path, field.key)}
      origin={originOf(study, bus, field.key)}
      onOrigin={
        takesOrigin(field)
          ? (origin: DataOrigin | null) => onEdit(setOrigin(study, bus, field.key, origin))
          : undefined
      }
      onFocus={setFocused}
      onCommit={(value) => attempt(updateBus(study, id, { [field.key]: value }))}
      onEdit={attempt}
    />
  );
  return (
    <SlipFrame
      label={`Data of busbar ${nameOf(bus)}`}
      kind="busbar"
      subject={busSubject(id)}
      focused={focused}
      onClose={onClose}
      head={
        <TextInput
          id={`${prefix}-name`}
          className="slip-name"
          label="Name"
          value={bus.name ?? ''}
          placeholder={id}
          onCommit={(text) => attempt(updateBus(study, id, { name: text || undefined }))}
        />
      }
      foot={
        <>
          <button
            type="button"
            className="slip-small"
            aria-pressed={pinned}
            onClick={() => onEdit(pinned ? removePin(study, pin) : addPin(study, pin))}
          >
            {pinned ? 'Unpin' : 'Pin'} voltage
          </button>
          <button
            type="button"
            className="slip-small"
            onClick={() => {
              onClose();
              onRemove();
            }}
          >
            Remove with its parts
          </button>
        </>
      }
    >
      {findingsAt(findings, path, null).map((finding) => (
        <FindingLine key={finding.code} finding={finding} />
      ))}
      <div className="slip-essentials">{essential.map(row)}</div>
      <OriginTally study={study} owner={bus} />
      <MoreData kind="bus">{more.map(row)}</MoreData>
    </SlipFrame>
  );
}
