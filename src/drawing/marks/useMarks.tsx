import { type RefObject, useState } from 'react';
import { addMark, type Edit, type MarkKind, marksOf, type Study, setMarkText } from '../../study/index.ts';
import { screenPalette } from '../glyphs/Palette.ts';
import type { Layout, Point } from '../layout/index.ts';
import { readSubject, type Subject } from '../subject.ts';
import { toDrawing } from '../view/paneView.ts';
import type { PaneControls } from '../view/usePaneView.ts';
import { MarkCatcher } from './MarkCatcher.tsx';
import { MarkEntry } from './MarkEntry.tsx';
import { MarkGlyph } from './MarkGlyph.tsx';
import { MarkLayer } from './MarkLayer.tsx';
import { markPoints, pointOn } from './markPlaces.ts';
import { markShape, shapeBetween } from './markShape.ts';

export interface MarksProps {
  study: Study;
  layout: Layout;
  controls: PaneControls;
  paneRef: RefObject<HTMLElement | null>;
  /** The part or busbar that has the keyboard: a mark placed by keys begins beside it. */
  current: Subject | undefined;
  armed: MarkKind | null;
  onArm(kind: MarkKind | null): void;
  onEdit(edit: Edit): void;
}

/** A mark that is placed and waits for its words. */
interface Draft {
  kind: MarkKind;
  from: Point;
  to: Point;
}

/** The marks as two layers: one among the drawing's own shapes, one over the paper for placing and writing. */
export function useMarks(props: MarksProps) {
  const { study, layout, controls, paneRef, armed, onArm, onEdit } = props;
  const [draft, setDraft] = useState<Draft | null>(null);
  const [editing, setEditing] = useState<string | null>(null);
  const edited = marksOf(study).find(({ id }) => id === editing);
  const focusPane = () => paneRef.current?.focus({ preventScroll: true });
  const focusMark = (id: string) =>
    // The mark of a new study is drawn with it.
    requestAnimationFrame(() =>
      paneRef.current
        ?.querySelector<SVGGElement>(`[data-mark="${CSS.escape(id)}"]`)
        ?.focus({ preventScroll: true }),
    );

  const place = (from: Point, to: Point) => {
    // What is placed in sight needs no fitting: the paper stays under the hand.
    controls.panBy(0, 0);
    if (armed) setDraft({ kind: armed, from, to });
    onArm(null);
  };
  const finishDraft = (text: string) => {
    setDraft(null);
    if (!draft || (draft.kind === 'note' && text.trim() === '')) return focusPane();
    const { kind, from, to } = draft;
    const edit = addMark(study, { kind, text, ...markPoints(kind, from, to, layout) });
    onEdit(edit);
    focusMark(edit.markId);
  };
  const finishWords = (text: string) => {
    setEditing(null);
    if (!edited) return;
    if (text !== edited.text) onEdit(setMarkText(study, edited.id, text));
    focusMark(edited.id);
  };

  const draftShape = draft && shapeBetween(draft.kind, '', draft.from, draft.to);
  const onPaper = (
    <>
      <MarkLayer
        study={study}
        layout={layout}
        view={controls.view}
        editing={editing}
        onEdit={onEdit}
        onWords={setEditing}
        onGone={focusPane}
      />
      {draftShape && <MarkGlyph shape={draftShape} palette={screenPalette} />}
    </>
  );
  const entryShape = edited ? markShape(edited, layout) : draftShape;
  const overPaper = (
    <>
      {armed && (
        <MarkCatcher
          key={armed}
          kind={armed}
          view={controls.view}
          first={besideCurrent(props)}
          onPlaced={place}
          onGiveUp={() => {
            onArm(null);
            focusPane();
          }}
        />
      )}
      {entryShape && (
        <MarkEntry
          key={edited?.id ?? 'draft'}
          text={edited?.text ?? ''}
          at={{ x: entryShape.wordsBox.x - 4, y: entryShape.wordsBox.y - 4 }}
          view={controls.view}
          onDone={edited ? finishWords : finishDraft}
          onGiveUp={() => {
            if (edited) {
              setEditing(null);
              focusMark(edited.id);
            } else {
              setDraft(null);
              focusPane();
            }
          }}
        />
      )}
    </>
  );
  return { onPaper, overPaper };
}

/** A little right of and below the part in focus, else the middle of the paper. */
function besideCurrent({ current, layout, controls }: MarksProps): Point {
  const read = current ? readSubject(current) : undefined;
  const by = read && { kind: read.kind, id: read.id, dx: read.kind === 'bus' ? 60 : 46, dy: -34 };
  const { view, pane } = controls;
  const middle = toDrawing(view, { x: pane.width / 2, y: pane.height / 2 });
  return pointOn({ ...middle, ...(by ? { by } : {}) }, layout);
}
