import type { Pin } from '../../study/index.ts';

/** The part or busbar a note speaks of. */
export interface NoteSubject {
  kind: 'element' | 'bus';
  id: string;
}

export function subjectKey(subject: NoteSubject): string {
  return `${subject.kind}:${subject.id}`;
}

/** What a pin speaks of: the busbar of a voltage, the part of a current. */
export function pinSubject(pin: Pin): NoteSubject {
  return pin.quantity === 'voltage' ? { kind: 'bus', id: pin.bus } : { kind: 'element', id: pin.element };
}

export function pinKey(pin: Pin): string {
  return pin.quantity === 'voltage' ? `voltage|${pin.bus}` : `current|${pin.element}|${pin.bus}`;
}

/**
 * A letter for each subject that has a note: a, b, c … z, aa, ab … in the order given, one letter a subject.
 * A subject that had a letter in `previous` keeps it, so that letters do not wander on the drawing while
 * verdicts change places. Keys are `subjectKey`s.
 */
export function noteLetters(
  subjects: readonly NoteSubject[],
  previous: ReadonlyMap<string, string> = new Map(),
): Map<string, string> {
  const keys = [...new Set(subjects.map(subjectKey))];
  const taken = new Set(keys.map((key) => previous.get(key)).filter((letter) => letter !== undefined));
  const letters = new Map<string, string>();
  let next = 0;
  for (const key of keys) {
    let letter = previous.get(key);
    while (letter === undefined) {
      const candidate = letterAt(next++);
      if (!taken.has(candidate)) letter = candidate;
    }
    letters.set(key, letter);
  }
  return letters;
}

/** 0 → a, 25 → z, 26 → aa. */
function letterAt(index: number): string {
  const last = String.fromCharCode(97 + (index % 26));
  return index < 26 ? last : letterAt(Math.floor(index / 26) - 1) + last;
}
