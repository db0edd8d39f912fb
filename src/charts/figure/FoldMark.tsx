const WAYS = {
  right: 'M4,2.5l4.5,4.5l-4.5,4.5M11,2.5v9',
  left: 'M10,2.5l-4.5,4.5l4.5,4.5M3,2.5v9',
  down: 'M2.5,4l4.5,4.5l4.5,-4.5M2.5,11h9',
  up: 'M2.5,10l4.5,-4.5l4.5,4.5M2.5,3h9',
} as const;

/** An arrow against a bar: the panel folds, or opens, that way. */
export function FoldMark({ way }: { way: keyof typeof WAYS }) {
  return (
    <svg width={14} height={14} viewBox="0 0 14 14" aria-hidden="true">
      <path d={WAYS[way]} fill="none" stroke="currentColor" strokeWidth={1.5} strokeLinecap="round" />
    </svg>
  );
}
