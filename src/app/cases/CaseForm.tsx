import { useState } from 'react';
import { Button, Dialog, Heading } from 'react-aria-components';
import { refusalOf, SlipField } from '../../drawing/index.ts';
import { useWorkbench } from '../../store/index.ts';
import {
  casesOf,
  defaultOf,
  type Edit,
  type Field,
  fieldsOf,
  nameOf,
  type Study,
  updateCase,
} from '../../study/index.ts';
import { useFocusField } from '../fields/useFocusField.ts';

interface Props {
  study: Study;
  caseId: string;
  onClose(): void;
}

/** Name, role and hours of the case on screen. */
export function CaseForm({ study, caseId, onClose }: Props) {
  const edit = useWorkbench((state) => state.edit);
  const [focused, setFocused] = useState<Field | null>(null);
  useFocusField('case-name');
  const shown = casesOf(study).find(({ id }) => id === caseId);
  if (!shown) return null;
  const written = study.cases?.find(({ id }) => id === caseId);
  const values: Readonly<Record<string, unknown>> = { name: shown.name, ...written };
  const attempt = (next: Edit): string | null => {
    const refusal = refusalOf(study, next, `case ${nameOf(shown)}`);
    if (refusal === null && next.apply(study) !== study) edit(next);
    return refusal;
  };
  return (
    <Dialog className="case-form">
      <Heading slot="title">Case</Heading>
      <div className="slip-body slip-form">
        {fieldsOf('case').map((field) => (
          <SlipField
            key={`${caseId} ${field.key}`}
            id={`case-${field.key}`}
            field={field}
            study={study}
            value={values[field.key]}
            fallback={defaultOf(field, { owner: values })}
            findings={[]}
            onFocus={setFocused}
            onCommit={(value) => attempt(updateCase(study, caseId, { [field.key]: value }))}
            onEdit={attempt}
          />
        ))}
      </div>
      <footer>
        <p className="hint">{focused?.help ?? ''}</p>
        <Button className="plain-button" onPress={onClose}>
          Close
        </Button>
      </footer>
    </Dialog>
  );
}
