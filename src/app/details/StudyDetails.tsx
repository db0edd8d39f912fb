import { useMemo, useState } from 'react';
import { Button, Dialog, Heading, Modal, ModalOverlay } from 'react-aria-components';
import { limitChoices } from '../../checks/index.ts';
import { refusalOf, SlipField } from '../../drawing/index.ts';
import { useWorkbench } from '../../store/index.ts';
import {
  defaultOf,
  type Edit,
  type Field,
  fieldsOf,
  type Study,
  siteFindings,
  updateGroup,
  updateStudy,
} from '../../study/index.ts';
import { useFocusField } from '../fields/useFocusField.ts';
import { PhaseChoice } from './PhaseChoice.tsx';

const limitUses = ['pcc', 'internal', 'current', 'capacitor'] as const;

/** Limit sets are chosen from those the programme ships. */
function limitField(field: Field): Field {
  const use = limitUses.find((one) => one === field.key);
  if (!use) return field;
  const { key, label, help, required, rare } = field;
  const options = limitChoices(use).map((set) => ({ value: set.id, label: set.label }));
  return { key, label, help, required, rare, type: 'choice', options };
}

const groups = [
  {
    title: 'Title block',
    owner: 'study',
    fields: fieldsOf('study').filter((field) => field.type !== 'opaque' && field.type !== 'group'),
  },
  { title: 'Criteria', owner: 'criteria', fields: fieldsOf('criteria') },
  { title: 'Limits', owner: 'limits', fields: fieldsOf('limits').map(limitField) },
] as const;

type Owner = (typeof groups)[number]['owner'];

function recordOf(study: Study, owner: Owner): Readonly<Record<string, unknown>> {
  const record = owner === 'study' ? study : (study[owner] ?? {});
  return { ...record };
}

function change(study: Study, owner: Owner, key: string, value: unknown): Edit {
  return owner === 'study'
    ? updateStudy(study, { [key]: value })
    : updateGroup(study, owner, { [key]: value });
}

interface Props {
  /** Owner and key of the field to begin with, e.g. "criteria-demandCurrentA"; null for the title. */
  firstField: string | null;
  onClose(): void;
}

/** Title block, criteria and limits of the study. */
export function StudyDetails({ firstField, onClose }: Props) {
  const study = useWorkbench((state) => state.study);
  const edit = useWorkbench((state) => state.edit);
  const [focused, setFocused] = useState<Field | null>(null);
  useFocusField(`details-${firstField ?? 'study-title'}`);
  const findings = useMemo(() => (study ? siteFindings(study) : []), [study]);
  if (!study) return null;
  const attempt = (next: Edit): string | null => {
    const refusal = refusalOf(study, next, 'study');
    if (refusal === null) edit(next);
    return refusal;
  };
  return (
    <ModalOverlay isOpen onOpenChange={onClose} isDismissable className="veil">
      <Modal className="study-details">
        <Dialog>
          <Heading slot="title">Title, criteria and limits</Heading>
          <div className="details-columns">
            {groups.map(({ title, owner, fields }) => (
              <section key={owner} aria-label={title} className="slip-body slip-form">
                <h3>{title}</h3>
                {fields.map((field) => (
                  <SlipField
                    key={field.key}
                    id={`details-${owner}-${field.key}`}
                    field={field}
                    study={study}
                    value={recordOf(study, owner)[field.key]}
                    fallback={defaultOf(field, { owner: recordOf(study, owner) })}
                    findings={findings.filter(
                      ({ path }) => path === `$.${owner === 'study' ? '' : `${owner}.`}${field.key}`,
                    )}
                    onFocus={setFocused}
                    onCommit={(value) => attempt(change(study, owner, field.key, value))}
                    onEdit={attempt}
                  />
                ))}
              </section>
            ))}
            <PhaseChoice study={study} onEdit={edit} />
          </div>
          <footer>
            <p className="hint">{focused ? `${focused.label}: ${focused.help}` : ''}</p>
            <Button onPress={onClose}>Close</Button>
          </footer>
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}
