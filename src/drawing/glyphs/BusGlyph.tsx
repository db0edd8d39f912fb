import { type BusPlace, differenceMark, measures } from '../layout/index.ts';
import type { BusFigure } from '../readings/figures.ts';
import type { Palette } from './Palette.ts';
import { PhasorDial } from './PhasorDial.tsx';
import { VerdictMark } from './VerdictMark.tsx';

export interface BusGlyphProps {
  place: BusPlace;
  figure: BusFigure;
  palette: Palette;
  letters?: string;
}

const BAR = 4;
/** A bar without voltage is drawn hollow, so that it is told apart without colour. */
const HOLLOW = 6;

/** A busbar around its left end: bar, name, nominal and live volts, dial, mark and letters. */
export function BusGlyph({ place, figure, palette, letters = '' }: BusGlyphProps) {
  return (
    <g fontSize={measures.FONT_PX}>
      <Bar width={place.x2 - place.x1} dead={figure.deenergised} palette={palette} />
      <Plate place={place} figure={figure} palette={palette} letters={letters} />
    </g>
  );
}

function Bar({ width, dead, palette }: { width: number; dead: boolean; palette: Palette }) {
  const height = dead ? HOLLOW : BAR;
  return (
    <rect
      className="bar"
      x={-2}
      y={-height / 2}
      width={width + 4}
      height={height}
      rx={2}
      fill={dead ? palette.sheet : palette.ink}
      stroke={dead ? palette.ink : 'none'}
      strokeWidth={1.2}
      strokeDasharray={dead ? '7 4' : undefined}
    />
  );
}

/** What stands above the bar. */
function Plate({ place, figure, palette, letters }: Required<BusGlyphProps>) {
  const ink = figure.mark === 'fail' ? palette.fail : palette.ink;
  const [left, top] = [place.label.x - place.x1, place.label.y - place.y];
  const first = top + measures.BASELINE;
  const mark = figure.mark === 'pass' ? undefined : figure.mark;
  // Letters stand after the mark and its word, where there are any.
  const lettersX =
    place.mark.x - place.x1 + (mark === undefined ? 0 : mark === 'unknown' ? 20 : place.mark.width);
  return (
    <g className="busplate">
      <text x={left} y={first} fontWeight={600} fill={palette.ink}>
        {place.name.endsWith('…') && <title>{figure.name}</title>}
        {place.name}
      </text>
      <text x={left} y={first + measures.LINE_PX} fill={palette.ink2}>
        <tspan className="plate">{figure.plate}</tspan>
        <tspan className="reading" dx={6} fill={ink} fontStyle={figure.deenergised ? 'italic' : undefined}>
          {figure.darkened && differenceMark}
          {figure.text}
        </tspan>
      </text>
      {place.dial && (
        <PhasorDial
          phasors={figure.phasors}
          x={place.dial.x - place.x1}
          y={place.dial.y - place.y}
          palette={palette}
        />
      )}
      {mark && (
        <VerdictMark
          verdict={mark}
          palette={palette}
          x={place.mark.x - place.x1 + 8}
          y={place.mark.y - place.y + 8}
        />
      )}
      <text
        className="letters"
        x={lettersX}
        y={first}
        fontWeight={600}
        fill={figure.mark === 'fail' ? palette.fail : palette.ink2}
      >
        {letters}
      </text>
    </g>
  );
}
