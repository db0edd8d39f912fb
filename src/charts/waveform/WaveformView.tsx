import { type KeyboardEvent, type PointerEvent, useMemo, useRef } from 'react';
import { SCREEN_STYLE } from '../figure/figureInk.ts';
import { ampereParts, fixedNumber, joinParts, voltParts } from '../figure/quantityParts.ts';
import { useMeasuredWidth } from '../figure/useMeasuredWidth.ts';
import type { LitPhasor } from '../phasor/PhasorDrawing.tsx';
import type { PhasorSpectrum } from '../phasor/phasorSpectrum.ts';
import { PHASE_NAMES, type PhaseNames } from '../phasor/phasorWords.ts';
import { WaveAxes, WaveCurves } from './WaveDrawing.tsx';
import { WaveTools } from './WaveTools.tsx';
import { instantaneous } from './waveform.ts';
import { type WaveLayout, type WaveSettings, waveModel } from './waveModel.ts';
import { contentWords, waveDoubt } from './waveWords.ts';

export interface WaveformViewProps {
  voltage: PhasorSpectrum | null;
  current: PhasorSpectrum | null;
  frequencyHz: number;
  maxOrder: number;
  summation: 'phasor' | 'alpha';
  /** What the phases are called. */
  names?: PhaseNames | undefined;
  /** Some order in view has an angle the data do not give. */
  anglesUnknown: boolean;
  settings: WaveSettings;
  size: 'small' | 'lens';
  /** Default: the width of its place. */
  width?: number;
  height?: number;
  /** The shared time cursor, 0…1 of a fundamental period. */
  timeTurn: number;
  lit?: LitPhasor | null;
  onTimeTurn?(timeTurn: number): void;
  /** Given at lens size: the choice of orders, periods and phases is offered. */
  onSettings?(settings: WaveSettings): void;
}

const SIZES = { small: { width: 168, height: 116 }, lens: { width: 520, height: 236 } };

/** v(t) and i(t) over one or two periods, with the time cursor that turns the phasors. */
export function WaveformView(props: WaveformViewProps) {
  const { voltage, current, settings, size, maxOrder, frequencyHz, timeTurn } = props;
  const [host, measured] = useMeasuredWidth<HTMLElement>(SIZES[size].width);
  const width = props.width ?? measured;
  const height = props.height ?? SIZES[size].height;
  const layout = useMemo(() => waveLayout(width, height, size === 'lens'), [width, height, size]);
  const doubt = waveDoubt(props.summation, props.anglesUnknown, settings, size === 'small');
  const model = useMemo(
    () => (doubt?.refused ? null : waveModel({ voltage, current, maxOrder, settings }, layout)),
    [doubt?.refused, voltage, current, maxOrder, settings, layout],
  );
  const cursor = useTimeCursor(props, layout);
  return (
    <figure ref={host} className={`wave wave-${size}`}>
      {size === 'lens' && props.onSettings && (
        <WaveTools
          settings={settings}
          maxOrder={maxOrder}
          names={props.names ?? PHASE_NAMES}
          onSettings={props.onSettings}
        />
      )}
      {model && (
        <div className="wave-plot" {...cursor}>
          <svg width={width} height={height} aria-hidden="true">
            {size === 'lens' && (
              <WaveAxes
                model={model}
                layout={layout}
                style={SCREEN_STYLE}
                frequencyHz={frequencyHz}
                periods={settings.periods}
              />
            )}
            <WaveCurves model={model} layout={layout} style={SCREEN_STYLE} lit={props.lit ?? null} />
            <TimeCursor layout={layout} periods={settings.periods} timeTurn={timeTurn} />
          </svg>
        </div>
      )}
      <figcaption>
        {size === 'lens' && model && (
          <>
            <span>{contentWords(settings, model.highest, maxOrder)}</span>
            <span className="wave-instant">{instantWords(props, model.highest)}</span>
          </>
        )}
        {doubt && <span className="chart-doubt">{doubt.words}</span>}
      </figcaption>
    </figure>
  );
}

