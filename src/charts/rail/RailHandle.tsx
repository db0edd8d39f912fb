import type { Box } from '../figure/box.ts';
import type { FigureStyle } from '../figure/figureInk.ts';
import { textWidth } from '../figure/textWidth.ts';
import { handleLabelBox } from './handleLabelBox.ts';
import { ohmAt } from './impedanceCurve.ts';
import type { RailModel } from './railModel.ts';
import { handleWords, type Probe } from './railWords.ts';

interface RailHandleProps {
  model: RailModel;
  style: FigureStyle;
  order: number;
  frequencyHz: number;
  probe: Probe | null;
  /** The probe was solved at this order, not read off the scan. */
  exact: boolean;
}

/** The handle's line through the axis; flags stand over it. */
export function RailHandleLine({ model, style, order }: Pick<RailHandleProps, 'model' | 'style' | 'order'>) {
  const { layout, axis } = model;
  if (order < axis.domain.low || order > axis.domain.high) return null;
  const x = axis.x(order);
  return <line x1={x} x2={x} y1={0} y2={layout.axisY + 5} stroke={style.ink.accent} strokeWidth={1.5} />;
}

/** The handle on the curve with its words beside it. */
export function RailHandle({ model, style, order, frequencyHz, probe, exact }: RailHandleProps) {
  const { layout, axis, ohm, withCurve } = model;
  if (order < axis.domain.low || order > axis.domain.high) return null;
  const x = axis.x(order);
  const onCurve = withCurve ? ohmAt(withCurve, order) : null;
  const y = ohm && onCurve !== null ? ohm.y(onCurve) : (layout.curveTop + layout.axisY) / 2;
  const injected = model.injected.find((one) => one.h === order);
  const words = handleWords(order, frequencyHz, probe, exact, injected);
  const size = { width: textWidth(words, style.textSize) + 14, height: style.textSize * 1.9 };
  const flags: Box[] = [
    ...model.peaks.flatMap((peak) => peak.box ?? []),
    ...model.injected.flatMap((tick) => tick.words?.box ?? []),
  ];
  const bounds = { ...layout.words, width: layout.width - layout.words.x - 2 };
  const box = handleLabelBox({ x, y }, size, bounds, flags, model.curveHeights);
  return (
    <g pointerEvents="none">
      <circle cx={x} cy={y} r={7} fill={style.ink.sheet} stroke={style.ink.accent} strokeWidth={2.5} />
      <rect {...box} rx={3} fill={style.ink.sheet} stroke={style.ink.accent} strokeWidth={1} />
      <text
        x={box.x + box.width / 2}
        y={box.y + box.height * 0.67}
        textAnchor="middle"
        fontSize={style.textSize}
        fontWeight={600}
        fill={style.ink.ink}
      >
        {words}
      </text>
    </g>
  );
}
