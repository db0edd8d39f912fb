import { type ReactNode, useCallback, useEffect, useId, useMemo, useRef, useState } from 'react';
import type { Verdict } from '../checks/index.ts';
import type { CaseSolution } from '../engine/index.ts';
import { type Edit, type Study, studyInCase } from '../study/index.ts';
import { DrawingContents } from './editor/DrawingContents.tsx';
import { EmptyHint } from './editor/EmptyHint.tsx';
import { HandOverlay } from './editor/HandOverlay.tsx';
import { ReadingModeChoice, ZoomTools } from './editor/PaneTools.tsx';
import { SlipHolder } from './editor/SlipHolder.tsx';
import { dropPlan, type Held } from './gestures/dropPlan.ts';
import type { TrayKind } from './gestures/TrayKind.ts';
import { useGestures } from './gestures/useGestures.ts';
import { Hatch } from './glyphs/Hatch.tsx';
import { useDrawingKeys } from './keyboard/useDrawingKeys.ts';
import { keepPlaces, type Layout, layoutStudy } from './layout/index.ts';
import type { ImpedanceProbe } from './readings/busReading.ts';
import { figuresOf } from './readings/figures.ts';
import { type ReadingMode, readOrder } from './readings/ReadingMode.ts';
import { busSubject, readSubject, type Subject } from './subject.ts';
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
  /** The subject of a hovered note. */
  lit?: Subject | null;
  armedKind: TrayKind | null;
  /** Changes when another study is opened: the drawing is fitted anew. */
  fitKey?: string;
  onSelect(items: readonly Subject[]): void;
  onFocusBus(bus: string): void;
  onOpenSlip(subject: Subject | null): void;
  onEdit(edit: Edit): void;
  onReadingMode(mode: ReadingMode): void;
  onArm(kind: TrayKind | null): void;
  onHover?(subject: Subject | null): void;
  renderSlip(subject: Subject): ReactNode;
  /** Stands on the paper of an empty study, under the three steps. */
  children?: ReactNode;
}

/** The single-line diagram as the editor: selection, drag and drop, zoom and pan, and the keyboard for all. */
export function Drawing(props: DrawingProps) {
  const { study, caseId, solution, verdicts, order, readingMode, probe = null, selection, armedKind } = props;
  const paneRef = useRef<HTMLDivElement>(null);
  const hatchId = `hatch${useId().replaceAll(':', '')}`;
  const layout = useSteadyLayout(study, props.layout);
  const inCase = useMemo(() => studyInCase(study, caseId), [study, caseId]);
  // The order plays no part in the two other readings: scrubbing then leaves the figures alone.
  const handle = readingMode === 'order' ? order : 1;
  const handleProbe = readingMode === 'order' ? probe : null;
  const figures = useMemo(
    () => figuresOf(inCase, solution, verdicts, readingMode, handle, handleProbe),
    [inCase, solution, verdicts, readingMode, handle, handleProbe],
  );
  const controls = usePaneView(paneRef, layout, props.fitKey ?? '');
  const [current, setCurrent] = useRovingFocus(paneRef, layout, selection, controls.panBy);
  const [moved, setMoved] = useState<Held | null>(null);
  // The armed kind is in the hand from the very press that armed it.
  const carried: Held | null = armedKind ? { what: 'new', kind: armedKind } : moved;
  const [aimed, setAimed] = useState<string | undefined>();
  const stands = (id: string | undefined) => layout.buses.some((bus) => bus.id === id);
  const target = [aimed, props.focusBus, layout.buses[0]?.id].find(stands);

  const onDrop = (edit: Edit, select: Subject | undefined) => {
    props.onEdit(edit);
    if (select) props.onSelect([select]);
    if (select) setCurrent(select);
  };
  const onPress = (subject: Subject | undefined, adding: boolean) => {
    if (!subject) {
      props.onSelect([]);
      props.onOpenSlip(null);
      return;
    }
    setCurrent(subject);
    const again = selection.length === 1 && selection[0] === subject;
    if (adding) {
      const without = selection.filter((item) => item !== subject);
      props.onSelect(without.length < selection.length ? without : [...selection, subject]);
      return;
    }
    props.onSelect([subject]);
    const read = readSubject(subject);
    if (read?.kind === 'bus') props.onFocusBus(read.id);
    if (again) props.onOpenSlip(subject);
    else if (props.openSlip !== null && props.openSlip !== subject) props.onOpenSlip(null);
  };
  const gestures = useGestures(paneRef, {
    study,
    layout,
    controls,
    armedKind,
    onArm: props.onArm,
    onDrop,
    onPress,
  });
  const onKeyDown = useDrawingKeys({
    ...props,
    layout,
    controls,
    current,
    carried,
    targetBus: target,
    setCurrent,
    setCarried: setMoved,
    setTarget: setAimed,
    cancelGesture: gestures.cancel,
    focusPane: () => paneRef.current?.focus({ preventScroll: true }),
    onDrop,
  });

  useEffect(() => {
    setMoved(null);
    if (!armedKind) return;
    paneRef.current?.focus({ preventScroll: true });
  }, [armedKind]);

  const { hand } = gestures;
  const plan =
    hand?.plan ??
    (carried ? dropPlan(study, layout, carried, target ? { bus: target } : OFF_PAPER) : undefined);
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
        aria-label="Single-line diagram: arrows move along it, Enter opens a part's data, M moves a part, F fits"
        tabIndex={current ? -1 : 0}
        onKeyDown={onKeyDown}
        onPointerOver={(event) => props.onHover?.(subjectOf(event.target))}
        onPointerLeave={() => props.onHover?.(null)}
        {...gestures.handlers}
      >
        <svg width="100%" height="100%" role="presentation">
          <Hatch id={hatchId} ink="var(--ink-2)" />
          <g transform={`translate(${x} ${y}) scale(${scale})`}>
            <DrawingContents
              layout={layout}
              figures={figures}
              letters={props.letters}
              selection={selection}
              current={current}
              lit={props.lit ?? null}
              held={hand?.held.what === 'part' ? hand.held.id : undefined}
              targetBus={hand ? hand.plan.bus : carried ? target : undefined}
              focusBus={props.focusBus}
              hatchId={hatchId}
            />
            {hand && <HandOverlay hand={hand} layout={layout} study={study} />}
          </g>
        </svg>
      </div>
      {empty && !hand && <EmptyHint>{props.children}</EmptyHint>}
      {!empty && (
        <ReadingModeChoice
          mode={readingMode}
          order={readOrder(order, solution?.maxOrder ?? study.maxOrder ?? 50)}
          onReadingMode={props.onReadingMode}
        />
      )}
      {props.stale && <span className="solving">solving</span>}
      {solution?.converged === false && !props.stale && (
        <p className="no-solution" role="alert">
          No solution in this case: {solution.error ?? 'the iteration did not settle'}
        </p>
      )}
      <output className="plan" aria-live="polite">
        {plan?.words ?? ''}
      </output>
      {!empty && <ZoomTools controls={controls} />}
      {slip && !hand && (
        <SlipHolder key={slip} subject={slip} layout={layout} figures={figures} controls={controls}>
          {props.renderSlip(slip)}
        </SlipHolder>
      )}
    </section>
  );
}

