import { useEffect, useRef } from 'react';

/**
 * While a gesture is under way, Escape, the right button, a cancelled pointer and the loss of the window give it up; the key
 * and the button mean nothing else then.
 */
export function useAbandon(active: boolean, abandon: () => void): void {
  const latest = useRef(abandon);
  latest.current = abandon;
  const abandoned = useRef(false);
  useEffect(() => {
    if (!active) return;
    const giveUp = () => latest.current();
    const onKey = (event: KeyboardEvent) => {
      if (event.key !== 'Escape') return;
      event.preventDefault();
      event.stopPropagation();
      giveUp();
    };
    const onMouse = (event: MouseEvent) => {
      if (event.button !== 2) return;
      abandoned.current = true;
      giveUp();
    };
    window.addEventListener('keydown', onKey, true);
    window.addEventListener('mousedown', onMouse, true);
    window.addEventListener('blur', giveUp);
    window.addEventListener('pointercancel', giveUp);
    return () => {
      window.removeEventListener('keydown', onKey, true);
      window.removeEventListener('mousedown', onMouse, true);
      window.removeEventListener('blur', giveUp);
      window.removeEventListener('pointercancel', giveUp);
    };
  }, [active]);
  useEffect(() => {
    // The menu of the right button that gave a gesture up comes after it.
    const onMenu = (event: Event) => {
      if (abandoned.current) event.preventDefault();
      abandoned.current = false;
    };
    window.addEventListener('contextmenu', onMenu, true);
    return () => window.removeEventListener('contextmenu', onMenu, true);
  }, []);
}
