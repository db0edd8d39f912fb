import {
  type Bus,
  originTally,
  type Study,
  type StudyElement,
  type OriginTally as Tally,
} from '../../study/index.ts';

export interface OriginTallyProps {
  study: Study;
  owner: StudyElement | Bus;
  /** Takes all typical values for nameplate data; absent where there is nothing to confirm. */
  onConfirm?: () => void;
}

const spoken: readonly (readonly [keyof Tally, string])[] = [
  ['typical', 'typical'],
  ['assumed', 'assumed'],
  ['notStated', 'of no stated origin'],
];

/** How many values of a record still want a source, at a glance, and one press to confirm the typical ones. */
export function OriginTally({ study, owner, onConfirm }: OriginTallyProps) {
  const tally = originTally(study, owner);
  const open = spoken.filter(([word]) => tally[word] > 0);
  const stated = tally.measured + tally.nameplate;
  if (open.length === 0 && stated === 0) return null;
  return (
    <p className="slip-tally">
      {open.length === 0 && 'Every value measured or from the nameplate.'}
      {open.map(([word, words], index) => (
        <span key={word} data-origin={word}>
          {index > 0 && ' · '}
          <b>{tally[word]}</b> {words}
        </span>
      ))}
      {tally.typical > 0 && onConfirm && (
        <button type="button" className="slip-small" onClick={onConfirm}>
          Confirm as nameplate
        </button>
      )}
    </p>
  );
}
