import { type FigureInk, printStyle } from '../figure/figureInk.ts';
import { SpectrumBars } from './SpectrumDrawing.tsx';
import { thdWords } from './SpectrumView.tsx';
import type { SpectrumBar } from './spectrumBars.ts';
import { spectrumModel } from './spectrumModel.ts';

export interface SpectrumFigureProps {
  width: number;
  height: number;
  fontFamily: string;
  textSize?: number;
  /** Default: black, for the results sheet. */
  ink?: FigureInk | undefined;
  quantity: 'voltage' | 'current';
  bars: readonly SpectrumBar[] | null;
  baseWords?: string;
  thdPercent: number | null;
  thdLimit?: number;
  maxOrder: number;
}

/** The spectrum as a static figure for the results sheet: every order up to the highest. */
export function SpectrumFigure(props: SpectrumFigureProps) {
  const { width, height, fontFamily, textSize = 9.5, bars, maxOrder } = props;
  const style = printStyle(fontFamily, textSize, props.ink);
  const head = textSize * 1.6;
  const model = bars
    ? spectrumModel(bars, { width, height: height - head, smallSize: style.smallSize, lastOrder: maxOrder })
    : null;
  return (
    <svg xmlns="http://www.w3.org/2000/svg" width={width} height={height} viewBox={`0 0 ${width} ${height}`}>
      <g fontFamily={fontFamily}>
        <text y={textSize} fontSize={style.smallSize} fill={style.ink.ink2}>
          {`order · % ${props.baseWords ?? 'of fundamental'}`}
        </text>
        <text x={width} y={textSize} textAnchor="end" fontSize={style.smallSize} fill={style.ink.ink}>
          {model ? thdWords(props.thdPercent, props.thdLimit) : 'no fundamental to refer the orders to'}
        </text>
        {model && (
          <g transform={`translate(0,${head})`}>
            <SpectrumBars model={model} quantity={props.quantity} style={style} />
          </g>
        )}
      </g>
    </svg>
  );
}
