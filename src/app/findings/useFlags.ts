import { useDeferredValue, useMemo } from 'react';
import { type FlagSeverity, partSubject, type Subject } from '../../drawing/index.ts';
import { type Study, siteFindings } from '../../study/index.ts';

/** The gravest error or warning about each part's data in a case; remarks fly no flag. */
export function useFlags(study: Study, caseId: string): ReadonlyMap<Subject, FlagSeverity> {
  // An edit is drawn before what it means is flagged.
  const shown = useDeferredValue(study);
  return useMemo(() => {
    const flags = new Map<Subject, FlagSeverity>();
    for (const { subject, severity, cases } of siteFindings(shown)) {
      if (subject?.kind !== 'element' || severity === 'note') continue;
      if (cases.length > 0 && !cases.includes(caseId)) continue;
      const key = partSubject(subject.id);
      if (flags.get(key) !== 'error') flags.set(key, severity);
    }
    return flags;
  }, [shown, caseId]);
}
