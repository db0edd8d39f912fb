import { memo, useId } from 'react';
import type { FigureStyle } from '../figure/figureInk.ts';
import type { PlacedInjection } from './placedInjections.ts';
import type { PlacedPeak, RailModel } from './railModel.ts';
import { injectionWords, peakTooltip } from './railWords.ts';

interface LayerProps {
  model: RailModel;
  style: FigureStyle;
}

/** Axis, order marks with hertz under them, and the decades of |Z|. */
export const RailAxis = memo(function RailAxis({ model, style }: LayerProps) {
  const { layout, ticks, ohm } = model;
  const { ink } = style;
  return (
    <g fontSize={style.smallSize} {...(style.fontFamily ? { fontFamily: style.fontFamily } : {})}>
      {ohm?.decades.map((decade) => (
        <g key={decade.ohm}>
          <line
            x1={layout.left}
            x2={layout.right}
            y1={decade.y}
            y2={decade.y}
            stroke={ink.hairline}
            strokeWidth={0.75}
          />
          <text x={layout.left - 6} y={decade.y + style.smallSize * 0.35} textAnchor="end" fill={ink.ink2}>
            {decade.label}
          </text>
        </g>
      ))}
      <line
        x1={layout.left}
        x2={layout.right}
        y1={layout.axisY}
        y2={layout.axisY}
        stroke={ink.ink2}
        strokeWidth={1}
      />
      {ticks.map((tick) => (
        <g key={tick.order}>
          <line
            x1={tick.x}
            x2={tick.x}
            y1={layout.axisY}
            y2={layout.axisY + (tick.label ? 5 : 3)}
            stroke={ink.ink2}
            strokeWidth={1}
          />
          {tick.label && (
            <text x={tick.x} y={layout.orderBaseline} textAnchor="middle" fill={ink.ink}>
              {tick.label}
            </text>
          )}
          {tick.hzLabel && (
            <text x={tick.x} y={layout.hzBaseline} textAnchor="middle" fill={ink.ink2}>
              {tick.hzLabel}
            </text>
          )}
        </g>
      ))}
      <text x={layout.left - 30} y={layout.orderBaseline} textAnchor="end" fill={ink.ink}>
        h
      </text>
      <text x={layout.left - 30} y={layout.hzBaseline} textAnchor="end" fill={ink.ink2}>
        Hz
      </text>
    </g>
  );
});

/** The envelope, the curve without the correction (thin) and the curve with it (inked). */
export const RailCurves = memo(function RailCurves({ model, style }: LayerProps) {
  const { layout } = model;
  const clipId = useId();
  return (
    <g>
      <clipPath id={clipId}>
        <rect
          x={layout.left}
          y={layout.top}
          width={Math.max(0, layout.right - layout.left)}
          height={layout.axisY - layout.top}
        />
      </clipPath>
      <g clipPath={`url(#${clipId})`} fill="none">
        {model.bandPath && (
          <path d={model.bandPath} fill={style.ink.hairline} fillOpacity={0.6} stroke="none" />
        )}
        {model.withoutPath && (
          <path
            d={model.withoutPath}
            stroke={style.ink.ink2}
            strokeWidth={style.print ? 0.7 : 1}
            {...(style.print ? { strokeDasharray: '4 2.5' } : {})}
          />
        )}
        {model.withPath && (
          <path
            d={model.withPath}
            stroke={style.ink.voltage}
            strokeWidth={style.print ? 1.4 : 2}
            strokeLinejoin="round"
          />
        )}
      </g>
    </g>
  );
});

/** A tick at each injected order, as high as its current; supply background as an open foot. */
export const RailInjected = memo(function RailInjected({ model, style }: LayerProps) {
  const { axisY } = model.layout;
  const half = style.print ? 2 : 3;
  return (
    <g>
      {model.injected.map((order) => (
        <InjectedTick key={order.h} order={order} axisY={axisY} half={half} style={style} />
      ))}
    </g>
  );
});

