import { useDeferredValue, useMemo } from 'react';
import { useWorkbench, workbench } from '../../store/index.ts';
import { type SiteFinding, type Study, siteFindings } from '../../study/index.ts';

const none: readonly SiteFinding[] = [];

/** "1 error · 2 warnings"; remarks are counted where nothing graver is, and never called notes: those are the cards. */
export function findingCounts(findings: readonly SiteFinding[]): {
  error: string;
  warning: string;
  note: string;
} {
  const count = (severity: SiteFinding['severity'], word: string): string => {
    const { length } = findings.filter((finding) => finding.severity === severity);
    return length === 0 ? '' : `${length} ${word}${length === 1 ? '' : 's'}`;
  };
  return {
    error: count('error', 'error'),
    warning: count('warning', 'warning'),
    note: count('note', 'remark'),
  };
}

function toggle(): void {
  const { view, setMargin, setPlace } = workbench.getState();
  const open = view.margin === 'findings' && view.place === 'site';
  setPlace('site');
  setMargin(open ? null : 'findings');
}

/** How much is found about the site's data, quietly; a click opens the list in the margin. */
export function FindingsCount() {
  const study = useDeferredValue(useWorkbench((state): Study | null => state.study));
  const open = useWorkbench((state) => state.view.margin === 'findings' && state.view.place === 'site');
  const findings = useMemo(() => (study ? siteFindings(study) : none), [study]);
  if (findings.length === 0) return null;
  const { error, warning, note } = findingCounts(findings);
  return (
    <button
      type="button"
      className="findings-count"
      aria-expanded={open}
      title="What is missing or odd about the data (!)"
      onClick={toggle}
    >
      {error && <span data-severity="error">{error}</span>}
      {error && warning && ' · '}
      {warning && <span data-severity="warning">{warning}</span>}
      {!error && !warning && note}
      <span className="visually-hidden"> found about the data</span>
    </button>
  );
}
