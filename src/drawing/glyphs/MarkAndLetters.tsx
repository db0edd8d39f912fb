import type { PartPlace } from '../layout/index.ts';
import type { PartFigure } from '../readings/figures.ts';
import type { Palette } from './Palette.ts';
import { VerdictMark } from './VerdictMark.tsx';

export interface MarkProps {
  place: PartPlace;
  figure: PartFigure;
  palette: Palette;
  letters: string;
}

/** The verdict's mark, its word below or beside it, and the letters of the part's notes. */
export function MarkAndLetters({ place, figure, palette, letters }: MarkProps) {
  const shown = figure.mark !== undefined && figure.mark !== 'pass';
  const { mark } = place;
  // Left of a part that leads on, mark and word end at its conductor; elsewhere they begin there.
  const left = mark.x - place.x + mark.width < 0;
  const beside = place.hang === 'across';
  const x = mark.x - place.x + (left ? mark.width - 8 : 8);
  return (
    <g>
      {shown && figure.mark && (
        <VerdictMark
          verdict={figure.mark}
          palette={palette}
          x={x}
          y={mark.y - place.y + 8}
          word={beside ? 'beside' : left ? 'below-left' : 'below'}
        />
      )}
      <text
        className="letters"
        x={place.letters.x - place.x}
        y={place.letters.y - place.y}
        textAnchor="end"
        fontSize={12}
        fontWeight={600}
        fill={figure.mark === 'fail' ? palette.fail : palette.ink2}
      >
        {letters}
      </text>
    </g>
  );
}
