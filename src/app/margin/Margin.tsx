import { useEffect, useRef } from 'react';
import { type Margin as Listed, useWorkbench, workbench } from '../../store/index.ts';
import type { Study } from '../../study/index.ts';
import { CaseMargin } from '../cases/CaseMargin.tsx';
import { FindingMargin } from '../findings/FindingMargin.tsx';
import { StatesMargin } from '../states/StatesMargin.tsx';
import './margin.css';

const lists: readonly [Exclude<Listed, null>, string][] = [
  ['cases', 'Cases'],
  ['findings', 'Findings'],
  ['states', 'States'],
];

function putAway(): void {
  workbench.getState().setMargin(null);
  document.querySelector<HTMLElement>('[data-drawing-pane] [tabindex="0"], [data-drawing-pane]')?.focus();
}

/** The paper's left margin: the cases with what differs in them, what is found about the site, or the worst over states and tolerances. It stays until put away. */
export function Margin({ study, onDetails }: { study: Study; onDetails(field: string | null): void }) {
  const listed = useWorkbench((state) => state.view.margin);
  const margin = useRef<HTMLElement>(null);
  useEffect(() => {
    // The list of cases takes the keyboard to the case on screen by itself.
    if (!listed || listed === 'cases') return;
    const list = margin.current?.querySelector<HTMLElement>('.margin-list [tabindex="0"]');
    (list ?? margin.current)?.focus({ preventScroll: true });
  }, [listed]);
  if (!listed) return null;
  const onKeyDown = (event: React.KeyboardEvent) => {
    if (event.key !== 'Escape' || event.defaultPrevented) return;
    event.stopPropagation();
    putAway();
  };
  return (
    <aside ref={margin} className="margin" aria-label="Margin" tabIndex={-1} onKeyDown={onKeyDown}>
      <header className="margin-head">
        {lists.map(([id, words]) => (
          <button
            key={id}
            type="button"
            aria-pressed={listed === id}
            onClick={() => workbench.getState().setMargin(id)}
          >
            {words}
          </button>
        ))}
        <button
          type="button"
          className="margin-close"
          aria-label="Put the margin away"
          title="Put away (Escape)"
          onClick={putAway}
        >
          ×
        </button>
      </header>
      {listed === 'cases' && <CaseMargin study={study} />}
      {listed === 'findings' && <FindingMargin study={study} onDetails={onDetails} />}
      {listed === 'states' && <StatesMargin study={study} />}
    </aside>
  );
}
