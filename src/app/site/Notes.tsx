import { useCallback, useMemo } from 'react';
import { type NoteSubject, NotesColumn } from '../../charts/index.ts';
import type { Verdict } from '../../checks/index.ts';
import { useWorkbench, workbench } from '../../store/index.ts';
import { busName, casesOf, elementName, nameOf, type Pin, type Study, setPins } from '../../study/index.ts';
import { readingOf } from './readingOf.ts';

const noPins: readonly Pin[] = [];
const noVerdicts: readonly Verdict[] = [];

interface Props {
  study: Study;
  letters: ReadonlyMap<string, string>;
  litSubject: NoteSubject | null;
  onSubject(subject: NoteSubject | null, noteKey: string | null): void;
}

/** Goes to what a verdict speaks of: selects the part, moves the rail to its busbar and its order. */
function jumpTo({ subject, order }: Verdict): void {
  const { select, setFocusBus, setOrder } = workbench.getState();
  select([`${subject.kind}:${subject.id}`]);
  if (subject.kind === 'bus') setFocusBus(subject.id);
  if (order !== undefined) setOrder(order);
}

/** The notes column on the present answer. */
export function Notes({ study, letters, litSubject, onSubject }: Props) {
  const answer = useWorkbench((state) => state.answer);
  const stale = useWorkbench((state) => state.answer?.revision !== state.revision);
  const order = useWorkbench((state) => state.view.order);
  const timeTurn = useWorkbench((state) => state.view.timeCursor);
  const setTimeCursor = useWorkbench((state) => state.setTimeCursor);
  const setOrder = useWorkbench((state) => state.setOrder);
  const togglePin = useWorkbench((state) => state.togglePin);
  const edit = useWorkbench((state) => state.edit);
  const pins = study.view?.pins ?? noPins;
  const solution = answer?.solution;
  const readings = useMemo(
    () => (solution ? pins.map((pin) => readingOf(study, solution, pin)) : []),
    [study, solution, pins],
  );
  const subjectName = useCallback(
    (subject: NoteSubject) =>
      subject.kind === 'bus' ? busName(study, subject.id) : elementName(study, subject.id),
    [study],
  );
  const caseName = useCallback(
    (id: string) => {
      const one = casesOf(study).find((candidate) => candidate.id === id);
      return one ? nameOf(one) : id;
    },
    [study],
  );
  return (
    <NotesColumn
      readings={readings}
      verdicts={answer?.verdicts ?? noVerdicts}
      letters={letters}
      nameOf={subjectName}
      caseNameOf={caseName}
      litSubject={litSubject}
      order={order}
      timeTurn={timeTurn}
      stale={stale}
      onOrder={setOrder}
      onTimeTurn={setTimeCursor}
      onSubject={onSubject}
      onJump={jumpTo}
      onUnpin={togglePin}
      onReorder={(next) => edit(setPins(study, next))}
      onCopy={(text) => void navigator.clipboard.writeText(text)}
    />
  );
}
