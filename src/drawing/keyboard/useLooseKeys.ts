import { type RefObject, useEffect, useRef } from 'react';
import type { Key } from './KeyContext.ts';

/** Keys pressed while nothing has the focus are the drawing's, and it takes the focus with the first it knows. */
export function useLooseKeys(paneRef: RefObject<HTMLElement | null>, act: (key: Key) => boolean): void {
  const latest = useRef(act);
  latest.current = act;
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const nowhere = document.activeElement === null || document.activeElement === document.body;
      const covered = document.querySelector('.veil') !== null;
      if (!nowhere || covered || event.defaultPrevented) return;
      if (!latest.current(event)) return;
      const pane = paneRef.current;
      if (document.activeElement !== document.body || !pane) return;
      (pane.querySelector<SVGElement>('[tabindex="0"]') ?? pane).focus({ preventScroll: true });
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [paneRef]);
}
