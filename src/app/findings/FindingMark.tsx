import { FLAG, FlagShape } from '../../drawing/index.ts';
import type { SiteFinding } from '../../study/index.ts';

const words: Record<SiteFinding['severity'], string> = {
  error: 'Error.',
  warning: 'Warning.',
  note: 'Remark.',
};

/** A finding's flag, as it stands beside its part on the drawing, with its word for a screen reader. */
export function FindingMark({ severity }: { severity: SiteFinding['severity'] }) {
  return (
    <span className="finding-mark" data-severity={severity}>
      <svg {...FLAG} viewBox={`0 0 ${FLAG.width} ${FLAG.height}`} aria-hidden="true">
        <FlagShape severity={severity} ink="currentColor" />
      </svg>
      <span className="visually-hidden">{words[severity]} </span>
    </span>
  );
}
