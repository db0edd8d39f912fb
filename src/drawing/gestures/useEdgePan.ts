import { type RefObject, useEffect, useRef } from 'react';
import type { PaneControls } from '../view/usePaneView.ts';

/** Width of the strip along the pane's edges that pans, px, and how far a frame takes it at the very edge. */
const STRIP = 28;
const MOST_PX = 14;

/**
 * Pans the drawing while something is held near the edge of the pane, so that what is out of sight can be
 * reached. It waits until the pointer has been inside: what comes from the tray crosses the edge first.
 */
export function useEdgePan(paneRef: RefObject<HTMLElement | null>, active: boolean, controls: PaneControls) {
  const latest = useRef(controls);
  latest.current = controls;
  useEffect(() => {
    if (!active) return;
    let at: { x: number; y: number } | null = null;
    let wasInside = false;
    let frame = 0;
    const step = () => {
      frame = requestAnimationFrame(step);
      const box = paneRef.current?.getBoundingClientRect();
      if (!box || !at) return;
      const [dx, dy] = [pull(at.x, box.left, box.right), pull(at.y, box.top, box.bottom)];
      if (dx === 0 && dy === 0) wasInside = true;
      else if (wasInside) latest.current.panBy(dx, dy);
    };
    const onMove = (event: PointerEvent) => {
      at = { x: event.clientX, y: event.clientY };
    };
    window.addEventListener('pointermove', onMove);
    frame = requestAnimationFrame(step);
    return () => {
      window.removeEventListener('pointermove', onMove);
      cancelAnimationFrame(frame);
    };
  }, [active, paneRef]);
}

/** How far the drawing is pulled: towards the middle, faster the nearer the edge. */
function pull(at: number, low: number, high: number): number {
  const [over, under] = [low + STRIP - at, at - (high - STRIP)];
  if (over > 0) return (MOST_PX * Math.min(over, STRIP)) / STRIP;
  if (under > 0) return (-MOST_PX * Math.min(under, STRIP)) / STRIP;
  return 0;
}
