import { type RefObject, useEffect } from 'react';
import type { Subject } from '../subject.ts';

/** The slip is placed before it is shown, and what is hidden takes no focus: it is asked for this many frames. */
const framesToWait = 10;

/**
 * Puts the focus on the slip's first field when it opens. When it goes, the focus returns to where it was
 * outside the drawing, else to the part the slip spoke of.
 */
export function useSlipFocus(paper: RefObject<HTMLElement | null>, subject: Subject): void {
  useEffect(() => {
    const before = document.activeElement;
    const pane = paper.current?.closest('.drawing')?.querySelector('[data-drawing-pane]');
    let frame = 0;
    const take = (left: number) => {
      const first = firstControl(paper.current);
      first?.focus({ preventScroll: true });
      if (left > 0 && document.activeElement !== first) frame = requestAnimationFrame(() => take(left - 1));
    };
    take(framesToWait);
    return () => {
      cancelAnimationFrame(frame);
      if (document.activeElement !== null && document.activeElement !== document.body) return;
      const part = pane?.querySelector(`[data-subject="${CSS.escape(subject)}"]`);
      const outside = before?.isConnected && before !== document.body && !pane?.contains(before);
      const back = outside ? before : (part ?? before);
      if (back instanceof HTMLElement || back instanceof SVGElement) back.focus({ preventScroll: true });
    };
  }, [paper, subject]);
}

/** The first essential field; where there is none, the name. */
function firstControl(paper: HTMLElement | null): HTMLElement | null | undefined {
  return (
    paper?.querySelector<HTMLElement>('.slip-essentials :is(input, select)') ??
    paper?.querySelector<HTMLElement>('.slip-name')
  );
}
