import { type RefObject, useLayoutEffect, useState } from 'react';

/** Letters of 12 px stay at 11 px or above. */
const least = 11 / 12;
const most = 1.2;

/** The scale at which a drawing fits its pane with readable letters, and whether it then reaches beyond it. */
export function useFitScale(
  pane: RefObject<HTMLElement | null>,
  drawing: { width: number; height: number },
): { scale: number; overflows: boolean } {
  const [room, setRoom] = useState({ width: 0, height: 0 });
  useLayoutEffect(() => {
    const element = pane.current;
    if (!element) return;
    const observer = new ResizeObserver(() =>
      setRoom({ width: element.clientWidth, height: element.clientHeight }),
    );
    observer.observe(element);
    return () => observer.disconnect();
  }, [pane]);
  const fits = Math.min(room.width / drawing.width, room.height / drawing.height);
  const scale = Math.max(least, Math.min(most, Number.isFinite(fits) ? fits : least));
  return { scale, overflows: room.width > 0 && scale > fits };
}
