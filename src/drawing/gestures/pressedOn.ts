import type { PointerEvent as ReactPointerEvent } from 'react';
import { elementById, isSeries, type Study } from '../../study/index.ts';
import { readSubject, type Subject, selectedIds } from '../subject.ts';
import type { Held } from './Held.ts';

export interface Pressed {
  subject?: Subject;
  /** What a drag from here takes into the hand; absent on busbars and on paper. */
  held?: Held;
}

/** What a press is on. A part among several selected ones takes them all along. */
export function pressedOn(event: ReactPointerEvent, study: Study, selection: readonly Subject[]): Pressed {
  if (!(event.target instanceof Element)) return {};
  const subject = event.target.closest('[data-subject]')?.getAttribute('data-subject') ?? undefined;
  const read = subject ? readSubject(subject) : undefined;
  if (!subject || read?.kind !== 'element') return subject ? { subject } : {};
  const endBus = event.target.closest('[data-end]')?.getAttribute('data-end');
  if (!endBus) {
    const ids = selection.includes(subject) ? selectedIds(selection).parts : [read.id];
    return { subject, held: { what: 'parts', ids, grip: read.id } };
  }
  const part = elementById(study, read.id);
  const end = part && isSeries(part) && part.from === endBus ? 'from' : 'to';
  return { subject, held: { what: 'end', id: read.id, end } };
}
