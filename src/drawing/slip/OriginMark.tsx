import type { DataOrigin } from '../../study/index.ts';

type Word = DataOrigin['origin'];

const words: readonly Word[] = ['nameplate', 'measured', 'typical', 'assumed'];

/** One letter for where a value comes from; nothing where nobody has said. */
export const originLetters: Readonly<Record<Word, string>> = {
  nameplate: 'N',
  measured: 'M',
  typical: 'T',
  assumed: 'A',
};

export interface OriginMarkProps {
  id: string;
  label: string;
  origin: DataOrigin | undefined;
  onChange(origin: DataOrigin | null): void;
}

/** The origin with another word; a note and a date stay, and go with the origin itself. */
export function withOriginWord(origin: DataOrigin | undefined, word: string): DataOrigin | null {
  const chosen = words.find((one) => one === word);
  return chosen ? { ...origin, origin: chosen } : null;
}

/**
 * Where a value comes from, as one letter, chosen from a list: by mouse, or on the focused mark by the first
 * letter of the word.
 */
export function OriginMark({ id, label, origin, onChange }: OriginMarkProps) {
  const word = origin?.origin ?? '';
  const detail = [origin?.origin ?? 'not stated', origin?.date, origin?.note].filter(Boolean).join(', ');
  return (
    <span className="slip-origin" data-origin={word || 'none'} title={`Origin: ${detail}`}>
      <span aria-hidden="true">{origin ? originLetters[origin.origin] : ''}</span>
      <select
        id={id}
        aria-label={`Origin of ${label}`}
        value={word}
        onChange={(event) => onChange(withOriginWord(origin, event.target.value))}
      >
        <option value="">not stated</option>
        {words.map((one) => (
          <option key={one} value={one}>
            {one}
          </option>
        ))}
      </select>
    </span>
  );
}
