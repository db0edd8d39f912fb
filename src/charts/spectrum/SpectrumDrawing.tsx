import { memo } from 'react';
import type { FigureStyle } from '../figure/figureInk.ts';
import type { PlacedBar, SpectrumModel } from './spectrumModel.ts';

interface SpectrumBarsProps {
  model: SpectrumModel;
  quantity: 'voltage' | 'current';
  style: FigureStyle;
}

/** Axis, bars, the limit tick of each order and the words over the telling bars. */
export const SpectrumBars = memo(function SpectrumBars({ model, quantity, style }: SpectrumBarsProps) {
  const { ink, smallSize } = style;
  return (
    <g fontSize={smallSize} fill={ink.ink2}>
      {model.valueTicks.map((tick) => (
        <g key={tick.label}>
          <line
            x1={model.left}
            x2={model.right}
            y1={tick.y}
            y2={tick.y}
            stroke={ink.hairline}
            strokeWidth={0.75}
          />
          <text x={model.left - 5} y={tick.y + smallSize * 0.35} textAnchor="end">
            {tick.label}
          </text>
        </g>
      ))}
      {model.bars.map((bar) => (
        <Bar key={bar.h} bar={bar} model={model} quantity={quantity} style={style} />
      ))}
      <line
        x1={model.left}
        x2={model.right}
        y1={model.bottom}
        y2={model.bottom}
        stroke={ink.ink2}
        strokeWidth={1}
      />
      {model.orderLabels.map((label) => (
        <text
          key={label.h}
          x={label.x}
          y={model.bottom + smallSize * 1.35}
          textAnchor="middle"
          fill={ink.ink}
        >
          {label.h}
        </text>
      ))}
    </g>
  );
});

function Bar(props: SpectrumBarsProps & { bar: PlacedBar }) {
  const { bar, model, quantity, style } = props;
  const { ink } = style;
  const colour = bar.fails ? ink.fail : quantity === 'voltage' ? ink.voltage : ink.current;
  const height = Math.max(0, model.bottom - bar.top);
  const reach = Math.max(model.barWidth * 0.9, Math.min(model.slot * 0.46, 8));
  return (
    <g>
      {!style.print && <title>{barWords(bar)}</title>}
      {height > 0.2 && (
        <rect
          x={bar.x - model.barWidth / 2}
          y={bar.top}
          width={model.barWidth}
          height={height}
          fill={colour}
        />
      )}
      {bar.limitY !== null && (
        <line
          x1={bar.x - reach}
          x2={bar.x + reach}
          y1={bar.limitY}
          y2={bar.limitY}
          stroke={ink.reactive}
          strokeWidth={style.print ? 0.8 : 1.5}
        />
      )}
      {bar.words && (
        <text
          x={bar.words.x}
          y={bar.words.y}
          fill={bar.fails ? ink.fail : ink.ink}
          fontWeight={bar.fails ? 600 : 400}
        >
          {bar.words.text}
        </text>
      )}
      {bar.fails && (
        <path d={failMark(bar, style.smallSize)} stroke={ink.fail} strokeWidth={1.5} fill="none" />
      )}
    </g>
  );
}

/** ✕ left of the words of a failing bar, or over the bar itself; drawn, because not every font has the sign. */
function failMark(bar: PlacedBar, smallSize: number): string {
  const size = smallSize * 0.6;
  const x = bar.words ? bar.words.x - smallSize * 0.9 : bar.x - size / 2;
  const y = bar.words ? bar.words.y - size : bar.top - size - 3;
  return `M${x},${y}l${size},${size}m0,${-size}l${-size},${size}`;
}

/** "h 7: 19.4 %, limit 5 %, above it". */
export function barWords(bar: { h: number; percent: number; limit: number | null; fails: boolean }): string {
  const value = `h ${bar.h}: ${Number(bar.percent.toPrecision(3))} %`;
  if (bar.limit === null) return `${value}, no limit for this order`;
  return `${value}, limit ${Number(bar.limit.toPrecision(3))} %${bar.fails ? ', above it' : ''}`;
}
