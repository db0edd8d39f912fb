import { type KeyboardEvent, useCallback, useMemo, useRef, useState } from 'react';
import type { PictureWay } from '../notes/noteActions.ts';
import { impedanceAt } from './impedanceCurve.ts';
import { type Injection, injectedOrders } from './injections.ts';
import { OrderEntryField } from './OrderEntryField.tsx';
import { clampOrder, type OrderDomain, zoomDomain } from './orderAxis.ts';
import { RailPlot } from './RailPlot.tsx';
import { RailStrip } from './RailStrip.tsx';
import { railKeyAction } from './railKeys.ts';
import { fullDomain, type PeakVerdict, type RailBand, type RailScan } from './railModel.ts';
import { railPeaks } from './railPeaks.ts';
import { handleValueText, handleWords, type Probe } from './railWords.ts';

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
  /** Only the strip is shown, with the handle's words as the slider. */
  folded?: boolean;
  onOrder(order: number): void;
  onFold?(folded: boolean): void;
  /** Hands the landscape on as a picture, or its numbers; `view` is the stretch of the axis on screen. */
  onPicture?(way: PictureWay, view: OrderDomain): void;
  onPickBus?(): void;
  /** The orders in view changed by zoom or pan. */
  onView?(view: OrderDomain): void;
}

/** The frequency rail: a slider that rides on the impedance curve of one busbar. */
export function FrequencyRail(props: FrequencyRailProps) {
  const { scan, frequencyHz, maxOrder, order, injected, onOrder, onView, height = 150 } = props;
  const section = useRef<HTMLElement>(null);
  const full = useMemo(() => fullDomain(scan, frequencyHz, maxOrder), [scan, frequencyHz, maxOrder]);
  const [chosenView, setChosenView] = useState<OrderDomain | null>(null);
  const [entry, setEntry] = useState<string | null>(null);
  const view = chosenView ?? full;
  const peaks = useMemo(
    () => (scan ? railPeaks(scan.with, scan.without, frequencyHz) : []),
    [scan, frequencyHz],
  );
  const ticks = useMemo(() => injectedOrders(injected), [injected]);
  const changeView = useCallback(
    (next: OrderDomain) => {
      const whole = next.low <= full.low * 1.0001 && next.high >= full.high * 0.9999;
      setChosenView(whole ? null : next);
      onView?.(whole ? full : next);
    },
    [full, onView],
  );

  const probe = props.probe ?? (scan ? impedanceAt(scan.with, order * frequencyHz) : null);
  const exact = props.probe !== null;
  const atHandle = ticks.find((one) => one.h === order);
  const zoom = (factor: number) => changeView(zoomDomain(view, full, clampOrder(order, view), factor));
  const onKeyDown = (event: KeyboardEvent<HTMLElement>) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const injectedHs = ticks.map((one) => one.h);
    const state = { order, full, maxOrder, peaks, injectedOrders: injectedHs };
    const action = railKeyAction(event.key, event.shiftKey, state);
    if (!action) return;
    event.preventDefault();
    if (action.kind === 'order') onOrder(action.order);
    else if (action.kind === 'entry') setEntry(action.text);
    else zoom(action.factor);
  };
  const closeEntry = () => {
    setEntry(null);
    section.current?.querySelector<HTMLElement>('[role="slider"]')?.focus();
  };
  const slider = {
    role: 'slider',
    tabIndex: 0,
    'aria-label': `Harmonic order at ${props.busName}`,
    'aria-valuemin': full.low,
    'aria-valuemax': full.high,
    'aria-valuenow': order,
    'aria-valuetext': handleValueText(order, frequencyHz, probe, atHandle),
    onKeyDown,
  };
  return (
    <section ref={section} className="rail" aria-label={`Frequency rail, ${props.busName}`}>
      <RailStrip
        {...props}
        zoomed={chosenView !== null}
        onZoom={zoom}
        onReset={() => changeView(full)}
        onEntry={() => setEntry('')}
        onPicture={props.onPicture && ((way) => props.onPicture?.(way, view))}
      >
        {props.folded && (
          <span className="rail-readout" {...slider}>
            {handleWords(order, frequencyHz, probe, exact, atHandle)}
          </span>
        )}
      </RailStrip>
      {!props.folded && (
        <RailPlot
          {...props}
          height={height}
          view={view}
          full={full}
          probe={probe}
          exact={exact}
          slider={slider}
          onView={changeView}
        />
      )}
      {entry !== null && (
        <OrderEntryField
          initialText={entry}
          frequencyHz={frequencyHz}
          limits={full}
          onOrder={onOrder}
          onClose={closeEntry}
        />
      )}
    </section>
  );
}
