import { type KeyboardEvent, type PointerEvent, useEffect, useRef, useState } from 'react';
import type { MarkKind } from '../../study/index.ts';
import { screenPalette } from '../glyphs/Palette.ts';
import type { Point } from '../layout/index.ts';
import { type PaneView, toDrawing } from '../view/paneView.ts';
import { MarkGlyph } from './MarkGlyph.tsx';
import { shapeBetween } from './markShape.ts';
import { markWords } from './markWords.ts';

interface MarkCatcherProps {
  kind: MarkKind;
  view: PaneView;
  /** Where the keyboard begins, drawing px. */
  first: Point;
  onPlaced(from: Point, to: Point): void;
  onGiveUp(): void;
}

const LEAST_PX = 6;
/** What a press without a drag draws. */
const USUAL: Record<MarkKind, Point> = {
  note: { x: 0, y: 0 },
  cloud: { x: 150, y: 96 },
  box: { x: 150, y: 96 },
  arrow: { x: 90, y: 40 },
};
const STEP = 8;
const WAYS: Record<string, Point> = {
  ArrowLeft: { x: -STEP, y: 0 },
  ArrowRight: { x: STEP, y: 0 },
  ArrowUp: { x: 0, y: -STEP },
  ArrowDown: { x: 0, y: STEP },
};

/** Lies over the paper while a mark is to be placed: a press or drag does it, or arrows and Enter. */
export function MarkCatcher({ kind, view, first, onPlaced, onGiveUp }: MarkCatcherProps) {
  const sheet = useRef<HTMLDivElement>(null);
  const [from, setFrom] = useState<Point | null>(null);
  const [at, setAt] = useState(first);
  useEffect(() => sheet.current?.focus({ preventScroll: true }), []);
  const place = (event: PointerEvent<HTMLDivElement>): Point => {
    const box = event.currentTarget.getBoundingClientRect();
    return toDrawing(view, { x: event.clientX - box.left, y: event.clientY - box.top });
  };
  const finish = (start: Point, end: Point) => {
    const short = Math.hypot(end.x - start.x, end.y - start.y) < LEAST_PX;
    const usual = USUAL[kind];
    onPlaced(start, short ? { x: start.x + usual.x, y: start.y + usual.y } : end);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const way = WAYS[event.key];
    if (event.key === 'Escape') onGiveUp();
    else if (event.key === 'Enter') {
      if (from) finish(from, at);
      else if (kind === 'note') finish(at, at);
      else {
        setFrom(at);
        setAt({ x: at.x + USUAL[kind].x, y: at.y + USUAL[kind].y });
      }
    } else if (way) {
      const much = event.shiftKey ? 4 : 1;
      setAt({ x: at.x + way.x * much, y: at.y + way.y * much });
    } else return;
    event.preventDefault();
    event.stopPropagation();
  };
  const handlers = {
    tabIndex: -1,
    role: 'application',
    'aria-label': markWords[kind].how,
    onKeyDown,
    onPointerDown: (event: PointerEvent<HTMLDivElement>) => {
      if (event.button !== 0) return;
      event.currentTarget.setPointerCapture(event.pointerId);
      setFrom(place(event));
      setAt(place(event));
    },
    onPointerMove: (event: PointerEvent<HTMLDivElement>) => setAt(place(event)),
    onPointerUp: (event: PointerEvent<HTMLDivElement>) => {
      if (from) finish(from, place(event));
    },
    onPointerCancel: onGiveUp,
  };
  const shape = shapeBetween(kind, '', from ?? at, at);
  return (
    <div ref={sheet} className="mark-catcher" {...handlers}>
      <svg width="100%" height="100%" aria-hidden="true">
        <g transform={`translate(${view.x} ${view.y}) scale(${view.scale})`}>
          {from && kind !== 'note' && <MarkGlyph shape={shape} palette={screenPalette} />}
          <path className="mark-cross" d={`M${at.x - 7},${at.y}h14M${at.x},${at.y - 7}v14`} />
        </g>
      </svg>
      <output className="plan">{markWords[kind].how}</output>
    </div>
  );
}
