import { type ReactNode, useId, useState } from 'react';
import {
  addPin,
  type Bus,
  busById,
  busesOf,
  busName,
  confirmTypical,
  type DataOrigin,
  duplicateParts,
  type Edit,
  elementById,
  type Field,
  type Finding,
  fieldsOf,
  fullNameOf,
  homeBusOf,
  isOn,
  kindWords,
  nameOf,
  originOf,
  type Patch,
  type Pin,
  removePin,
  resetInCase,
  type Study,
  type StudyCase,
  type StudyElement,
  sameData,
  setField,
  setOrigin,
  takesOrigin,
  updateElement,
} from '../../study/index.ts';
import { partSubject } from '../subject.ts';
import { FindingLine } from './FieldRow.tsx';
import { MoreData } from './MoreData.tsx';
import { OriginTally } from './OriginTally.tsx';
import { SlipField } from './SlipField.tsx';
import { SlipFrame } from './SlipFrame.tsx';
import {
  caseTail,
  fallbackOf,
  fieldValue,
  findingsAt,
  hasChanges,
  refusalOf,
  shownElement,
  variantCase,
} from './SlipScope.ts';
import { shortValue, slipSections } from './slipFields.ts';
import { TextInput } from './TextInput.tsx';
import { TypicalValues } from './TypicalValues.tsx';
import { typicalHints } from './typicalOffers.ts';

export interface PartSlipProps {
  element: StudyElement;
  /** The part's busbar, or the lower one of a series part; found in the study when absent. */
  bus?: Bus | undefined;
  /** The base study, not the study in the case. */
  study: Study;
  caseId: string;
  /** Of this study: of reading it, and of the site. */
  findings: readonly Finding[];
  onEdit(edit: Edit): void;
  /** Takes the part away. */
  onRemove(): void;
  onClose(): void;
}

/** The data slip of a part: a nameplate that can be written on, for the base study or for the open case alone. */
export function PartSlip(props: PartSlipProps) {
  // Another part or case is another slip: nothing half-typed is carried over.
  return <Nameplate key={`${props.element.id} ${props.caseId}`} {...props} />;
}

function Nameplate({
  element: { id },
  bus,
  study,
  caseId,
  findings,
  onEdit,
  onRemove,
  onClose,
}: PartSlipProps) {
  const prefix = useId();
  const variant = variantCase(study, caseId);
  const [caseOnly, setCaseOnly] = useState(variant !== undefined && hasChanges(variant, id));
  const [focused, setFocused] = useState<Field | null>(null);
  const writeCase = caseOnly ? variant : undefined;
  const base = elementById(study, id);
  const element = shownElement(study, id, writeCase?.id);
  if (!base || !element) return null;

  const index = study.elements.indexOf(base);
  const path = `$.elements[${index}]`;
  const nominalV = (bus && bus.id === homeBusOf(element) ? bus : busById(study, homeBusOf(element)))
    ?.nominalV;
  const attempt = (edit: Edit): string | null => {
    const refusal = refusalOf(study, edit, `${kindWords[base.kind]} ${nameOf(base)}`);
    if (refusal === null && edit.apply(study) !== study) onEdit(edit);
    return refusal;
  };
  const editOf = (current: Study, patch: Patch) =>
    updateElement(current, id, patch, writeCase ? { caseId: writeCase.id } : {});
  const commit = (key: string, value: unknown): string | null =>
    attempt(setField(study, id, key, value, writeCase ? { caseId: writeCase.id } : {}));
  const { essential, more, groups } = slipSections(fieldsOf(base.kind));
  const typical = typicalHints(element, study);
  const row = (field: Field, groupKey?: string): ReactNode => {
    const owner = groupKey === undefined ? element : (fieldValue(element, groupKey) ?? {});
    const originKey = groupKey === undefined ? field.key : groupKey;
    return (
      <SlipField
        key={`${id} ${field.key} ${writeCase?.id ?? ''}`}
        id={`${prefix}-${groupKey ?? ''}${field.key}`}
        field={field}
        study={study}
        value={fieldValue(owner as object, field.key)}
        fallback={fallbackOf(field, element, nominalV)}
        findings={findingsAt(findings, path, originKey)}
        origin={originOf(study, base, originKey)}
        onOrigin={
          takesOrigin(field) && groupKey === undefined
            ? (origin: DataOrigin | null) => onEdit(setOrigin(study, base, field.key, origin))
            : undefined
        }
        remark={
          variant &&
          groupKey === undefined && (
            <CaseRemark {...{ study, variant, base, field, writing: writeCase !== undefined, onEdit }} />
          )
        }
        typical={groupKey === undefined ? typical.get(field.key) : undefined}
        onFocus={setFocused}
        onCommit={(value) =>
          commit(originKey, groupKey === undefined ? value : groupWith(owner as object, field.key, value))
        }
        setReference={(current, spectrumId) => editOf(current, { spectrum: spectrumId })}
        onEdit={attempt}
      />
    );
  };
  return (
    <SlipFrame
      label={`Data of ${fullNameOf(base)}`}
      kind={kindWords[base.kind]}
      place={busesOf(element)
        .map((end) => busName(study, end))
        .join(' → ')}
      subject={partSubject(id)}
      focused={focused}
      onClose={onClose}
      head={
        <>
          <label className="slip-check slip-service">
            <input
              type="checkbox"
              checked={isOn(element)}
              onChange={(event) => commit('on', event.target.checked ? undefined : false)}
            />
            in service
          </label>
          <TextInput
            id={`${prefix}-name`}
            className="slip-name"
            label="Name"
            value={base.name ?? ''}
            placeholder={id}
            onCommit={(text) => attempt(updateElement(study, id, { name: text || undefined }))}
          />
          {variant && (
            <label className="slip-check slip-case">
              <input
                type="checkbox"
                checked={caseOnly}
                onChange={(event) => setCaseOnly(event.target.checked)}
              />
              change {caseTail(variant)} only
            </label>
          )}
        </>
      }
      foot={<PartActions {...{ study, base, onEdit, onRemove, onClose }} />}
    >
      {findingsAt(findings, path, null).map((finding) => (
        <FindingLine key={finding.code} finding={finding} />
      ))}
      <div className="slip-essentials">{essential.map((field) => row(field))}</div>
      <OriginTally study={study} owner={base} onConfirm={() => onEdit(confirmTypical(study, [id]))} />
      {!writeCase && <TypicalValues element={base} study={study} onEdit={attempt} />}
      <MoreData kind={base.kind}>
        {more.map((field) => row(field))}
        {groups.map((group) => (
          <fieldset key={group.key} className="slip-group">
            <legend title={group.help}>{group.label}</legend>
            {group.fields.map((field) => row(field, group.key))}
          </fieldset>
        ))}
      </MoreData>
    </SlipFrame>
  );
}

