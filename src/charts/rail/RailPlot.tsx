import { type HTMLAttributes, type KeyboardEvent, type RefObject, useEffect, useMemo, useRef } from 'react';
import { SCREEN_STYLE } from '../figure/figureInk.ts';
import { useMeasuredWidth } from '../figure/useMeasuredWidth.ts';
import type { Injection } from './injections.ts';
import { type OrderDomain, revealOrder } from './orderAxis.ts';
import { RailHandle, RailHandleLine } from './RailHandle.tsx';
import { RailAxis, RailCurrents, RailCurves, RailFlags, RailInjected } from './RailLandscape.tsx';
import { railLayout } from './railLayout.ts';
import { type PeakVerdict, type RailBand, type RailScan, railModel } from './railModel.ts';
import type { Probe } from './railWords.ts';
import { useRailGestures } from './useRailGestures.ts';

interface RailPlotProps {
  scan: RailScan | null;
  frequencyHz: number;
  order: number;
  injected: readonly Injection[];
  stale: boolean;
  band?: RailBand;
  peakVerdicts?: readonly PeakVerdict[];
  height: number;
  view: OrderDomain;
  full: OrderDomain;
  /** Impedance at the handle, solved or read off the scan. */
  probe: Probe | null;
  exact: boolean;
  /** The slider's role, values and keys. */
  slider: HTMLAttributes<HTMLDivElement>;
  onOrder(order: number): void;
  onView(view: OrderDomain): void;
}

const NO_VERDICTS: readonly PeakVerdict[] = [];

/** The landscape with the handle riding on it: dragged, zoomed, panned and pinched. */
export function RailPlot(props: RailPlotProps) {
  const { scan, frequencyHz, order, injected, band, view, full, height, onOrder, onView } = props;
  const peakVerdicts = props.peakVerdicts ?? NO_VERDICTS;
  const [plot, width] = useMeasuredWidth<HTMLDivElement>(1280);
  const layout = useMemo(() => railLayout(width, height, SCREEN_STYLE.smallSize), [width, height]);
  const model = useMemo(
    () => railModel({ scan, frequencyHz, injected, band, peakVerdicts }, view, layout, SCREEN_STYLE),
    [scan, frequencyHz, injected, band, peakVerdicts, view, layout],
  );
  const { handlers, cancel } = useRailGestures({ plot, model, order, view, full, onOrder, onView });
  useHandleKeptInView(order, view, full, onView);
  const keys = {
    onKeyDown: (event: KeyboardEvent<HTMLDivElement>) => {
      if (event.key === 'Escape' && cancel()) event.preventDefault();
      else props.slider.onKeyDown?.(event);
    },
  };
  return (
    <div
      ref={plot}
      className={props.stale ? 'rail-plot stale' : 'rail-plot'}
      {...props.slider}
      {...handlers}
      {...keys}
      style={{ height }}
    >
      <svg width={width} height={height} aria-hidden="true">
        <RailAxis model={model} style={SCREEN_STYLE} />
        <RailInjected model={model} style={SCREEN_STYLE} />
        <RailCurves model={model} style={SCREEN_STYLE} />
        <RailHandleLine model={model} style={SCREEN_STYLE} order={order} />
        <RailCurrents model={model} style={SCREEN_STYLE} />
        <RailFlags model={model} style={SCREEN_STYLE} frequencyHz={frequencyHz} />
        <RailHandle
          model={model}
          style={SCREEN_STYLE}
          order={order}
          frequencyHz={frequencyHz}
          probe={props.probe}
          exact={props.exact}
        />
      </svg>
    </div>
  );
}

/** A handle moved beyond a zoomed view draws the view after it. */
function useHandleKeptInView(
  order: number,
  view: OrderDomain,
  full: OrderDomain,
  changeView: (view: OrderDomain) => void,
) {
  const lastOrder: RefObject<number> = useRef(order);
  useEffect(() => {
    if (lastOrder.current === order) return;
    lastOrder.current = order;
    const shown = revealOrder(view, full, order);
    if (shown !== view) changeView(shown);
  }, [order, view, full, changeView]);
}
