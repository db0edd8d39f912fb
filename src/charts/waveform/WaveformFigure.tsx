import { type FigureInk, printStyle } from '../figure/figureInk.ts';
import type { PhasorSpectrum } from '../phasor/phasorSpectrum.ts';
import { WaveAxes, WaveCurves } from './WaveDrawing.tsx';
import { waveLayout } from './WaveformView.tsx';
import { type WaveSettings, waveModel } from './waveModel.ts';
import { waveDoubt } from './waveWords.ts';

export interface WaveformFigureProps {
  width: number;
  height: number;
  fontFamily: string;
  textSize?: number;
  /** Default: black, for the results sheet. */
  ink?: FigureInk | undefined;
  voltage: PhasorSpectrum | null;
  current: PhasorSpectrum | null;
  frequencyHz: number;
  maxOrder: number;
  summation: 'phasor' | 'alpha';
  anglesUnknown: boolean;
  settings?: WaveSettings;
}

const DEFAULT: WaveSettings = { content: 'all', periods: 1, phases: 'L1' };

/** v(t) and i(t) as a static figure for the results sheet; voltage in the stronger line. */
export function WaveformFigure(props: WaveformFigureProps) {
  const { width, height, fontFamily, textSize = 9.5, settings = DEFAULT, frequencyHz } = props;
  const style = printStyle(fontFamily, textSize, props.ink);
  const doubt = waveDoubt(props.summation, props.anglesUnknown, settings);
  const room = doubt ? textSize * 1.6 : 0;
  const layout = waveLayout(width, height - room, true, style.smallSize);
  const model = doubt?.refused ? null : waveModel({ ...props, settings }, layout);
  return (
    <svg xmlns="http://www.w3.org/2000/svg" width={width} height={height} viewBox={`0 0 ${width} ${height}`}>
      <g fontFamily={fontFamily}>
        {model && (
          <>
            <WaveAxes
              model={model}
              layout={layout}
              style={style}
              frequencyHz={frequencyHz}
              periods={settings.periods}
            />
            <WaveCurves model={model} layout={layout} style={style} lit={null} />
          </>
        )}
        {doubt && (
          <text x={layout.left} y={height - textSize * 0.4} fontSize={style.smallSize} fill={style.ink.ink}>
            {doubt.words}
          </text>
        )}
      </g>
    </svg>
  );
}
