import type { KeyboardEvent } from 'react';
import { Formula } from '../../drawing/index.ts';
import type { SiteFinding } from '../../study/index.ts';
import { FindingMark } from './FindingMark.tsx';

interface Props {
  finding: SiteFinding;
  tabStop: boolean;
  onFocus(): void;
  /** Arrow keys, Home and End: on to another finding. */
  onWalk(event: KeyboardEvent): void;
  onJump(): void;
  onRepair(): void;
}

/** One finding: what is so, what would mend it, the way to its part, and the mend itself where only one is meant. */
export function FindingRow({ finding, tabStop, onFocus, onWalk, onJump, onRepair }: Props) {
  const { message, mend, repair, severity } = finding;
  const [, where, text] = /^([^:]{1,80}): (.*)$/s.exec(message) ?? [null, null, message];
  return (
    <li className="finding" data-finding={finding.key} data-severity={severity}>
      <button
        type="button"
        className="finding-jump"
        tabIndex={tabStop ? 0 : -1}
        onFocus={onFocus}
        onKeyDown={onWalk}
        onClick={onJump}
      >
        <FindingMark severity={severity} />
        <span>
          {where && <b>{where.charAt(0).toUpperCase() + where.slice(1)}: </b>}
          <Formula text={where ? (text ?? '') : message} />
        </span>
      </button>
      <p className="finding-mend">
        <span className="quiet">Mend: </span>
        <Formula text={mend} />
      </p>
      {repair && (
        <button
          type="button"
          className="small-button"
          tabIndex={tabStop ? 0 : -1}
          onFocus={onFocus}
          onKeyDown={onWalk}
          onClick={onRepair}
        >
          {repair.words}
        </button>
      )}
    </li>
  );
}
