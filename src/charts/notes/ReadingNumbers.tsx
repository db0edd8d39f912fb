import type { ReadingNumber } from './readingNumbers.ts';

const ROWS = [1, 2, 3] as const;

/** Labelled numbers of a reading, line by line; units in lighter ink, the formula as a tooltip. */
export function ReadingNumbers({ numbers }: { numbers: readonly ReadingNumber[] }) {
  return (
    <div className="reading-numbers">
      {ROWS.map((row) => {
        const members = numbers.filter((one) => one.row === row);
        return members.length > 0 && <NumberRow key={row} numbers={members} />;
      })}
    </div>
  );
}

function NumberRow({ numbers }: { numbers: readonly ReadingNumber[] }) {
  return (
    <dl>
      {numbers.map((one) => (
        <div key={one.label} title={one.formula}>
          <dt>{one.label}</dt>
          <dd>
            <NumberParts number={one} />
          </dd>
        </div>
      ))}
    </dl>
  );
}

/** A number, its unit in lighter ink, and the words beside it. */
export function NumberParts({ number }: { number: ReadingNumber }) {
  const { parts, words } = number;
  return (
    <>
      {parts.number}
      {parts.unit && <span className="unit"> {parts.unit}</span>}
      {words && <span className="words"> {words}</span>}
    </>
  );
}
