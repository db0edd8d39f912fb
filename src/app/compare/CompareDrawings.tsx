import { type UIEvent, useMemo, useRef } from 'react';
import { type Layout, layoutStudy, StaticDrawing, screenPalette } from '../../drawing/index.ts';
import { useWorkbench } from '../../store/index.ts';
import { type Study, withBaseState } from '../../study/index.ts';
import type { CaseDossier } from '../../worker/index.ts';
import { useFitScale } from './useFitScale.ts';

interface Props {
  study: Study;
  a: CaseDossier;
  b: CaseDossier;
  names: { a: string; b: string };
}

/** The two drawings with their readings, in one layout; what one shows of itself the other shows as well. */
export function CompareDrawings({ study, a, b, names }: Props) {
  const layout = useMemo(() => layoutStudy(study), [study]);
  const panes = useRef<HTMLDivElement>(null);
  const follow = (event: UIEvent<HTMLElement>) => {
    const { scrollLeft, scrollTop } = event.currentTarget;
    for (const pane of panes.current?.querySelectorAll('.compare-paper') ?? [])
      if (pane !== event.currentTarget) pane.scrollTo(scrollLeft, scrollTop);
  };
  const based = withBaseState(study);
  return (
    <div ref={panes} className="compare-drawings">
      <Half study={based} layout={layout} dossier={a} letter="A" name={names.a} onScroll={follow} />
      <Half study={based} layout={layout} dossier={b} letter="B" name={names.b} onScroll={follow} />
    </div>
  );
}

interface HalfProps {
  study: Study;
  layout: Layout;
  dossier: CaseDossier;
  letter: string;
  name: string;
  onScroll(event: UIEvent<HTMLElement>): void;
}

function Half({ study, layout, dossier, letter, name, onScroll }: HalfProps) {
  const readingMode = useWorkbench((state) => state.view.readingMode);
  const order = useWorkbench((state) => state.view.order);
  const pane = useRef<HTMLElement>(null);
  const { scale, overflows } = useFitScale(pane, layout);
  const { solution } = dossier;
  return (
    <figure>
      <figcaption>
        <b>{letter}</b> {name}
        {!solution.converged && <span className="word-fail"> no solution: {solution.error}</span>}
      </figcaption>
      <section
        ref={pane}
        className="compare-paper"
        aria-label={`Drawing of ${name}`}
        tabIndex={overflows ? 0 : undefined}
        onScroll={onScroll}
      >
        <div style={{ zoom: scale }}>
          <StaticDrawing
            study={study}
            caseId={dossier.caseId}
            layout={layout}
            solution={solution}
            verdicts={dossier.verdicts}
            readingMode={readingMode}
            order={order}
            palette={screenPalette}
            title={`Single-line diagram, ${name}`}
          />
        </div>
      </section>
    </figure>
  );
}
