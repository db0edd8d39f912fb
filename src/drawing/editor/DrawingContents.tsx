import { memo } from 'react';
import type { FlagSeverity } from '../glyphs/FindingFlag.tsx';
import type { Layout } from '../layout/index.ts';
import type { Figures } from '../readings/figures.ts';
import { busSubject, partSubject, type Subject } from '../subject.ts';
import { BusView } from './BusView.tsx';
import { EndHandles } from './EndHandles.tsx';
import { PartView } from './PartView.tsx';

export interface DrawingContentsProps {
  layout: Layout;
  figures: Figures;
  letters: ReadonlyMap<Subject, string>;
  /** The gravest finding about a part's data. */
  flags: ReadonlyMap<Subject, FlagSeverity>;
  selection: readonly Subject[];
  /** The subject holding the tab stop. */
  current: Subject | undefined;
  /** Lit by a hovered note. */
  lit: Subject | null;
  /** Subjects in the hand. */
  held: ReadonlySet<Subject>;
  targetBus: string | undefined;
  focusBus: string;
  hatchId: string;
}

/** Parts first, busbars over their conductors, the handles of selected parts over all. */
export const DrawingContents = memo(function DrawingContents(props: DrawingContentsProps) {
  const { layout, figures, letters, selection, current, lit, hatchId } = props;
  const selected = new Set(selection);
  return (
    <>
      {layout.parts.map((place) => {
        const figure = figures.parts.get(place.id);
        const subject = partSubject(place.id);
        return figure ? (
          <PartView
            key={place.id}
            place={place}
            figure={figure}
            letters={letters.get(subject) ?? ''}
            flag={props.flags.get(subject)}
            selected={selected.has(subject)}
            current={current === subject}
            lit={lit === subject}
            held={props.held.has(subject)}
            hatchId={hatchId}
          />
        ) : null;
      })}
      {layout.buses.map((place) => {
        const figure = figures.buses.get(place.id);
        const subject = busSubject(place.id);
        return figure ? (
          <BusView
            key={place.id}
            place={place}
            figure={figure}
            letters={letters.get(subject) ?? ''}
            selected={selected.has(subject)}
            current={current === subject}
            lit={lit === subject}
            held={props.held.has(subject)}
            target={props.targetBus === place.id}
            focus={props.focusBus === place.id}
          />
        ) : null;
      })}
      {layout.parts.map((place) =>
        place.foot && selected.has(partSubject(place.id)) ? (
          <EndHandles key={place.id} place={place} />
        ) : null,
      )}
    </>
  );
});
