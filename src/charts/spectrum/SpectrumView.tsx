import { type KeyboardEvent, type MouseEvent, useMemo } from 'react';
import { SCREEN_STYLE } from '../figure/figureInk.ts';
import { fixedNumber } from '../figure/quantityParts.ts';
import { useMeasuredWidth } from '../figure/useMeasuredWidth.ts';
import { barWords, SpectrumBars } from './SpectrumDrawing.tsx';
import { lastShownOrder, type SpectrumBar } from './spectrumBars.ts';
import { spectrumModel } from './spectrumModel.ts';

export interface SpectrumViewProps {
  quantity: 'voltage' | 'current';
  /** Bars from `spectrumBars`; null where there is no fundamental to refer to. */
  bars: readonly SpectrumBar[] | null;
  /** What 100 % is; default "of fundamental". */
  baseWords?: string;
  thdPercent: number | null;
  thdLimit?: number;
  maxOrder: number;
  /** The rail's order. */
  order: number;
  size: 'small' | 'lens';
  height?: number;
  anglesUnknown?: boolean;
  onOrder?(order: number): void;
}

/** Bars by order against the limit of each order; the order under the rail is marked and can be chosen. */
export function SpectrumView(props: SpectrumViewProps) {
  const { bars, size, maxOrder, order, quantity, onOrder } = props;
  const height = props.height ?? (size === 'lens' ? 190 : 118);
  const [host, width] = useMeasuredWidth<HTMLDivElement>(size === 'lens' ? 520 : 300);
  const model = useMemo(() => {
    if (!bars) return null;
    const lastOrder = size === 'lens' ? maxOrder : lastShownOrder(bars, maxOrder);
    return spectrumModel(bars, { width, height, smallSize: SCREEN_STYLE.smallSize, lastOrder });
  }, [bars, size, maxOrder, width, height]);
  if (!model || !bars) {
    return <p className="chart-hint">No spectrum: there is no fundamental to refer the orders to.</p>;
  }
  const chosen = bars.find((bar) => bar.h === Math.round(order));
  const pick = (event: MouseEvent<HTMLDivElement>) => {
    const x = event.clientX - event.currentTarget.getBoundingClientRect().left;
    const h = Math.round((x - model.left) / model.slot + 1.5);
    if (h >= 2 && h <= maxOrder) onOrder?.(h);
  };
  const onKeyDown = (event: KeyboardEvent<HTMLDivElement>) => {
    const step = event.key === 'ArrowRight' ? 1 : event.key === 'ArrowLeft' ? -1 : 0;
    if (step === 0) return;
    event.preventDefault();
    event.stopPropagation();
    onOrder?.(Math.max(2, Math.min(maxOrder, Math.round(order) + step)));
  };
  const slider = onOrder
    ? {
        role: 'slider',
        tabIndex: 0,
        'aria-label': `Order in the ${quantity} spectrum`,
        'aria-valuemin': 1,
        'aria-valuemax': maxOrder,
        'aria-valuenow': Math.round(order),
        'aria-valuetext': chosen ? barWords(chosen) : 'fundamental',
        onClick: pick,
        onKeyDown,
      }
    : { role: 'img', 'aria-label': spectrumSummary(props) };
  return (
    <figure className={`spectrum spectrum-${size}`}>
      <ThdLine {...props} />
      <div ref={host} className="spectrum-plot" {...slider} style={{ height }}>
        <svg width={width} height={height} aria-hidden="true">
          <OrderMark x={model.orderX(order)} slot={model.slot} bottom={model.bottom} top={model.top} />
          <SpectrumBars model={model} quantity={quantity} style={SCREEN_STYLE} />
        </svg>
      </div>
      {props.anglesUnknown && size === 'lens' && (
        <figcaption className="chart-doubt">sources of unknown angle added by magnitude</figcaption>
      )}
    </figure>
  );
}

/** A light column behind the order under the rail and a caret under it. */
function OrderMark(props: { x: number | null; slot: number; bottom: number; top: number }) {
  const { x, slot, bottom, top } = props;
  if (x === null) return null;
  const { ink } = SCREEN_STYLE;
  const half = Math.max(5, slot / 2);
  return (
    <g>
      <rect
        x={x - half}
        y={top - 4}
        width={half * 2}
        height={bottom - top + 4}
        fill={ink.accent}
        fillOpacity={0.14}
      />
      <path d={`M${x - 4},${bottom + 6}h8l-4,-5Z`} fill={ink.accent} />
    </g>
  );
}

function ThdLine(props: SpectrumViewProps) {
  const { thdPercent, thdLimit } = props;
  const fails = thdPercent !== null && thdLimit !== undefined && thdPercent > thdLimit;
  return (
    <div className="spectrum-head">
      <span className="spectrum-base">
        {props.size === 'lens' && 'order · '}% {props.baseWords ?? 'of fundamental'}
      </span>
      <span className={fails ? 'spectrum-thd fails' : 'spectrum-thd'}>{thdWords(thdPercent, thdLimit)}</span>
    </div>
  );
}

/** "THD 20.2 % · above the limit 8 %", "THD 3.1 % · limit 8 %", "THD not known". */
export function thdWords(thdPercent: number | null, limit: number | undefined): string {
  if (thdPercent === null) return 'THD not known: no fundamental';
  const value = `THD ${fixedNumber(thdPercent, 1)} %`;
  if (limit === undefined) return value;
  const verb = thdPercent > limit ? 'above the limit' : 'limit';
  return `${value} · ${verb} ${fixedNumber(limit, limit % 1 === 0 ? 0 : 1)} %`;
}

function spectrumSummary(props: SpectrumViewProps): string {
  const failing = (props.bars ?? []).filter((bar) => bar.fails).map(barWords);
  const worst = failing.length > 0 ? `above the limit: ${failing.join('; ')}` : 'no order above its limit';
  return `Spectrum of ${props.quantity}: ${thdWords(props.thdPercent, props.thdLimit)}; ${worst}`;
}
