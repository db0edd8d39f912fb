import { type RefObject, useCallback, useLayoutEffect, useState } from 'react';

/** Rows drawn above and below what is seen, so that scrolling shows no gap. */
const spare = 6;

interface Seen {
  first: number;
  last: number;
  page: number;
}

/** Which rows of a table are seen, so that only they are drawn: rows of equal height in a scrolling box. */
export function useWindowedRows(box: RefObject<HTMLElement | null>, rows: number, height: number): Seen {
  const [view, setView] = useState({ top: 0, room: 600 });
  const read = useCallback(() => {
    const element = box.current;
    if (!element) return;
    const next = { top: Math.floor(element.scrollTop / height) * height, room: element.clientHeight };
    setView((before) => (before.top === next.top && before.room === next.room ? before : next));
  }, [box, height]);
  useLayoutEffect(() => {
    const element = box.current;
    if (!element) return;
    read();
    element.addEventListener('scroll', read, { passive: true });
    const observer = new ResizeObserver(read);
    observer.observe(element);
    return () => {
      element.removeEventListener('scroll', read);
      observer.disconnect();
    };
  }, [box, read]);
  const page = Math.max(1, Math.floor(view.room / height) - 2);
  return {
    first: Math.max(0, Math.floor(view.top / height) - spare),
    last: Math.min(rows - 1, Math.ceil((view.top + view.room) / height) + spare),
    page,
  };
}
