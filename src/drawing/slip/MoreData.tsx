import { type ReactNode, useState } from 'react';

/** Which folds stand open, by kind of part; kept for the next slip and the next visit. */
const place = 'varwright.moreData';

function openFolds(): ReadonlySet<string> {
  try {
    return new Set((globalThis.localStorage?.getItem(place) ?? '').split(',').filter(Boolean));
  } catch {
    return new Set();
  }
}

function remember(kind: string, open: boolean): void {
  const folds = new Set(openFolds());
  if (open) folds.add(kind);
  else folds.delete(kind);
  try {
    globalThis.localStorage?.setItem(place, [...folds].join(','));
  } catch {
    // A browser that keeps nothing opens the next slip folded.
  }
}

/** The one fold of a slip: fields that seldom matter. It stays open or shut for its kind of part. */
export function MoreData({ kind, children }: { kind: string; children: ReactNode }) {
  const [open, setOpen] = useState(() => openFolds().has(kind));
  return (
    <details
      className="slip-more"
      open={open}
      onToggle={({ currentTarget }) => {
        setOpen(currentTarget.open);
        remember(kind, currentTarget.open);
      }}
    >
      <summary>more data</summary>
      {children}
    </details>
  );
}
