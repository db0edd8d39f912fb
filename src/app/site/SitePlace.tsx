import { useCallback, useState } from 'react';
import type { NoteSubject } from '../../charts/index.ts';
import { readSubject, type Subject, Tray, type TrayKind } from '../../drawing/index.ts';
import { useWorkbench } from '../../store/index.ts';
import { Assumptions } from '../quickstart/Assumptions.tsx';
import { Leader } from './Leader.tsx';
import { Notes } from './Notes.tsx';
import { Paper } from './Paper.tsx';
import { useLetters } from './useLetters.ts';
import './site.css';

const none: never[] = [];

interface Spoken {
  subject: Subject;
  note: string | null;
}

/** Draw, watch, judge: tray, drawing and notes column. */
export function SitePlace({ onDetails }: { onDetails(field: string | null): void }) {
  const study = useWorkbench((state) => state.study);
  const verdicts = useWorkbench((state) => state.answer?.verdicts ?? none);
  const selection = useWorkbench((state) => state.view.selection);
  const letters = useLetters(study?.view?.pins ?? none, verdicts);
  const [armedKind, setArmedKind] = useState<TrayKind | null>(null);
  const [spoken, setSpoken] = useState<Spoken | null>(null);
  const [hovered, setHovered] = useState<Subject | null>(null);
  const onSubject = useCallback((subject: NoteSubject | null, note: string | null) => {
    setSpoken(subject ? { subject: `${subject.kind}:${subject.id}`, note } : null);
  }, []);
  // Two cases side by side lie over the paper, which keeps its place meanwhile.
  const comparing = useWorkbench((state) => state.view.compared !== null);
  if (!study) return null;
  const litNotes = hovered ?? selection.at(-1);
  return (
    <div className="site" inert={comparing}>
      <Tray armedKind={armedKind} onArm={setArmedKind} />
      <Paper
        study={study}
        letters={letters}
        lit={spoken?.subject ?? null}
        armedKind={armedKind}
        onArm={setArmedKind}
        onHover={setHovered}
        onDetails={onDetails}
      />
      <Assumptions study={study} />
      <Notes
        study={study}
        letters={letters}
        litSubject={(litNotes && readSubject(litNotes)) || null}
        onSubject={onSubject}
      />
      {spoken?.note && <Leader subject={spoken.subject} note={spoken.note} />}
    </div>
  );
}
