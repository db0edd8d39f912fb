import { type CSSProperties, useCallback, useState } from 'react';
import type { NoteSubject } from '../../charts/index.ts';
import { readSubject, type Subject, type TrayKind } from '../../drawing/index.ts';
import { useWorkbench } from '../../store/index.ts';
import { symbolSetOf } from '../../study/index.ts';
import { LETTERS, type PanelPlaces } from '../panels/panelPlaces.ts';
import { NotesSplitter } from '../panels/panelSplitters.tsx';
import { usePanelPlaces } from '../panels/panelStore.ts';
import { TrayPanel } from '../panels/TrayPanel.tsx';
import { Assumptions } from '../quickstart/Assumptions.tsx';
import { Leader } from './Leader.tsx';
import { Notes } from './Notes.tsx';
import { Paper } from './Paper.tsx';
import { useLetters } from './useLetters.ts';
import { useListedVerdicts } from './useListedVerdicts.ts';
import './site.css';

const none: never[] = [];

interface Spoken {
  subject: Subject;
  note: string | null;
}

/** Draw, watch, judge: tray, drawing and notes column. */
export function SitePlace({ onDetails }: { onDetails(field: string | null): void }) {
  const study = useWorkbench((state) => state.study);
  const { verdicts } = useListedVerdicts();
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
  const places = usePanelPlaces();
  if (!study) return null;
  const folded = places.notes.show === 'letters';
  const litNotes = hovered ?? selection.at(-1);
  return (
    <div className="site" inert={comparing} style={siteColumns(places)}>
      <TrayPanel
        place={places.tray}
        symbols={symbolSetOf(study)}
        armedKind={armedKind}
        onArm={setArmedKind}
      />
      <Paper
        study={study}
        letters={letters}
        lit={spoken?.subject ?? null}
        armedKind={armedKind}
        onArm={setArmedKind}
        onHover={setHovered}
        onDetails={onDetails}
      />
      <NotesSplitter place={places.notes} />
      <div className="notes-panel" id="notes-panel">
        {!folded && <Assumptions study={study} />}
        <Notes
          study={study}
          letters={letters}
          litSubject={(litNotes && readSubject(litNotes)) || null}
          folded={folded}
          onSubject={onSubject}
        />
      </div>
      {spoken?.note && <Leader subject={spoken.subject} note={spoken.note} />}
    </div>
  );
}

/** Widths of tray and notes as custom properties, so that a lens knows how far it may reach. */
function siteColumns({ tray, notes }: PanelPlaces): CSSProperties {
  const notesWidth = notes.show === 'letters' ? LETTERS : notes.size;
  return { '--tray': `${tray.width}px`, '--notes': `${notesWidth}px` } as CSSProperties;
}
