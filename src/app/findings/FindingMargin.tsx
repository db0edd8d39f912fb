import { type KeyboardEvent, useDeferredValue, useMemo, useRef, useState } from 'react';
import { workbench } from '../../store/index.ts';
import { type SiteFinding, type Study, siteFindings } from '../../study/index.ts';
import { FindingRow } from './FindingRow.tsx';
import { jumpToFinding } from './jumpToFinding.ts';
import './findings.css';

interface Props {
  study: Study;
  /** For findings about the study as a whole: the field among its details. */
  onDetails(field: string | null): void;
}

const sections: readonly { severity: SiteFinding['severity']; title: string; words: string }[] = [
  { severity: 'error', title: 'Errors', words: 'results are worthless until they are mended' },
  { severity: 'warning', title: 'Warnings', words: 'a result is in doubt, or missing' },
  { severity: 'note', title: 'Remarks', words: 'worth knowing; no result is wrong by them' },
];

/** Everything missing or odd about the site, gravest first; each entry leads to its part and field, or mends itself. */
export function FindingMargin({ study, onDetails }: Props) {
  // An edit is drawn before what it means is listed.
  const shown = useDeferredValue(study);
  const findings = useMemo(() => siteFindings(shown), [shown]);
  const [focused, setFocused] = useState<string | null>(null);
  const list = useRef<HTMLDivElement>(null);
  const keys = findings.map(({ key }) => key);
  const tabStop = focused !== null && keys.includes(focused) ? focused : keys[0];
  const walk = (event: KeyboardEvent) => {
    const at = keys.indexOf(tabStop ?? '');
    const steps: Record<string, number> = {
      ArrowDown: at + 1,
      ArrowUp: at - 1,
      Home: 0,
      End: keys.length - 1,
    };
    const to = steps[event.key];
    const next = to === undefined ? undefined : keys[Math.max(0, Math.min(keys.length - 1, to))];
    if (next === undefined) return;
    event.preventDefault();
    list.current?.querySelector<HTMLElement>(`[data-finding="${CSS.escape(next)}"] .finding-jump`)?.focus();
  };
  const repair = (finding: SiteFinding) => {
    if (!finding.repair) return;
    const next = keys[keys.indexOf(finding.key) + 1] ?? keys[keys.indexOf(finding.key) - 1] ?? null;
    workbench.getState().edit(finding.repair);
    setFocused(next);
    // What was mended goes from the list; the keyboard goes on to its neighbour.
    requestAnimationFrame(() =>
      list.current?.querySelector<HTMLElement>('.finding-jump[tabindex="0"]')?.focus(),
    );
  };
  return (
    <div ref={list} className="margin-list">
      {findings.length === 0 && (
        <p className="quiet-line">
          Nothing found: every part is fed, rated for its busbar and covered by the cases.
        </p>
      )}
      {sections.map(({ severity, title, words }) => {
        const own = findings.filter((finding) => finding.severity === severity);
        if (own.length === 0) return null;
        return (
          <section key={severity} aria-label={title}>
            <h3>
              {title} <span className="quiet">{own.length}</span>
            </h3>
            {words && <p className="quiet-line">{words}</p>}
            <ul className="finding-list">
              {own.map((finding) => (
                <FindingRow
                  key={finding.key}
                  finding={finding}
                  tabStop={finding.key === tabStop}
                  onFocus={() => setFocused(finding.key)}
                  onWalk={walk}
                  onJump={() => jumpToFinding(shown, finding, onDetails)}
                  onRepair={() => repair(finding)}
                />
              ))}
            </ul>
          </section>
        );
      })}
    </div>
  );
}