function InjectedTick(props: { order: PlacedInjection; axisY: number; half: number; style: FigureStyle }) {
  const { order, axisY, half, style } = props;
  return (
    <g>
      {!style.print && <title>{injectionWords(order)}</title>}
      <rect
        x={order.x - half}
        y={axisY - order.height}
        width={half * 2}
        height={order.height}
        fill={style.ink.current}
        fillOpacity={style.print ? 1 : 0.85}
      />
      {order.backgroundPercent > 0 && (
        <path
          d={`M${order.x - half - 2},${axisY}l${half + 2},${-(half + 3)}l${half + 2},${half + 3}`}
          fill="none"
          stroke={style.ink.ink2}
          strokeWidth={1}
        />
      )}
    </g>
  );
}

/** The currents over the ticks, legible over the handle's line. */
export const RailCurrents = memo(function RailCurrents({ model, style }: LayerProps) {
  const halo = style.print ? {} : { stroke: style.ink.ground, strokeWidth: 3, paintOrder: 'stroke' };
  return (
    <g
      fontSize={style.smallSize}
      fill={style.ink.current}
      {...(style.fontFamily ? { fontFamily: style.fontFamily } : {})}
      {...halo}
    >
      {model.injected.map(
        ({ h, words }) =>
          words && (
            <text key={h} x={words.box.x} y={words.box.y + words.box.height * 0.8}>
              {words.text}
            </text>
          ),
      )}
    </g>
  );
});

interface FlagProps extends LayerProps {
  frequencyHz: number;
}

/** A small flag for each resonance, tied to it by a hairline. */
export const RailFlags = memo(function RailFlags({ model, style, frequencyHz }: FlagProps) {
  return (
    <g fontSize={style.textSize} {...(style.fontFamily ? { fontFamily: style.fontFamily } : {})}>
      {model.peaks.map((placed) => (
        <PeakFlag
          key={`${placed.peak.kind}${placed.peak.order}`}
          placed={placed}
          style={style}
          frequencyHz={frequencyHz}
        />
      ))}
    </g>
  );
});

function PeakFlag(props: { placed: PlacedPeak; style: FigureStyle; frequencyHz: number }) {
  const { placed, style, frequencyHz } = props;
  const { box, peak } = placed;
  const colour = flagColour(placed, style);
  return (
    <g {...(style.print ? {} : { className: 'rail-flag' })}>
      {!style.print && <title>{peakTooltip(peak, frequencyHz)}</title>}
      <path d={peakMark(placed)} fill={colour} />
      {box && (
        <>
          <line {...leader(placed)} stroke={colour} strokeWidth={style.print ? 0.6 : 1} />
          {style.print ? (
            <rect {...box} fill={style.ink.sheet} fillOpacity={0.85} />
          ) : (
            <rect {...box} rx={3} className="rail-flag-ground" />
          )}
          <text x={box.x + 4} y={box.y + box.height * 0.76} fill={colour} fontWeight={600}>
            {placed.words}
          </text>
        </>
      )}
    </g>
  );
}

function flagColour(placed: PlacedPeak, style: FigureStyle): string {
  if (placed.verdict === 'fail') return style.ink.fail;
  if (placed.verdict === 'watch') return style.ink.watch;
  return placed.peak.kind === 'parallel' ? style.ink.ink : style.ink.ink2;
}

function peakMark({ x, y, peak }: PlacedPeak): string {
  const up = peak.kind === 'parallel' ? -1 : 1;
  return `M${x - 3.5},${y + up * 8}h7L${x},${y + up * 3}Z`;
}

function leader({ x, y, box, peak }: PlacedPeak): { x1: number; y1: number; x2: number; y2: number } {
  const up = peak.kind === 'parallel' ? -1 : 1;
  const from = { x1: x, y1: y + up * 6 };
  if (!box) return { ...from, x2: x, y2: y };
  const nearX = Math.max(box.x, Math.min(box.x + box.width, x));
  const beside = nearX !== x;
  const y2 = beside ? box.y + box.height / 2 : box.y + (box.y > y ? 0 : box.height);
  return { ...from, x2: nearX, y2 };
}
