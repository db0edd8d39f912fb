import type { SiteFinding } from '../../study/index.ts';

const words: Record<SiteFinding['severity'], string> = {
  error: 'Error.',
  warning: 'Warning.',
  note: 'Remark.',
};

/**
 * A finding's mark: a flag, as one sticks on a drawing; filled with a stroke for an error, open with a stroke for a
 * warning, open and empty for a note. No verdict has this shape.
 */
export function FindingMark({ severity }: { severity: SiteFinding['severity'] }) {
  return (
    <span className="finding-mark" data-severity={severity}>
      <svg width="14" height="16" viewBox="0 0 14 16" aria-hidden="true">
        <path d="M2 15V1.5" stroke="currentColor" strokeWidth="1.5" fill="none" />
        <path
          d="M2 2H12.5L9.5 5.75L12.5 9.5H2Z"
          stroke="currentColor"
          strokeWidth="1.3"
          strokeLinejoin="round"
          fill={severity === 'error' ? 'currentColor' : 'none'}
        />
        {severity === 'warning' && (
          <path d="M5.5 3.8V6M5.5 7.2V8.2" stroke="currentColor" strokeWidth="1.3" />
        )}
      </svg>
      <span className="visually-hidden">{words[severity]} </span>
    </span>
  );
}
