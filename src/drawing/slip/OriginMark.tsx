import type { DataOrigin } from '../../study/index.ts';

type Word = DataOrigin['origin'];

const marks: Readonly<Record<Word, string>> = { nameplate: 'N', measured: 'M', typical: 'T', assumed: 'A' };
const order: readonly (Word | null)[] = [null, 'nameplate', 'measured', 'typical', 'assumed'];

export interface OriginMarkProps {
  label: string;
  origin: DataOrigin | undefined;
  onChange(origin: DataOrigin | null): void;
}

/** The next origin in the round: not stated, nameplate, measured, typical, assumed. A note and date stay. */
export function nextOrigin(origin: DataOrigin | undefined): DataOrigin | null {
  const index = order.indexOf(origin?.origin ?? null);
  const word = order[(index + 1) % order.length] ?? null;
  return word === null ? null : { ...origin, origin: word };
}

/** Where a value comes from, as one letter; a press goes to the next. */
export function OriginMark({ label, origin, onChange }: OriginMarkProps) {
  const word = origin?.origin ?? 'not stated';
  const detail = [word, origin?.date, origin?.note].filter(Boolean).join(', ');
  return (
    <button
      type="button"
      className="slip-origin"
      data-origin={origin?.origin ?? 'none'}
      title={`Origin: ${detail}. N nameplate, M measured, T typical, A assumed.`}
      aria-label={`Origin of ${label}: ${detail}`}
      onClick={() => onChange(nextOrigin(origin))}
    >
      {origin ? marks[origin.origin] : '·'}
    </button>
  );
}