/** Room for curves; axis words only where `withAxes`. */
export function waveLayout(width: number, height: number, withAxes: boolean, smallSize = 11): WaveLayout {
  if (!withAxes) return { left: 1, right: width - 1, top: 4, bottom: height - 4 };
  return {
    left: smallSize * 2.6,
    right: width - smallSize * 1.6,
    top: smallSize * 1.8,
    bottom: height - smallSize * 3,
  };
}

function TimeCursor(props: { layout: WaveLayout; periods: number; timeTurn: number }) {
  const { layout, periods, timeTurn } = props;
  const width = (layout.right - layout.left) / periods;
  return (
    <>
      {Array.from({ length: periods }, (_, n) => layout.left + (timeTurn + n) * width).map((x, n) => (
        <line
          key={x}
          x1={x}
          x2={x}
          y1={layout.top - 4}
          y2={layout.bottom}
          stroke={SCREEN_STYLE.ink.accent}
          strokeWidth={n === 0 ? 1.5 : 0.75}
        />
      ))}
    </>
  );
}

/** "t 4.20 ms · 75.6° · L1: u −12.3 V, i 4.1 A". */
function instantWords(props: WaveformViewProps, highest: number): string {
  const { timeTurn, frequencyHz, voltage, current, settings } = props;
  const phase = settings.phases === 'L2' ? 1 : settings.phases === 'L3' ? 2 : 0;
  const values = [
    voltage && `u ${joinParts(voltParts(instantaneous(voltage, phase, highest, timeTurn), 3))}`,
    current && `i ${joinParts(ampereParts(instantaneous(current, phase, highest, timeTurn)))}`,
  ].filter(Boolean);
  const place = `t ${fixedNumber((timeTurn * 1000) / frequencyHz, 2)} ms · ${fixedNumber(timeTurn * 360, 1)}°`;
  const name = (props.names ?? PHASE_NAMES)[phase];
  return `${place} · ${name}: ${values.join(', ')}`;
}

/** Pointer and keys of the time cursor, as a slider over one period; nothing when it cannot be moved. */
function useTimeCursor(props: WaveformViewProps, layout: WaveLayout) {
  const dragging = useRef(false);
  const { onTimeTurn, timeTurn, frequencyHz, settings } = props;
  if (!onTimeTurn) return {};
  const move = (event: PointerEvent<HTMLDivElement>) => {
    const x = event.clientX - event.currentTarget.getBoundingClientRect().left;
    const share = Math.max(0, Math.min(0.99999, (x - layout.left) / (layout.right - layout.left)));
    onTimeTurn((share * settings.periods) % 1);
  };
  return {
    role: 'slider',
    tabIndex: 0,
    'aria-label': 'Time cursor',
    'aria-valuemin': 0,
    'aria-valuemax': 360,
    'aria-valuenow': Math.round(timeTurn * 360),
    'aria-valuetext': `${fixedNumber((timeTurn * 1000) / frequencyHz, 2)} milliseconds, ${fixedNumber(timeTurn * 360, 0)} degrees`,
    onPointerDown: (event: PointerEvent<HTMLDivElement>) => {
      if (event.button !== 0) return;
      event.stopPropagation();
      event.currentTarget.setPointerCapture(event.pointerId);
      dragging.current = true;
      move(event);
    },
    onPointerMove: (event: PointerEvent<HTMLDivElement>) => {
      if (dragging.current) move(event);
    },
    onPointerUp: () => {
      dragging.current = false;
    },
    onPointerCancel: () => {
      dragging.current = false;
    },
    onKeyDown: (event: KeyboardEvent<HTMLDivElement>) => {
      const next = turnForKey(event.key, event.shiftKey, timeTurn);
      if (next === null) return;
      event.preventDefault();
      event.stopPropagation();
      onTimeTurn(next);
    },
  };
}

/** Arrows move the time cursor by 5° (Shift: 1°) round the period; Home returns to its start. */
export function turnForKey(key: string, shift: boolean, timeTurn: number): number | null {
  const step = (shift ? 1 : 5) / 360;
  if (key === 'Home') return 0;
  if (key === 'ArrowRight' || key === 'ArrowUp') return (timeTurn + step) % 1;
  if (key === 'ArrowLeft' || key === 'ArrowDown') return (timeTurn - step + 1) % 1;
  return null;
}
