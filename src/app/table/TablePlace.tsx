import { useState } from 'react';
import { readSubject, variantCase } from '../../drawing/index.ts';
import { useWorkbench, workbench } from '../../store/index.ts';
import { elementById, elementKinds, type Study, type TableOwner, tableRecords } from '../../study/index.ts';
import { TableOf } from './TableOf.tsx';
import './table.css';

/** The table of what is selected; else of the busbars of an empty site, or of the commonest kind. */
function firstOwner(study: Study): TableOwner {
  const selected = readSubject(workbench.getState().view.selection.at(-1) ?? '');
  if (selected?.kind === 'bus' || study.elements.length === 0) return 'bus';
  const element = selected && elementById(study, selected.id);
  const commonest = elementKinds.toSorted(
    (a, b) => tableRecords(study, b).length - tableRecords(study, a).length,
  )[0];
  return element?.kind ?? commonest ?? 'bus';
}

/** Data of the site as a table over the paper: the parts of one kind, or the busbars. */
export function TablePlace({ study }: { study: Study }) {
  const caseId = useWorkbench((state) => state.view.caseId);
  const opened = useWorkbench((state) => state.openedRevision);
  const [owner, setOwner] = useState(() => firstOwner(study));
  const [chosen, setChosen] = useState(false);
  const [caseOnly, setCaseOnly] = useState(false);
  const [more, setMore] = useState(false);
  const variant = variantCase(study, caseId);
  return (
    <TableOf
      key={`${owner} ${opened}`}
      study={study}
      owner={owner}
      variant={variant}
      caseOnly={caseOnly && variant !== undefined}
      more={more}
      byChooser={chosen}
      onOwner={(next) => {
        setOwner(next);
        setChosen(true);
      }}
      onCaseOnly={setCaseOnly}
      onMore={setMore}
    />
  );
}
