import { type KeyboardEvent, useCallback, useEffect, useMemo, useRef, useState } from 'react';
import { SCREEN_STYLE } from '../figure/figureInk.ts';
import { useMeasuredWidth } from '../figure/useMeasuredWidth.ts';
import { impedanceAt } from './impedanceCurve.ts';
import type { Injection } from './injections.ts';
import { OrderEntryField } from './OrderEntryField.tsx';
import { clampOrder, type OrderDomain, revealOrder, zoomDomain } from './orderAxis.ts';
import { RailHandle, RailHandleLine } from './RailHandle.tsx';
import { RailAxis, RailCurves, RailFlags, RailInjected } from './RailLandscape.tsx';
import { RailStrip } from './RailStrip.tsx';
import { railKeyAction } from './railKeys.ts';
import { railLayout } from './railLayout.ts';
import { fullDomain, type PeakVerdict, type RailBand, type RailScan, railModel } from './railModel.ts';
import { handleValueText, type Probe } from './railWords.ts';
import { useRailGestures } from './useRailGestures.ts';

export interface FrequencyRailProps {
  /** The busbar looked at. */
  busName: string;
  scan: RailScan | null;
  frequencyHz: number;
  maxOrder: number;
  /** Where the handle stands, any real order. */
  order: number;
  /** Exact impedance at the handle; without it the scan is interpolated. */
  probe: Probe | null;
  injected: readonly Injection[];
  summation: 'phasor' | 'alpha';
  sequence: 'positive' | 'zero';
  /** The scan belongs to an earlier state of the study. */
  stale: boolean;
  band?: RailBand;
  /** Verdicts on peaks, matched by order; a failing one is drawn so. */
  peakVerdicts?: readonly PeakVerdict[];
  /** What the thin curve stands for; default "without correction". */
  thinWords?: string;
  /** Height of the landscape with its axis, without the strip; default 150. */
  height?: number;
  onOrder(order: number): void;
  onPickBus?(): void;
  /** The orders in view changed by zoom or pan. */
  onView?(view: OrderDomain): void;
}

const NO_VERDICTS: readonly PeakVerdict[] = [];

/** The frequency rail: a slider that rides on the impedance curve of one busbar. */
export function FrequencyRail(props: FrequencyRailProps) {
  const { scan, frequencyHz, maxOrder, order, injected, band, onOrder, onView, height = 150 } = props;
  const peakVerdicts = props.peakVerdicts ?? NO_VERDICTS;
  const [plot, width] = useMeasuredWidth<HTMLDivElement>(1280);
  const full = useMemo(() => fullDomain(scan, frequencyHz, maxOrder), [scan, frequencyHz, maxOrder]);
  const [chosenView, setChosenView] = useState<OrderDomain | null>(null);
  const [entry, setEntry] = useState<string | null>(null);
  const view = chosenView ?? full;
  const layout = useMemo(() => railLayout(width, height, SCREEN_STYLE.smallSize), [width, height]);
  const model = useMemo(
    () => railModel({ scan, frequencyHz, injected, band, peakVerdicts }, view, layout, SCREEN_STYLE),
    [scan, frequencyHz, injected, band, peakVerdicts, view, layout],
  );
  const changeView = useCallback(
    (next: OrderDomain) => {
      const whole = next.low <= full.low * 1.0001 && next.high >= full.high * 0.9999;
      setChosenView(whole ? null : next);
      onView?.(whole ? full : next);
    },
    [full, onView],
  );
  const gestures = useRailGestures({ plot, model, view, full, onOrder, onView: changeView });
  useHandleKeptInView(order, view, full, changeView);

  const probe = props.probe ?? (scan ? impedanceAt(scan.with, order * frequencyHz) : null);
  const zoom = (factor: number) => changeView(zoomDomain(view, full, clampOrder(order, view), factor));
  const onKeyDown = (event: KeyboardEvent<HTMLDivElement>) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const action = railKeyAction(event.key, event.shiftKey, {
      order,
      full,
      maxOrder,
      peaks: model.allPeaks,
      injectedOrders: model.injected.map((one) => one.h),
    });
    if (!action) return;
    event.preventDefault();
    if (action.kind === 'order') onOrder(action.order);
    else if (action.kind === 'entry') setEntry(action.text);
    else zoom(action.factor);
  };
  const closeEntry = () => {
    setEntry(null);
    plot.current?.focus();
  };

  return (
    <section className="rail" aria-label={`Frequency rail, ${props.busName}`}>
      <RailStrip {...props} zoomed={chosenView !== null} onZoom={zoom} onReset={() => changeView(full)} />
      <div className="rail-body">
        <div
          ref={plot}
          className={props.stale ? 'rail-plot stale' : 'rail-plot'}
          role="slider"
          tabIndex={0}
          aria-label={`Harmonic order at ${props.busName}`}
          aria-valuemin={full.low}
          aria-valuemax={full.high}
          aria-valuenow={order}
          aria-valuetext={handleValueText(
            order,
            frequencyHz,
            probe,
            model.injected.find((one) => one.h === order),
          )}
          style={{ height }}
          onKeyDown={onKeyDown}
          {...gestures}
        >
          <svg width={width} height={height} aria-hidden="true">
            <RailAxis model={model} style={SCREEN_STYLE} />
            <RailInjected model={model} style={SCREEN_STYLE} />
            <RailCurves model={model} style={SCREEN_STYLE} />
            <RailHandleLine model={model} style={SCREEN_STYLE} order={order} />
            <RailFlags model={model} style={SCREEN_STYLE} frequencyHz={frequencyHz} />
            <RailHandle
              model={model}
              style={SCREEN_STYLE}
              order={order}
              frequencyHz={frequencyHz}
              probe={probe}
              exact={props.probe !== null}
            />
          </svg>
        </div>
        {entry !== null && (
          <OrderEntryField
            initialText={entry}
            frequencyHz={frequencyHz}
            limits={full}
            onOrder={onOrder}
            onClose={closeEntry}
          />
        )}
      </div>
    </section>
  );
}

/** A handle moved beyond a zoomed view draws the view after it. */
function useHandleKeptInView(
  order: number,
  view: OrderDomain,
  full: OrderDomain,
  changeView: (view: OrderDomain) => void,
) {
  const lastOrder = useRef(order);
  useEffect(() => {
    if (lastOrder.current === order) return;
    lastOrder.current = order;
    const shown = revealOrder(view, full, order);
    if (shown !== view) changeView(shown);
  }, [order, view, full, changeView]);
}
