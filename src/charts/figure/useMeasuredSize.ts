import { type RefObject, useLayoutEffect, useState } from 'react';

/** The size of an element in CSS pixels, followed as it changes; `initial` until it is first measured. */
export function useMeasuredSize(
  ref: RefObject<HTMLElement | null>,
  initial: { width: number; height: number },
): { width: number; height: number } {
  const [size, setSize] = useState(initial);
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return;
    const read = () => setSize({ width: element.clientWidth, height: element.clientHeight });
    read();
    const observer = new ResizeObserver(read);
    observer.observe(element);
    return () => observer.disconnect();
  }, [ref]);
  return size;
}
