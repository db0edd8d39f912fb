import {
  type PointerEvent as ReactPointerEvent,
  type RefObject,
  useCallback,
  useEffect,
  useRef,
  useState,
} from 'react';
import type { Edit, Study } from '../../study/index.ts';
import type { Box, Layout, Point } from '../layout/index.ts';
import type { Subject } from '../subject.ts';
import { toDrawing } from '../view/paneView.ts';
import type { PaneControls } from '../view/usePaneView.ts';
import { bandPicks, boxBetween } from './bandPicks.ts';
import type { DropOutcome } from './DropOutcome.ts';
import { dropPlan } from './dropPlan.ts';
import type { Held } from './Held.ts';
import { type Pressed, pressedOn } from './pressedOn.ts';
import type { TrayKind } from './TrayKind.ts';
import { useAbandon } from './useAbandon.ts';
import { useEdgePan } from './useEdgePan.ts';

/** A part or end in the hand: where, and what letting go would do. */
export interface Hand {
  held: Held;
  /** Drawing px. */
  at: Point;
  plan: DropOutcome;
}

/** A rubber band: its box in drawing px, and what it picks. */
export interface Band {
  box: Box;
  picks: readonly Subject[];
}

export interface GestureContext {
  study: Study;
  layout: Layout;
  controls: PaneControls;
  selection: readonly Subject[];
  armedKind: TrayKind | null;
  onArm(kind: TrayKind | null): void;
  onDrop(edit: Edit, select: readonly Subject[] | undefined): void;
  /** A press and release on a part or busbar, or on the paper (undefined). */
  onPress(subject: Subject | undefined, adding: boolean): void;
  /** A rubber band let go. */
  onBand(picks: readonly Subject[]): void;
}

type Gesture =
  | ({ state: 'pressing'; from: Point; adding: boolean } & Pressed)
  | { state: 'holding'; held: Held }
  | { state: 'banding'; from: Point }
  | { state: 'panning'; last: Point }
  | { state: 'pinching'; apart: number };

const START_PX = 4;

/**
 * Pointer gestures on the drawing. A gesture lives in local state; one edit leaves it on release, none when
 * it is given up: by Escape, the right button, a cancelled pointer, or the loss of the window.
 *
 *   idle ── press on paper ───► pressing ── move ──► panning ── release ──► idle
 *        ── the same, Shift ──► pressing ── move ──► banding ── release ──► select ► idle
 *        ── press on a part ──► pressing ── move ──► holding ── release ──► drop ──► idle
 *        ── tray armed ───────► holding (new) ────── release over the paper ► drop ─► idle
 *        ── second touch ─────► pinching ─ release ► idle
 */
export function useGestures(paneRef: RefObject<HTMLElement | null>, context: GestureContext) {
  const [hand, setHand] = useState<Hand | null>(null);
  const [band, setBand] = useState<Band | null>(null);
  const [active, setActive] = useState(false);
  const gesture = useRef<Gesture | null>(null);
  const touches = useRef(new Map<number, Point>());
  /** Repeats the latest move: the drawing may have moved under a pointer that rests. */
  const again = useRef<(() => void) | null>(null);
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
    again.current = () => hold(held, screen);
  }, []);

  const stretch = useCallback((from: Point, screen: Point) => {
    const { layout, controls } = latest.current;
    const box = boxBetween(from, toDrawing(controls.view, screen));
    setBand({ box, picks: bandPicks(layout, box) });
    again.current = () => stretch(from, screen);
  }, []);

  const enter = useCallback((next: Gesture | null) => {
    gesture.current = next;
    setActive(next !== null);
    if (next?.state !== 'holding') setHand(null);
    if (next?.state !== 'banding') setBand(null);
  }, []);

  const cancel = useCallback(() => {
    touches.current.clear();
    enter(null);
  }, [enter]);

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
        enter({ state: 'pinching', apart: apart(touches.current) });
        return;
      }
      const { armedKind, study, selection } = latest.current;
      if (armedKind) return;
      const pressed = event.button === 0 ? pressedOn(event, study, selection) : {};
      const adding = event.shiftKey || event.ctrlKey || event.metaKey;
      enter({ state: 'pressing', ...pressed, from: at, adding });
      paneRef.current?.setPointerCapture(event.pointerId);
    },
    [enter, inPane, paneRef],
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
      } else if (now.state === 'banding') {
        stretch(now.from, at);
      } else if (Math.hypot(at.x - now.from.x, at.y - now.from.y) > START_PX) {
        enter(begun(now, toDrawing(latest.current.controls.view, now.from)));
      }
    },
    [enter, hold, stretch, inPane],
  );

  const onPointerUp = useCallback(
    (event: ReactPointerEvent) => {
      touches.current.delete(event.pointerId);
      const now = gesture.current;
      enter(null);
      const { layout, controls, onBand, onPress } = latest.current;
      const at = inPane(event);
      if (now?.state === 'holding') drop(now.held, at);
      else if (now?.state === 'banding')
        onBand(bandPicks(layout, boxBetween(now.from, toDrawing(controls.view, at))));
      else if (now?.state === 'pressing') onPress(now.subject, now.adding);
    },
    [drop, enter, inPane],
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
      if (!over(event) || event.button !== 0) return;
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

  useAbandon(active || armedKind !== null, () => {
    cancel();
    if (armedKind) latest.current.onArm(null);
  });
  const carrying = hand !== null || band !== null;
  useEdgePan(paneRef, carrying, context.controls);
  const { view } = context.controls;
  useEffect(() => {
    if (carrying && view) again.current?.();
  }, [view, carrying]);

  const onLostPointerCapture = useCallback(() => {
    if (gesture.current && gesture.current.state !== 'pinching') cancel();
  }, [cancel]);
  const handlers = {
    onPointerDown,
    onPointerMove,
    onPointerUp,
    onPointerCancel: cancel,
    onLostPointerCapture,
  };
  return { hand, band, handlers };
}

/** What a press becomes once it moves; `from` in drawing px. */
function begun(press: Extract<Gesture, { state: 'pressing' }>, from: Point): Gesture {
  if (press.held) return { state: 'holding', held: press.held };
  return press.adding ? { state: 'banding', from } : { state: 'panning', last: press.from };
}

function apart(touches: Map<number, Point>): number {
  const [a, b] = [...touches.values()];
  return a && b ? Math.max(Math.hypot(a.x - b.x, a.y - b.y), 1) : 1;
}

function middle(touches: Map<number, Point>): Point {
  const [a, b] = [...touches.values()];
  return { x: ((a?.x ?? 0) + (b?.x ?? 0)) / 2, y: ((a?.y ?? 0) + (b?.y ?? 0)) / 2 };
}
