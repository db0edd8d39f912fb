import { type ReactNode, useId, useMemo, useRef } from 'react';
import type { Verdict } from '../checks/index.ts';
import type { CaseSolution } from '../engine/index.ts';
import {
  type Chosen,
  countedTogether,
  type Edit,
  type MarkKind,
  type Study,
  studyInCase,
} from '../study/index.ts';
import { DrawingContents } from './editor/DrawingContents.tsx';
import { DrawnMenu } from './editor/DrawnMenu.tsx';
import { EmptyHint } from './editor/EmptyHint.tsx';
import { HandOverlay, PlaceMark } from './editor/HandOverlay.tsx';
import { HandTag, KeyLine } from './editor/HandTag.tsx';
import { ReadingModeChoice, ZoomTools } from './editor/PaneTools.tsx';
import { SlipHolder } from './editor/SlipHolder.tsx';
import type { TrayKind } from './gestures/TrayKind.ts';
import type { Band } from './gestures/useGestures.ts';
import type { FlagSeverity } from './glyphs/FindingFlag.tsx';
import { Hatch } from './glyphs/Hatch.tsx';
import { useClipboard } from './keyboard/useClipboard.ts';
import { useHandling } from './keyboard/useHandling.ts';
import { useRovingFocus } from './keyboard/useRovingFocus.ts';
import { differencesByPart, keepPlaces, type Layout, layoutStudy } from './layout/index.ts';
import { drawingSize } from './marks/drawingSize.ts';
import { MarkTools } from './marks/MarkTools.tsx';
import { useMarks } from './marks/useMarks.tsx';
import type { ImpedanceProbe } from './readings/busReading.ts';
import { figuresOf } from './readings/figures.ts';
import { type ReadingMode, readOrder } from './readings/ReadingMode.ts';
import { type Subject, selectedIds } from './subject.ts';
import { usePaneView } from './view/usePaneView.ts';

export interface DrawingProps {
  study: Study;
  caseId: string;
  /** Computed from the study when absent. */
  layout?: Layout;
  solution: CaseSolution | null;
  /** The solution is older than the study on screen. */
  stale: boolean;
  verdicts: readonly Verdict[];
  /** Busbar under the rail; '' for none. */
  focusBus: string;
  /** h of the rail's handle. */
  order: number;
  readingMode: ReadingMode;
  /** Impedance at every busbar at the handle. */
  probe?: ImpedanceProbe | null;
  selection: readonly Subject[];
  openSlip: Subject | null;
  /** Letters of the notes by the subject they speak of. */
  letters: ReadonlyMap<Subject, string>;
  /** The gravest finding about the data of a part, by subject. */
  flags?: ReadonlyMap<Subject, FlagSeverity>;
  /** The subject of a hovered note. */
  lit?: Subject | null;
  armedKind: TrayKind | null;
  /** The mark to be placed next. */
  armedMark: MarkKind | null;
  /** Changes when another study is opened: the drawing is fitted anew. */
  fitKey?: string;
  onSelect(items: readonly Subject[]): void;
  onFocusBus(bus: string): void;
  onOpenSlip(subject: Subject | null): void;
  onEdit(edit: Edit, said?: string): void;
  /** Takes chosen parts and busbars away; whoever holds the study asks first where more hangs from them. */
  onRemove(chosen: Chosen): void;
  /** Something the person should read once, beside the drawing. */
  onSay(words: string): void;
  /** What was said last; null for nothing. */
  said?: string | null;
  onReadingMode(mode: ReadingMode): void;
  onArm(kind: TrayKind | null): void;
  onArmMark(kind: MarkKind | null): void;
  onHover?(subject: Subject | null): void;
  renderSlip(subject: Subject): ReactNode;
  /** Stands on the paper of an empty study, under the three steps. */
  children?: ReactNode;
}

const NO_FLAGS: ReadonlyMap<Subject, FlagSeverity> = new Map();