/** A small record with one field changed; an empty one disappears. */
function groupWith(owner: object, key: string, value: unknown): object | undefined {
  const entries = Object.entries(owner).filter(([name]) => name !== key);
  if (value !== undefined) entries.push([key, value]);
  return entries.length === 0 ? undefined : Object.fromEntries(entries);
}

interface CaseRemarkProps {
  study: Study;
  variant: StudyCase;
  base: StudyElement;
  field: Field;
  writing: boolean;
  onEdit(edit: Edit): void;
}

/** What the other side says where a case differs: the base value with a way back to it, or the case's value. */
function CaseRemark({ study, variant, base, field, writing, onEdit }: CaseRemarkProps): ReactNode {
  const inCase = shownElement(study, base.id, variant.id);
  const own = fieldValue(base, field.key);
  const other = inCase && fieldValue(inCase, field.key);
  if (sameData(own ?? null, other ?? null)) return null;
  const unit = 'unit' in field ? field.unit : '';
  if (!writing) return `${nameOf(variant)}: ${shortValue(other, unit)}`;
  return (
    <>
      base: {shortValue(own, unit)}{' '}
      <button
        type="button"
        className="slip-small"
        onClick={() => onEdit(resetInCase(study, variant.id, base.id, field.key))}
      >
        back to base
      </button>
    </>
  );
}

interface PartActionsProps {
  study: Study;
  base: StudyElement;
  onEdit(edit: Edit): void;
  onRemove(): void;
  onClose(): void;
}

function PartActions({ study, base, onEdit, onRemove, onClose }: PartActionsProps) {
  const buses = busesOf(base);
  return (
    <>
      {buses.map((bus) => {
        const pin: Pin = { quantity: 'current', element: base.id, bus };
        const pinned = study.view?.pins?.some((other) => sameData(other, pin)) ?? false;
        const where = buses.length > 1 ? ` at ${busName(study, bus)}` : '';
        return (
          <button
            key={bus}
            type="button"
            className="slip-small"
            aria-pressed={pinned}
            onClick={() => onEdit(pinned ? removePin(study, pin) : addPin(study, pin))}
          >
            {pinned ? 'Unpin' : 'Pin'} current{where}
          </button>
        );
      })}
      <button type="button" className="slip-small" onClick={() => onEdit(duplicateParts(study, [base.id]))}>
        Duplicate
      </button>
      <button
        type="button"
        className="slip-small"
        onClick={() => {
          onClose();
          onRemove();
        }}
      >
        Remove
      </button>
    </>
  );
}
