import { elementKinds } from '../fields/fieldsOf.ts';
import { kindWords } from '../names.ts';
import { isRecord } from './issue.ts';

type Noun = 'part' | 'busbar' | 'case' | 'spectrum' | 'scan';

/** A record in words for a finding: "transformer T1", "busbar Intake", "part 3" where it has neither. */
export function wordsFor(noun: Noun, record: unknown, index: number): string {
  if (!isRecord(record)) return `${noun} ${index}`;
  const kind = elementKinds.find((known) => known === record.kind);
  const word = noun === 'part' && kind ? kindWords[kind] : noun;
  const name = [record.name, record.id].find((item) => typeof item === 'string' && item.trim() !== '');
  return typeof name === 'string' ? `${word} ${name.trim()}` : `${word} ${index}`;
}
