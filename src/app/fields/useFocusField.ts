import { useEffect } from 'react';

/** Puts the keyboard into a field as its form opens. */
export function useFocusField(id: string): void {
  useEffect(() => {
    document.getElementById(id)?.focus();
  }, [id]);
}
