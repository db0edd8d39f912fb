import { useRef, useState } from 'react';
import {
  busName,
  type DrawingMark,
  type Edit,
  elementName,
  marksOf,
  moveMark,
  removeMark,
  type Study,
} from '../../study/index.ts';
import type { Layout, Point } from '../layout/index.ts';
import type { PaneView } from '../view/paneView.ts';
import { type Grip, MarkUp } from './MarkUp.tsx';
import { markPoints, markSubject } from './markPlaces.ts';
import { type MarkShape, markShape, shapeBetween } from './markShape.ts';
import { useEscape } from './useEscape.ts';

interface MarkLayerProps {
  study: Study;
  layout: Layout;
  view: PaneView;
  /** The mark whose words are being written; they show in the entry instead. */
  editing: string | null;
  onEdit(edit: Edit): void;
  /** Opens the entry of its words. */
  onWords(id: string): void;
  /** The mark that had the keyboard is gone. */
  onGone(): void;
}

interface Drag {
  id: string;
  grip: Grip;
  /** Screen px where it began. */
  start: Point;
  by: Point;
  moved: boolean;
  /** The mark had the keyboard before: a press without a drag then opens its words. */
  again: boolean;
}

const START_PX = 4;
const STEP = 4;
const BIG_STEP = 24;
const ARROWS: Record<string, Point> = {
  ArrowLeft: { x: -1, y: 0 },
  ArrowRight: { x: 1, y: 0 },
  ArrowUp: { x: 0, y: -1 },
  ArrowDown: { x: 0, y: 1 },
};

/** The marks on the drawing: each can be dragged, moved and stretched by arrows, reworded and removed. */
export function MarkLayer(props: MarkLayerProps) {
  const { study, layout, view, editing, onEdit } = props;
  const [drag, setDrag] = useState<Drag | null>(null);
  const [focused, setFocused] = useState<string | null>(null);
  const given = useRef<Drag | null>(null);
  given.current = drag;
  useEscape(drag !== null, () => setDrag(null));

  const move = (mark: DrawingMark, grip: Grip, by: Point) => {
    const { from, to } = moved(markShape(mark, layout), grip, by);
    onEdit(moveMark(study, mark.id, markPoints(mark.kind, from, to, layout)));
  };
  const press = (mark: DrawingMark, grip: Grip, event: React.PointerEvent<SVGElement>) => {
    event.stopPropagation();
    if (event.button !== 0) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    const own = event.currentTarget.closest<SVGGElement>('[data-mark]');
    const again = document.activeElement === own;
    own?.focus({ preventScroll: true });
    const start = { x: event.clientX, y: event.clientY };
    setDrag({ id: mark.id, grip, start, by: { x: 0, y: 0 }, moved: false, again: again && grip === 'all' });
  };
  const follow = (event: React.PointerEvent) => {
    const now = given.current;
    if (!now) return;
    const [dx, dy] = [event.clientX - now.start.x, event.clientY - now.start.y];
    if (!now.moved && Math.hypot(dx, dy) < START_PX) return;
    setDrag({ ...now, moved: true, by: { x: dx / view.scale, y: dy / view.scale } });
  };
  const release = (mark: DrawingMark) => {
    const now = given.current;
    setDrag(null);
    if (now?.moved) move(mark, now.grip, now.by);
    else if (now?.again) props.onWords(mark.id);
  };
  const onKeyDown = (mark: DrawingMark, event: React.KeyboardEvent) => {
    const way = ARROWS[event.key];
    if (way) {
      const step = event.shiftKey ? BIG_STEP : STEP;
      move(mark, event.altKey && mark.to ? 'to' : 'all', { x: way.x * step, y: way.y * step });
    } else if (event.key === 'Enter' || event.key === 'F2') props.onWords(mark.id);
    else if (event.key === 'Delete' || event.key === 'Backspace') {
      onEdit(removeMark(study, mark.id));
      props.onGone();
    } else if (event.key === 'Escape' && !drag) props.onGone();
    else return;
    event.preventDefault();
    event.stopPropagation();
  };

  return (
    <g className="mark-ups">
      {marksOf(study).map((mark) => {
        const shown = editing === mark.id ? { ...mark, text: '' } : mark;
        const standing = markShape(shown, layout);
        const now = drag?.id === mark.id && drag.moved ? drag : null;
        const ends = now && moved(standing, now.grip, now.by);
        const shape = ends ? shapeBetween(mark.kind, shown.text, ends.from, ends.to) : standing;
        return (
          <MarkUp
            key={mark.id}
            mark={mark}
            shape={shape}
            name={spoken(mark, study)}
            withGrips={focused === mark.id && mark.kind !== 'note'}
            onFocus={() => setFocused(mark.id)}
            onBlur={() => setFocused(null)}
            onPress={(grip, event) => press(mark, grip, event)}
            onFollow={follow}
            onRelease={() => release(mark)}
            onCancel={() => setDrag(null)}
            onKeyDown={(event) => onKeyDown(mark, event)}
          />
        );
      })}
    </g>
  );
}

/** Both ends after one of them, or the whole, was moved. */
function moved(
  { from, to }: Pick<MarkShape, 'from' | 'to'>,
  grip: Grip,
  by: Point,
): { from: Point; to: Point } {
  const shifted = (point: Point) => ({ x: point.x + by.x, y: point.y + by.y });
  return { from: grip === 'to' ? from : shifted(from), to: grip === 'from' ? to : shifted(to) };
}

/** "note at Bank C1: check the discharge time". */
function spoken(mark: DrawingMark, study: Study): string {
  const by = markSubject(mark, study);
  const at = by && ` at ${by.kind === 'bus' ? busName(study, by.id) : elementName(study, by.id)}`;
  return `${mark.kind}${at ?? ''}${mark.text.trim() === '' ? '' : `: ${mark.text}`}`;
}
