import { type MouseEvent, type PointerEvent, type RefObject, useRef, useState } from 'react';
import { dropPlace } from './dropPlace.ts';

interface Running {
  key: string;
  startY: number;
  moved: boolean;
}

/** Where a dragged note would be dropped. */
export interface NoteDrag {
  key: string;
  /** Places up (negative) or down it would move. */
  by: number;
}

const THRESHOLD = 6;

/**
 * Dragging a reading by its title to another place among the readings. The column is only told at the end;
 * a drag that ends where it began, or is cancelled, leaves no trace.
 */
export function useNoteDrag(
  column: RefObject<HTMLElement | null>,
  keys: readonly string[],
  onMove: (key: string, by: number) => void,
) {
  const running = useRef<Running | null>(null);
  const justDragged = useRef(false);
  const [drag, setDrag] = useState<NoteDrag | null>(null);
  const end = () => {
    running.current = null;
    setDrag(null);
  };
  const handlersOf = (key: string) => ({
    onPointerDown: (event: PointerEvent<HTMLElement>) => {
      if (event.button !== 0 || keys.length < 2) return;
      event.currentTarget.setPointerCapture(event.pointerId);
      running.current = { key, startY: event.clientY, moved: false };
    },
    onPointerMove: (event: PointerEvent<HTMLElement>) => {
      const now = running.current;
      if (!now || now.key !== key) return;
      if (!now.moved && Math.abs(event.clientY - now.startY) < THRESHOLD) return;
      now.moved = true;
      const by = dropPlace(middles(column.current, keys), keys.indexOf(key), event.clientY);
      if (drag?.by !== by || drag.key !== key) setDrag({ key, by });
    },
    onPointerUp: () => {
      const by = drag?.by ?? 0;
      justDragged.current = running.current?.moved ?? false;
      if (justDragged.current && by !== 0) onMove(key, by);
      end();
    },
    onPointerCancel: end,
    onLostPointerCapture: end,
    // The click that ends a drag must not fold the note.
    onClickCapture: (event: MouseEvent<HTMLElement>) => {
      if (justDragged.current) event.stopPropagation();
      justDragged.current = false;
    },
  });
  return { drag, handlersOf };
}

function middles(column: HTMLElement | null, keys: readonly string[]): number[] {
  return keys.map((key) => {
    const box = column?.querySelector(`[data-note="${CSS.escape(key)}"]`)?.getBoundingClientRect();
    return box ? box.top + box.height / 2 : Number.NaN;
  });
}
