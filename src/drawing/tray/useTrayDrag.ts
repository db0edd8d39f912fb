import { type PointerEvent as ReactPointerEvent, useCallback, useEffect, useRef, useState } from 'react';
import type { TrayKind } from '../gestures/TrayKind.ts';

interface Press {
  kind: TrayKind;
  from: { x: number; y: number };
  wasArmed: boolean;
  moved: boolean;
}

export interface Ghost {
  kind: TrayKind;
  x: number;
  y: number;
}

const START_PX = 4;

/**
 * A press on the tray arms the kind at once, so that the drawing follows the pointer. Released where it
 * began it stays armed (a click); released on the drawing the drawing drops it; released elsewhere it is
 * disarmed.
 */
export function useTrayDrag(armedKind: TrayKind | null, onArm: (kind: TrayKind | null) => void) {
  const [ghost, setGhost] = useState<Ghost | null>(null);
  const pressRef = useRef<Press | null>(null);
  const armRef = useRef(onArm);
  armRef.current = onArm;

  const press = useCallback(
    (kind: TrayKind, event: ReactPointerEvent) => {
      if (event.button !== 0) return;
      // A touch captures its pointer; the drawing must see it move.
      if (event.target instanceof Element && event.target.hasPointerCapture(event.pointerId)) {
        event.target.releasePointerCapture(event.pointerId);
      }
      const from = { x: event.clientX, y: event.clientY };
      pressRef.current = { kind, from, wasArmed: armedKind === kind, moved: false };
      armRef.current(kind);
    },
    [armedKind],
  );

  useEffect(() => {
    const onMove = (event: PointerEvent) => {
      const now = pressRef.current;
      if (!now) return;
      const far = Math.hypot(event.clientX - now.from.x, event.clientY - now.from.y);
      if (far > START_PX) now.moved = true;
      const overPane = document
        .elementFromPoint(event.clientX, event.clientY)
        ?.closest('[data-drawing-pane]');
      // Over the drawing the symbol is drawn there, at the drawing's own scale.
      setGhost(now.moved && !overPane ? { kind: now.kind, x: event.clientX, y: event.clientY } : null);
    };
    const onUp = (event: PointerEvent) => {
      const now = pressRef.current;
      pressRef.current = null;
      setGhost(null);
      if (!now) return;
      const onPane = event.target instanceof Element && event.target.closest('[data-drawing-pane]') !== null;
      if ((now.moved && !onPane) || (!now.moved && now.wasArmed)) armRef.current(null);
    };
    window.addEventListener('pointermove', onMove);
    window.addEventListener('pointerup', onUp);
    return () => {
      window.removeEventListener('pointermove', onMove);
      window.removeEventListener('pointerup', onUp);
    };
  }, []);

  useEffect(() => {
    // What was given up elsewhere, by Escape or the right button, leaves the hand here as well.
    if (armedKind !== null) return;
    pressRef.current = null;
    setGhost(null);
  }, [armedKind]);

  return { ghost, press };
}
