import { useMemo } from 'react';
import { type FigureInk, printStyle } from '../figure/figureInk.ts';
import type { Injection } from './injections.ts';
import type { OrderDomain } from './orderAxis.ts';
import { RailAxis, RailCurrents, RailCurves, RailFlags, RailInjected } from './RailLandscape.tsx';
import { railLayout } from './railLayout.ts';
import { fullDomain, type RailBand, type RailScan, railModel } from './railModel.ts';

export interface RailFigureProps {
  width: number;
  height: number;
  fontFamily: string;
  /** Letter height in the figure's units; default 9.5. */
  textSize?: number;
  /** Default: black, for the results sheet. */
  ink?: FigureInk | undefined;
  scan: RailScan | null;
  frequencyHz: number;
  maxOrder: number;
  injected?: readonly Injection[];
  band?: RailBand | undefined;
  /** The stretch of the axis shown; absent: all of it. */
  view?: OrderDomain | undefined;
}

const NONE: readonly Injection[] = [];

/** The impedance landscape as a static figure for the results sheet; null scans draw the axis alone. */
export function RailFigure(props: RailFigureProps) {
  const { width, height, fontFamily, textSize = 9.5, scan, frequencyHz, maxOrder, band, ink, view } = props;
  const injected = props.injected ?? NONE;
  const style = useMemo(() => printStyle(fontFamily, textSize, ink), [fontFamily, textSize, ink]);
  const model = useMemo(
    () =>
      railModel(
        { scan, frequencyHz, injected, band },
        view ?? fullDomain(scan, frequencyHz, maxOrder),
        railLayout(width, height, style.smallSize),
        style,
      ),
    [scan, frequencyHz, injected, band, maxOrder, view, width, height, style],
  );
  return (
    <svg xmlns="http://www.w3.org/2000/svg" width={width} height={height} viewBox={`0 0 ${width} ${height}`}>
      <RailAxis model={model} style={style} />
      <RailInjected model={model} style={style} />
      <RailCurves model={model} style={style} />
      <RailCurrents model={model} style={style} />
      <RailFlags model={model} style={style} frequencyHz={frequencyHz} />
    </svg>
  );
}