/** The single-line diagram as the editor: selection, drag and drop, zoom and pan, and the keyboard for all. */
export function Drawing(props: DrawingProps) {
  const { study, caseId, solution, verdicts, order, readingMode, probe = null, selection, armedKind } = props;
  const paneRef = useRef<HTMLDivElement>(null);
  const hatchId = `hatch${useId().replaceAll(':', '')}`;
  const layout = useSteadyLayout(study, props.layout);
  const inCase = useMemo(() => studyInCase(study, caseId), [study, caseId]);
  const beside = useMemo(
    () => ({ base: study, differences: differencesByPart(study, caseId) }),
    [study, caseId],
  );
  // The order plays no part in the two other readings: scrubbing then leaves the figures alone.
  const handle = readingMode === 'order' ? order : 1;
  const handleProbe = readingMode === 'order' ? probe : null;
  const figures = useMemo(
    () => figuresOf(inCase, solution, verdicts, readingMode, handle, handleProbe, beside),
    [inCase, solution, verdicts, readingMode, handle, handleProbe, beside],
  );
  const size = useMemo(() => drawingSize(study, layout), [study, layout]);
  const controls = usePaneView(paneRef, size, props.fitKey ?? '');
  const roving = useRovingFocus(paneRef, layout, selection, controls);
  const [current] = roving;
  const { hand, band, handlers, act, plan, held, keyHints } = useHandling(
    paneRef,
    props,
    layout,
    controls,
    roving,
  );
  const shownSelection = useMemo(
    () => (band ? [...new Set([...selection, ...band.picks])] : selection),
    [selection, band],
  );
  useClipboard(paneRef, { ...props, layout, current });

  const marks = useMarks({
    study,
    layout,
    controls,
    paneRef,
    current,
    armed: props.armedMark,
    onArm: props.onArmMark,
    onEdit: props.onEdit,
  });
  const empty = study.buses.length === 0 && study.elements.length === 0;
  const far = controls.view.scale < 0.45;
  const { scale, x, y } = controls.view;
  const classes = ['drawing', props.stale && 'stale', far && 'far', hand && 'handling', armedKind && 'armed'];
  const slip = props.openSlip;
  return (
    <section className={classes.filter(Boolean).join(' ')} aria-label="Single-line diagram">
      <div
        ref={paneRef}
        className="pane"
        data-drawing-pane=""
        role="application"
        aria-label="Single-line diagram: arrows move along it, Enter opens a part's data, letters add parts, ? shows the keys"
        tabIndex={current ? -1 : 0}
        onKeyDown={act}
        onPointerOver={(event) => props.onHover?.(subjectOf(event.target))}
        onPointerLeave={() => props.onHover?.(null)}
        {...handlers}
      >
        <svg width="100%" height="100%" role="presentation">
          <Hatch id={hatchId} ink="var(--ink-2)" />
          <g transform={`translate(${x} ${y}) scale(${scale})`}>
            <DrawingContents
              layout={layout}
              figures={figures}
              letters={props.letters}
              flags={props.flags ?? NO_FLAGS}
              selection={shownSelection}
              current={current}
              lit={props.lit ?? null}
              held={held}
              targetBus={plan?.bus}
              focusBus={props.focusBus}
              hatchId={hatchId}
            />
            {marks.onPaper}
            {plan && <PlaceMark plan={plan} layout={layout} />}
            {hand && <HandOverlay hand={hand} layout={layout} study={study} />}
            {band && <rect className="band" {...band.box} />}
          </g>
        </svg>
      </div>
      {empty && !hand && <EmptyHint>{props.children}</EmptyHint>}
      {!empty && (
        <div className="drawing-tools">
          <ReadingModeChoice
            mode={readingMode}
            order={readOrder(order, solution?.maxOrder ?? study.maxOrder ?? 50)}
            onReadingMode={props.onReadingMode}
          />
          <DrawnMenu study={study} onEdit={props.onEdit} />
        </div>
      )}
      {props.stale && <span className="solving">solving</span>}
      {solution?.converged === false && !props.stale && (
        <p className="no-solution" role="alert">
          No solution in this case: {solution.error ?? 'the iteration did not settle'}
        </p>
      )}
      <output className={plan ? 'plan at-hand' : 'plan'} aria-live="polite">
        {plan?.words ?? bandWords(band) ?? props.said ?? ''}
      </output>
      {plan && <HandTag plan={plan} at={hand?.at} {...{ layout, controls }} />}
      <KeyLine hints={hand ? [] : keyHints} />
      {!empty && <MarkTools armed={props.armedMark} onArm={props.onArmMark} />}
      {!empty && <ZoomTools controls={controls} />}
      {marks.overPaper}
      {slip && !hand && (
        <SlipHolder key={slip} subject={slip} layout={layout} figures={figures} controls={controls}>
          {props.renderSlip(slip)}
        </SlipHolder>
      )}
    </section>
  );
}

function subjectOf(target: EventTarget): Subject | null {
  const found = target instanceof Element ? target.closest('[data-subject]') : null;
  return found?.getAttribute('data-subject') ?? null;
}

/** The layout of the study, keeping the places that did not change. */
function useSteadyLayout(study: Study, given: Layout | undefined): Layout {
  const before = useRef<Layout | undefined>(undefined);
  return useMemo(() => {
    const next = keepPlaces(before.current, given ?? layoutStudy(study));
    before.current = next;
    return next;
  }, [study, given]);
}

/** How much a rubber band holds. */
function bandWords(band: Band | null): string | undefined {
  if (!band) return undefined;
  const { parts, buses } = selectedIds(band.picks);
  return (
    countedTogether([
      [parts.length, 'part'],
      [buses.length, 'busbar'],
    ]) || 'nothing in the band yet'
  );
}
