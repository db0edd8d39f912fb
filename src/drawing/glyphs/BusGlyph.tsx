import { type BusPlace, measures } from '../layout/index.ts';
import type { BusFigure } from '../readings/figures.ts';
import type { Palette } from './Palette.ts';
import { PhasorDial } from './PhasorDial.tsx';
import { VerdictMark } from './VerdictMark.tsx';

export interface BusGlyphProps {
  place: BusPlace;
  figure: BusFigure;
  palette: Palette;
  letters?: string;
  /** Id of the hatch pattern for a busbar without voltage. */
  hatchId: string;
}

const BAR = 4;

/** A busbar around its left end: bar, name, nominal and live volts, dial, mark and letters. */
export function BusGlyph({ place, figure, palette, letters = '', hatchId }: BusGlyphProps) {
  const width = place.x2 - place.x1;
  const base = place.label.y - place.y + 13;
  const ink = figure.mark === 'fail' ? palette.fail : palette.ink;
  const dial = { x: place.dial.x - place.x1, y: place.dial.y - place.y };
  return (
    <g fontSize={measures.FONT_PX}>
      <rect
        className="bar"
        x={-2}
        y={figure.deenergised ? -3.5 : -BAR / 2}
        width={width + 4}
        height={figure.deenergised ? 7 : BAR}
        rx={2}
        fill={figure.deenergised ? `url(#${hatchId})` : palette.ink}
        stroke={figure.deenergised ? palette.ink : 'none'}
        strokeWidth={1}
      />
      <text y={base}>
        <tspan fontWeight={600} fill={palette.ink}>
          {figure.name}
        </tspan>
        <tspan className="plate" dx={8} fill={palette.ink2}>
          {figure.plate}
        </tspan>
        <tspan className="reading" dx={8} fill={ink} fontStyle={figure.deenergised ? 'italic' : undefined}>
          {figure.text}
        </tspan>
      </text>
      <PhasorDial phasors={figure.phasors} x={dial.x} y={dial.y} palette={palette} />
      <text
        className="letters"
        x={dial.x + measures.DIAL_RADIUS + 6}
        y={dial.y + 4}
        fontWeight={600}
        fill={figure.mark === 'fail' ? palette.fail : palette.ink2}
      >
        {letters}
      </text>
      {figure.mark && figure.mark !== 'pass' && (
        <VerdictMark
          verdict={figure.mark}
          palette={palette}
          x={place.mark.x - place.x1 + 8}
          y={place.mark.y - place.y + 8}
        />
      )}
    </g>
  );
}
