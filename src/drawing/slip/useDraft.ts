import { type RefObject, useCallback, useRef, useState } from 'react';

/**
 * Text being typed, null at rest: as state for drawing, and as it stands this moment. Enter takes the text and
 * moves the focus within one event; the leaving field must then know that nothing is left to take.
 */
export function useDraft(): [string | null, RefObject<string | null>, (draft: string | null) => void] {
  const [shown, setShown] = useState<string | null>(null);
  const now = useRef<string | null>(null);
  const set = useCallback((draft: string | null) => {
    now.current = draft;
    setShown(draft);
  }, []);
  return [shown, now, set];
}
