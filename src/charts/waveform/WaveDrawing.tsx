import { memo } from 'react';
import type { FigureStyle } from '../figure/figureInk.ts';
import { ampereParts, joinParts, voltParts } from '../figure/quantityParts.ts';
import type { LitPhasor } from '../phasor/PhasorDrawing.tsx';
import { PHASE_DASHES } from '../phasor/phasorGeometry.ts';
import { degreeTicks, millisecondTicks, type TimeTick } from './timeTicks.ts';
import type { WaveLayout, WaveModel } from './waveModel.ts';

interface WaveCurvesProps {
  model: WaveModel;
  layout: WaveLayout;
  style: FigureStyle;
  lit: LitPhasor | null;
}

/** The curves themselves; they stay as they are while the time cursor moves. */
export const WaveCurves = memo(function WaveCurves({ model, layout, style, lit }: WaveCurvesProps) {
  const middle = (layout.top + layout.bottom) / 2;
  return (
    <g fill="none" strokeLinejoin="round">
      <line
        x1={layout.left}
        x2={layout.right}
        y1={middle}
        y2={middle}
        stroke={style.ink.hairline}
        strokeWidth={1}
      />
      {model.curves.map((curve) => {
        const isLit = lit !== null && lit.phase === curve.phase && lit.quantity === curve.quantity;
        const dash = PHASE_DASHES[curve.phase];
        const voltageColour = style.ink.phases[curve.phase] ?? style.ink.voltage;
        const width = lineWidth(curve.quantity, style);
        return (
          <path
            key={`${curve.quantity}${curve.phase}`}
            d={curve.path}
            stroke={curve.quantity === 'voltage' ? voltageColour : style.ink.current}
            strokeWidth={isLit ? width * 1.7 : width}
            opacity={lit !== null && !isLit ? 0.4 : 1}
            {...(dash ? { strokeDasharray: dash } : {})}
          />
        );
      })}
    </g>
  );
});

/** Voltage in the stronger line, so that the two are told apart without colour. */
function lineWidth(quantity: 'voltage' | 'current', style: FigureStyle): number {
  if (style.print) return quantity === 'voltage' ? 1.5 : 0.8;
  return quantity === 'voltage' ? 2 : 1.25;
}

interface WaveAxesProps {
  model: WaveModel;
  layout: WaveLayout;
  style: FigureStyle;
  frequencyHz: number;
  periods: number;
}

/** Frame with milliseconds and degrees under it and the peaks of both scales at its sides. */
export const WaveAxes = memo(function WaveAxes(props: WaveAxesProps) {
  const { model, layout, style, frequencyHz, periods } = props;
  const { ink, smallSize } = style;
  const most = Math.max(2, Math.floor((layout.right - layout.left) / (smallSize * 3.6)));
  return (
    <g fontSize={smallSize} fill={ink.ink2}>
      <line
        x1={layout.left}
        x2={layout.right}
        y1={layout.bottom}
        y2={layout.bottom}
        stroke={ink.ink2}
        strokeWidth={1}
      />
      <TickRow
        {...props}
        ticks={millisecondTicks(frequencyHz, periods, most)}
        baseline={layout.bottom + smallSize * 1.4}
        mark
      />
      <TickRow {...props} ticks={degreeTicks(periods, most)} baseline={layout.bottom + smallSize * 2.55} />
      <text x={layout.left - 10} y={layout.bottom + smallSize * 1.4} textAnchor="end">
        ms
      </text>
      {model.peakV > 0 && (
        <ScaleWords
          {...props}
          quantity="voltage"
          x={layout.left}
          words={`u ±${joinParts(voltParts(model.peakV, 3))}`}
        />
      )}
      {model.peakA > 0 && (
        <ScaleWords
          {...props}
          quantity="current"
          x={(layout.left + layout.right) / 2}
          words={`i ±${joinParts(ampereParts(model.peakA))}`}
        />
      )}
    </g>
  );
});

/** A sample of the line and the peak its scale stands for. */
function ScaleWords(props: WaveAxesProps & { quantity: 'voltage' | 'current'; x: number; words: string }) {
  const { layout, style, quantity, x, words } = props;
  const y = layout.top - style.smallSize * 0.5;
  const colour = quantity === 'voltage' ? style.ink.voltage : style.ink.current;
  const sample = style.smallSize * 1.6;
  return (
    <>
      <line
        x1={x}
        x2={x + sample}
        y1={y - style.smallSize * 0.35}
        y2={y - style.smallSize * 0.35}
        stroke={colour}
        strokeWidth={lineWidth(quantity, style)}
      />
      <text x={x + sample + 5} y={y} fill={colour}>
        {words}
      </text>
    </>
  );
}

function TickRow(props: WaveAxesProps & { ticks: TimeTick[]; baseline: number; mark?: boolean }) {
  const { layout, style, ticks, baseline, mark } = props;
  const width = layout.right - layout.left;
  return (
    <>
      {ticks.map((tick) => {
        const x = layout.left + tick.share * width;
        return (
          <g key={tick.label}>
            {mark && (
              <line
                x1={x}
                x2={x}
                y1={layout.bottom}
                y2={layout.bottom + 4}
                stroke={style.ink.ink2}
                strokeWidth={1}
              />
            )}
            <text x={x} y={baseline} textAnchor="middle">
              {tick.label}
            </text>
          </g>
        );
      })}
    </>
  );
}
