import { type RefObject, useEffect, useRef } from 'react';

/** Whether the latest input of the person was a key rather than the pointer. */
export function useKeyboardInput(): RefObject<boolean> {
  const byKey = useRef(false);
  useEffect(() => {
    const onKey = () => {
      byKey.current = true;
    };
    const onPointer = () => {
      byKey.current = false;
    };
    window.addEventListener('keydown', onKey, true);
    window.addEventListener('pointerdown', onPointer, true);
    return () => {
      window.removeEventListener('keydown', onKey, true);
      window.removeEventListener('pointerdown', onPointer, true);
    };
  }, []);
  return byKey;
}
