import { useCallback, useMemo, useState } from 'react';
import { type NoteSubject, NotesColumn, NotesLetters } from '../../charts/index.ts';
import type { Verdict } from '../../checks/index.ts';
import { freshWorst, useWorkbench, workbench } from '../../store/index.ts';
import { busName, casesOf, elementName, nameOf, type Pin, type Study, setPins } from '../../study/index.ts';
import { copyText, handOn } from '../copy/handOn.ts';
import { readingPicture } from '../copy/readingPicture.tsx';
import { setPanels } from '../panels/panelStore.ts';
import { readingOf } from './readingOf.ts';
import { useListedVerdicts } from './useListedVerdicts.ts';
import { worstCases, worstSearched } from './worstCases.ts';

const noPins: readonly Pin[] = [];

interface Props {
  study: Study;
  letters: ReadonlyMap<string, string>;
  litSubject: NoteSubject | null;
  folded: boolean;
  onSubject(subject: NoteSubject | null, noteKey: string | null): void;
}

/** A note of another case brings its case on screen. */
function showCaseOf({ caseId }: Verdict): void {
  const { view, setCase } = workbench.getState();
  if (view.caseId !== caseId) setCase(caseId);
}

/** Goes to what a verdict speaks of: its case, the part selected, the rail at its busbar and its order. */
function jumpTo(verdict: Verdict): void {
  const { subject, order } = verdict;
  const { select, setFocusBus, setOrder } = workbench.getState();
  showCaseOf(verdict);
  select([`${subject.kind}:${subject.id}`]);
  if (subject.kind === 'bus') setFocusBus(subject.id);
  if (order !== undefined) setOrder(order);
}

function copy(text: string): void {
  void copyText(text, text.split('\n')[0] ?? 'the note');
}

/** The notes column on the present answer, or its letters where it is folded. */
export function Notes({ study, letters, litSubject, folded, onSubject }: Props) {
  const answer = useWorkbench((state) => state.answer);
  const allVerdicts = useWorkbench((state) => state.allVerdicts);
  const revision = useWorkbench((state) => state.revision);
  const caseId = useWorkbench((state) => state.view.caseId);
  const stale = useWorkbench((state) => state.answer?.revision !== state.revision);
  const order = useWorkbench((state) => state.view.order);
  const timeTurn = useWorkbench((state) => state.view.timeCursor);
  const { setTimeCursor, setOrder, togglePin, edit } = workbench.getState();
  const [firstNote, setFirstNote] = useState<string | null>(null);
  const pins = study.view?.pins ?? noPins;
  const { verdicts, everyCase } = useListedVerdicts();
  const solution = answer?.solution;
  const readings = useMemo(
    () => (solution ? pins.map((pin) => readingOf(study, solution, pin)) : []),
    [study, solution, pins],
  );
  const searched = useWorkbench(freshWorst);
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
  const worst = useMemo(
    () => (searched ? worstSearched(searched, caseId) : worstCases(allVerdicts, revision, caseId, caseName)),
    [searched, allVerdicts, revision, caseId, caseName],
  );
  const shared = { readings, verdicts, letters, nameOf: subjectName, stale, onSubject };
  if (folded) {
    const open = (note: string | null) => {
      setFirstNote(note);
      setPanels({ notes: 'open' });
    };
    return <NotesLetters {...shared} onOpen={open} />;
  }
  return (
    <NotesColumn
      {...shared}
      caseNameOf={caseName}
      everyCase={everyCase}
      onOpen={showCaseOf}
      onThisCase={() => workbench.getState().setVerdictScope('case')}
      worstOf={(verdict) => worst.get(verdict.key)}
      litSubject={litSubject}
      judging={answer !== null && answer.verdictsRevision === null}
      firstNote={firstNote}
      order={order}
      timeTurn={timeTurn}
      onOrder={setOrder}
      onTimeTurn={setTimeCursor}
      onJump={jumpTo}
      onUnpin={togglePin}
      onReorder={(next) => edit(setPins(study, next))}
      onCopy={copy}
      onPicture={(reading, picture, way) => {
        const handed = readingPicture(study, reading, picture, order);
        if (handed) void handOn(handed, way);
      }}
      onFold={() => {
        setFirstNote(null);
        setPanels({ notes: 'letters' });
      }}
    />
  );
}
