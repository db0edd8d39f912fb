import { useMemo } from 'react';
import { BusSlip, PartSlip, readSubject, type Subject } from '../../drawing/index.ts';
import { useWorkbench, workbench } from '../../store/index.ts';
import { busById, elementById, type Study, siteFindings } from '../../study/index.ts';
import { removeChosen } from './removal.ts';

interface Props {
  study: Study;
  subject: Subject;
}

/** The data slip of the part or busbar that is open. */
export function SlipConnection({ study, subject }: Props) {
  const caseId = useWorkbench((state) => state.view.caseId);
  const findings = useMemo(
    () =>
      siteFindings(study).filter(
        ({ severity, cases }) => severity !== 'note' && (cases.length === 0 || cases.includes(caseId)),
      ),
    [study, caseId],
  );
  const read = readSubject(subject);
  const { edit, closeSlip } = workbench.getState();
  if (read?.kind === 'bus') {
    const bus = busById(study, read.id);
    return bus ? (
      <BusSlip
        bus={bus}
        study={study}
        caseId={caseId}
        findings={findings}
        onEdit={edit}
        onRemove={() => removeChosen({ parts: [], buses: [bus.id] })}
        onClose={closeSlip}
      />
    ) : null;
  }
  const element = read && elementById(study, read.id);
  return element ? (
    <PartSlip
      element={element}
      study={study}
      caseId={caseId}
      findings={findings}
      onEdit={edit}
      onRemove={() => removeChosen({ parts: [element.id], buses: [] })}
      onClose={closeSlip}
    />
  ) : null;
}
