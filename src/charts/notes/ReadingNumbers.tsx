import type { ReadingNumber } from './readingNumbers.ts';

/** Labelled numbers of a reading; units in lighter ink, the formula as a tooltip. */
export function ReadingNumbers({ numbers }: { numbers: readonly ReadingNumber[] }) {
  return (
    <dl className="reading-numbers">
      {numbers.map((one) => (
        <div key={one.label} title={one.formula}>
          <dt>{one.label}</dt>
          <dd>
            {one.parts.number}
            {one.parts.unit && <span className="unit"> {one.parts.unit}</span>}
            {one.words && <span className="words"> {one.words}</span>}
          </dd>
        </div>
      ))}
    </dl>
  );
}
