import { type RefObject, useEffect } from 'react';
import type { Subject } from '../subject.ts';

/**
 * Puts the focus on the slip's first field when it opens. When it goes, the focus returns to where it was
 * outside the drawing, else to the part the slip spoke of.
 */
export function useSlipFocus(paper: RefObject<HTMLElement | null>, subject: Subject): void {
  useEffect(() => {
    const before = document.activeElement;
    const pane = paper.current?.closest('.drawing')?.querySelector('[data-drawing-pane]');
    const first = firstControl(paper.current);
    first?.focus({ preventScroll: true });
    if (first instanceof HTMLInputElement && first.type === 'text') first.select();
    return () => {
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
