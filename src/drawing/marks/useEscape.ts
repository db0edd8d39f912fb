import { useEffect, useRef } from 'react';

/** While a gesture lasts, Escape ends it before anything else hears the key. */
export function useEscape(active: boolean, giveUp: () => void): void {
  const latest = useRef(giveUp);
  latest.current = giveUp;
  useEffect(() => {
    if (!active) return;
    const press = (event: KeyboardEvent) => {
      if (event.key !== 'Escape') return;
      event.preventDefault();
      event.stopPropagation();
      latest.current();
    };
    window.addEventListener('keydown', press, true);
    return () => window.removeEventListener('keydown', press, true);
  }, [active]);
}
