import {
  type PointerEvent as ReactPointerEvent,
  type RefObject,
  useCallback,
  useEffect,
  useRef,
  useState,
} from 'react';
import { type Edit, elementById, isSeries, type Study } from '../../study/index.ts';
import type { Layout, Point } from '../layout/index.ts';
import { readSubject, type Subject } from '../subject.ts';
import { toDrawing } from '../view/paneView.ts';
import type { PaneControls } from '../view/usePaneView.ts';
import { type DropPlan, dropPlan, type Held } from './dropPlan.ts';
import type { TrayKind } from './TrayKind.ts';

/** A part or end in the hand: where, and what letting go would do. */
export interface Hand {
  held: Held;
  /** Drawing px. */
  at: Point;
  plan: DropPlan;
}

export interface GestureContext {
  study: Study;
  layout: Layout;
  controls: PaneControls;
  armedKind: TrayKind | null;
  onArm(kind: TrayKind | null): void;
  onDrop(edit: Edit, select: Subject | undefined): void;
  /** A press and release on a part or busbar, or on the paper (undefined). */
  onPress(subject: Subject | undefined, adding: boolean): void;
}

type Gesture =
  | { state: 'pressing'; subject: Subject | undefined; held: Held | undefined; from: Point; adding: boolean }
  | { state: 'holding'; held: Held }
  | { state: 'panning'; last: Point }
  | { state: 'pinching'; apart: number };

const START_PX = 4;

function pressed(event: ReactPointerEvent, study: Study): { subject?: Subject; held?: Held } {
  if (!(event.target instanceof Element)) return {};
  const subject = event.target.closest('[data-subject]')?.getAttribute('data-subject') ?? undefined;
  const read = subject ? readSubject(subject) : undefined;
  if (!subject || read?.kind !== 'element') return subject ? { subject } : {};
  const endBus = event.target.closest('[data-end]')?.getAttribute('data-end');
  if (!endBus) return { subject, held: { what: 'part', id: read.id } };
  const part = elementById(study, read.id);
  const end = part && isSeries(part) && part.from === endBus ? 'from' : 'to';
  return { subject, held: { what: 'end', id: read.id, end } };
}

/**
 * Pointer gestures on the drawing. A gesture lives in local state; one edit leaves it on release, none on
 * Escape.
 *
 *   idle ── press on paper ──► pressing ── move ──► panning ── release ──► idle
 *        ── press on a part ─► pressing ── move ──► holding ── release ──► drop ──► idle
 *        ── tray armed ──────► holding (new) ────── release over the paper ► drop ─► idle
 *        ── second touch ────► pinching ─ release ► idle
 */
export function useGestures(paneRef: RefObject<HTMLElement | null>, context: GestureContext) {
  const [hand, setHand] = useState<Hand | null>(null);
  const gesture = useRef<Gesture | null>(null);
  const touches = useRef(new Map<number, Point>());
  const latest = useRef(context);
  latest.current = context;

  const inPane = useCallback(
    (event: { clientX: number; clientY: number }): Point => {
      const box = paneRef.current?.getBoundingClientRect();
      return { x: event.clientX - (box?.left ?? 0), y: event.clientY - (box?.top ?? 0) };
    },
    [paneRef],
  );

  const hold = useCallback((held: Held, screen: Point) => {
    const { study, layout, controls } = latest.current;
    const at = toDrawing(controls.view, screen);
    setHand({ held, at, plan: dropPlan(study, layout, held, at) });
  }, []);

  const cancel = useCallback(() => {
    const under = gesture.current !== null;
    gesture.current = null;
    touches.current.clear();
    setHand(null);
    return under;
  }, []);

  const drop = useCallback((held: Held, screen: Point) => {
    const { study, layout, controls, onDrop } = latest.current;
    const plan = dropPlan(study, layout, held, toDrawing(controls.view, screen));
    if (plan.edit) onDrop(plan.edit, plan.select);
  }, []);

  const onPointerDown = useCallback(
    (event: ReactPointerEvent) => {
      if (event.button !== 0 && event.button !== 1) return;
      const at = inPane(event);
      if (event.pointerType === 'touch') touches.current.set(event.pointerId, at);
      if (touches.current.size === 2) {
        setHand(null);
        gesture.current = { state: 'pinching', apart: apart(touches.current) };
        return;
      }
      if (latest.current.armedKind) return;
      const { subject, held } = event.button === 0 ? pressed(event, latest.current.study) : {};
      const adding = event.shiftKey || event.ctrlKey || event.metaKey;
      gesture.current = { state: 'pressing', subject, held, from: at, adding };
      paneRef.current?.setPointerCapture(event.pointerId);
    },
    [inPane, paneRef],
  );

  const onPointerMove = useCallback(
    (event: ReactPointerEvent) => {
      const at = inPane(event);
      if (touches.current.has(event.pointerId)) touches.current.set(event.pointerId, at);
      const now = gesture.current;
      if (!now) return;
      if (now.state === 'pinching') {
        const next = apart(touches.current);
        latest.current.controls.zoomBy(next / now.apart, middle(touches.current));
        now.apart = next;
      } else if (now.state === 'panning') {
        latest.current.controls.panBy(at.x - now.last.x, at.y - now.last.y);
        now.last = at;
      } else if (now.state === 'holding') {
        hold(now.held, at);
      } else if (Math.hypot(at.x - now.from.x, at.y - now.from.y) > START_PX) {
        gesture.current = now.held
          ? { state: 'holding', held: now.held }
          : { state: 'panning', last: now.from };
      }
    },
    [hold, inPane],
  );

  const onPointerUp = useCallback(
    (event: ReactPointerEvent) => {
      touches.current.delete(event.pointerId);
      const now = gesture.current;
      gesture.current = null;
      setHand(null);
      if (now?.state === 'holding') drop(now.held, inPane(event));
      else if (now?.state === 'pressing') latest.current.onPress(now.subject, now.adding);
    },
    [drop, inPane],
  );

  const { armedKind } = context;
  useEffect(() => {
    if (!armedKind) {
      if (gesture.current?.state !== 'holding') setHand(null);
      return;
    }
    const held: Held = { what: 'new', kind: armedKind };
    const over = (event: PointerEvent) =>
      event.target instanceof Node && (paneRef.current?.contains(event.target) ?? false);
    const onMove = (event: PointerEvent) => (over(event) ? hold(held, inPane(event)) : setHand(null));
    const onUp = (event: PointerEvent) => {
      if (!over(event)) return;
      drop(held, inPane(event));
      latest.current.onArm(null);
    };
    window.addEventListener('pointermove', onMove);
    window.addEventListener('pointerup', onUp);
    return () => {
      window.removeEventListener('pointermove', onMove);
      window.removeEventListener('pointerup', onUp);
    };
  }, [armedKind, drop, hold, inPane, paneRef]);

  return { hand, cancel, handlers: { onPointerDown, onPointerMove, onPointerUp, onPointerCancel: cancel } };
}

function apart(touches: Map<number, Point>): number {
  const [a, b] = [...touches.values()];
  return a && b ? Math.max(Math.hypot(a.x - b.x, a.y - b.y), 1) : 1;
}

function middle(touches: Map<number, Point>): Point {
  const [a, b] = [...touches.values()];
  return { x: ((a?.x ?? 0) + (b?.x ?? 0)) / 2, y: ((a?.y ?? 0) + (b?.y ?? 0)) / 2 };
}
