import { type RefObject, useEffect } from 'react';

/** The slip is placed before it is shown, and what is hidden takes no focus: it is asked for this many frames. */
const framesToWait = 10;

/** Puts the focus on the slip's first field when it opens, and back where it was when the slip goes. */
export function useSlipFocus(paper: RefObject<HTMLElement | null>, subjectKey: string): void {
  useEffect(() => {
    const before = document.activeElement;
    let frame = 0;
    const take = (left: number) => {
      const body = paper.current?.querySelector<HTMLElement>(`[data-slip="${CSS.escape(subjectKey)}"]`);
      const first = body?.querySelector<HTMLElement>('input, select, button');
      first?.focus({ preventScroll: true });
      if (left > 0 && document.activeElement !== first) frame = requestAnimationFrame(() => take(left - 1));
    };
    take(framesToWait);
    return () => {
      cancelAnimationFrame(frame);
      const lost = document.activeElement === null || document.activeElement === document.body;
      if (lost && before instanceof HTMLElement && before.isConnected) before.focus({ preventScroll: true });
      else if (lost && before instanceof SVGElement && before.isConnected)
        before.focus({ preventScroll: true });
    };
  }, [paper, subjectKey]);
}
