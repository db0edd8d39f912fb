import { useState } from 'react';
import type { ReadingFace } from './cardNumbers.ts';
import type { NoteState } from './NoteFrame.tsx';

export interface NoteStates {
  stateOf(key: string): NoteState;
  toggle(key: string): void;
  /** A lens is one alone: widening a note narrows the one before it. */
  widen(key: string): void;
  /** Opens a note where it is a line. */
  open(key: string): void;
  faceOf(key: string): ReadingFace;
  turn(key: string): void;
}

/** Which notes are lines, cards or the lens, and which picture each card shows; `first` says how one begins. */
export function useNoteStates(
  first: (key: string) => NoteState,
  firstFace: (key: string) => ReadingFace,
): NoteStates {
  const [states, setStates] = useState<ReadonlyMap<string, NoteState>>(new Map());
  const [faces, setFaces] = useState<ReadonlyMap<string, ReadingFace>>(new Map());
  const stateOf = (key: string) => states.get(key) ?? first(key);
  const faceOf = (key: string) => faces.get(key) ?? firstFace(key);
  const put = (key: string, state: NoteState) => {
    const others = [...states].map(([other, is]) => [other, is === 'lens' ? 'card' : is] as const);
    setStates(new Map(state === 'lens' ? others : states).set(key, state));
  };
  return {
    stateOf,
    faceOf,
    toggle: (key) => put(key, stateOf(key) === 'line' ? 'card' : 'line'),
    widen: (key) => put(key, stateOf(key) === 'lens' ? 'card' : 'lens'),
    open: (key) => {
      if (stateOf(key) === 'line') put(key, 'card');
    },
    turn: (key) => setFaces(new Map(faces).set(key, faceOf(key) === 'course' ? 'spectrum' : 'course')),
  };
}
