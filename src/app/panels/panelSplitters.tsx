import type { PanelPlaces } from './panelPlaces.ts';
import { panelStore, setPanels } from './panelStore.ts';
import { Splitter } from './Splitter.tsx';

function forget(key: 'notesWidth' | 'railHeight'): void {
  const { [key]: _usual, ...others } = panelStore.getState();
  panelStore.setState(others, true);
}

/** Between drawing and notes. */
export function NotesSplitter({ place }: { place: PanelPlaces['notes'] }) {
  return (
    <Splitter
      label="Width of the notes"
      controls="notes-panel"
      grows="left"
      size={place}
      folded={place.show === 'letters'}
      onSize={(notesWidth) => setPanels({ notesWidth })}
      onUsual={() => forget('notesWidth')}
      onFold={(folded) => setPanels({ notes: folded ? 'letters' : 'open' })}
    />
  );
}

/** Above the rail. */
export function RailSplitter({ place }: { place: PanelPlaces['rail'] }) {
  return (
    <Splitter
      label="Height of the rail"
      controls="rail-panel"
      grows="up"
      size={place}
      folded={place.show === 'strip'}
      onSize={(railHeight) => setPanels({ railHeight })}
      onUsual={() => forget('railHeight')}
      onFold={(folded) => setPanels({ rail: folded ? 'strip' : 'open' })}
    />
  );
}
