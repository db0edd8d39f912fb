import { useRef } from 'react';
import { type NoteSubject, noteLetters, pinSubject } from '../../charts/index.ts';
import type { Verdict } from '../../checks/index.ts';
import type { Pin } from '../../study/index.ts';

/** Letters tying notes to parts; a part keeps its letter while notes come and go. */
export function useLetters(pins: readonly Pin[], verdicts: readonly Verdict[]): ReadonlyMap<string, string> {
  const last = useRef<ReadonlyMap<string, string>>(new Map());
  const spoken: NoteSubject[] = [
    ...pins.map(pinSubject),
    ...verdicts.filter(({ verdict }) => verdict !== 'pass').map(({ subject }) => subject),
  ];
  last.current = noteLetters(spoken, last.current);
  return last.current;
}