/** Where a carried part is while the study has no busbar to choose. */
const OFF_PAPER = { x: Number.NaN, y: Number.NaN };

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

/**
 * The part or busbar holding the drawing's one tab stop. It follows the selection made elsewhere, and takes
 * the keyboard focus along while the drawing has it.
 */
function useRovingFocus(
  paneRef: React.RefObject<HTMLElement | null>,
  layout: Layout,
  selection: readonly Subject[],
  panBy: (dx: number, dy: number) => void,
): [Subject | undefined, (subject: Subject) => void] {
  const [wished, setWished] = useState<Subject | undefined>();
  const known = (subject: Subject | undefined) => {
    const read = subject ? readSubject(subject) : undefined;
    const list = read?.kind === 'bus' ? layout.buses : layout.parts;
    return read !== undefined && list.some((place) => place.id === read.id);
  };
  const last = selection.at(-1);
  const [followed, setFollowed] = useState(last);
  if (followed !== last) {
    setFollowed(last);
    if (last) setWished(last);
  }
  const top = layout.buses[0];
  const current = known(wished) ? wished : top && busSubject(top.id);
  useEffect(() => {
    const pane = paneRef.current;
    if (!pane || !current || !pane.contains(document.activeElement)) return;
    const element = pane.querySelector<SVGGElement>(`[data-subject="${CSS.escape(current)}"]`);
    if (!element) return;
    element.focus({ preventScroll: true });
    const [seen, room] = [element.getBoundingClientRect(), pane.getBoundingClientRect()];
    const outside = (least: number, most: number, from: number, to: number) =>
      least < from ? from - least + 24 : most > to ? Math.max(to - most - 24, from - least + 24) : 0;
    const dx = seen.width > room.width ? 0 : outside(seen.left, seen.right, room.left, room.right);
    const dy = outside(seen.top, seen.bottom, room.top, room.bottom);
    if (dx !== 0 || dy !== 0) panBy(dx, dy);
  }, [current, paneRef, panBy]);
  return [current, useCallback((subject: Subject) => setWished(subject), [])];
}
