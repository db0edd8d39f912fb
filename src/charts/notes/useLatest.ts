import { type RefObject, useRef } from 'react';

/** The value of the latest render, behind a reference that never changes: callbacks read it when called. */
export function useLatest<T>(value: T): RefObject<T> {
  const latest = useRef(value);
  latest.current = value;
  return latest;
}
