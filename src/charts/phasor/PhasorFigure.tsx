import { type FigureInk, printStyle } from '../figure/figureInk.ts';
import { PhasorDrawing } from './PhasorDrawing.tsx';
import { phaseAngle, phaseAngleWords } from './phaseAngle.ts';
import type { ThreePhasors } from './phasorSpectrum.ts';
import { PHASE_NAMES, type PhaseNames } from './phasorWords.ts';

export interface PhasorFigureProps {
  width: number;
  height: number;
  fontFamily: string;
  textSize?: number;
  /** Default: black, for the results sheet. */
  ink?: FigureInk | undefined;
  voltage: ThreePhasors | null;
  current: ThreePhasors | null;
  order: number;
  names?: PhaseNames;
}

/** Phasors as a static figure for the results sheet, φ in words underneath. */
export function PhasorFigure(props: PhasorFigureProps) {
  const { width, height, fontFamily, textSize = 9.5, voltage, current, order } = props;
  const style = printStyle(fontFamily, textSize, props.ink);
  const angle = phaseAngle(voltage, current);
  const caption = textSize * 1.8;
  const radius = Math.max(10, Math.min(width / 2, (height - caption) / 2) - style.smallSize * 1.7);
  return (
    <svg xmlns="http://www.w3.org/2000/svg" width={width} height={height} viewBox={`0 0 ${width} ${height}`}>
      <g transform={`translate(${width / 2},${(height - caption) / 2})`} fontFamily={fontFamily}>
        <PhasorDrawing
          voltage={voltage}
          current={current}
          order={order}
          timeTurn={0}
          radius={radius}
          names={props.names ?? PHASE_NAMES}
          style={style}
          lit={null}
        />
      </g>
      {angle && (
        <text
          x={width / 2}
          y={height - textSize * 0.5}
          textAnchor="middle"
          fontFamily={fontFamily}
          fontSize={textSize}
          fill={style.ink.ink}
        >
          {angle.phase === 0 ? '' : `${(props.names ?? PHASE_NAMES)[angle.phase]} `}
          {phaseAngleWords(angle)}
        </text>
      )}
    </svg>
  );
}
