import type { PartPlace, Point } from '../layout/index.ts';
import type { PartFigure } from '../readings/figures.ts';
import { symbolShape } from '../symbols/symbolShape.ts';
import { FlowArrow } from './FlowArrow.tsx';
import { MarkAndLetters } from './MarkAndLetters.tsx';
import type { Palette } from './Palette.ts';
import { PartText } from './PartText.tsx';
import { SymbolGlyph } from './SymbolGlyph.tsx';

export interface PartGlyphProps {
  place: PartPlace;
  figure: PartFigure;
  palette: Palette;
  /** Letters of the notes that speak of the part. */
  letters?: string;
}

const REACTIVE = new Set(['bank', 'filter']);

function turnOf(place: PartPlace): number {
  if (place.hang === 'across') return -90;
  return place.kind === 'supply' && place.hang === 'below' ? 180 : 0;
}

/** A conductor as path data, in px from `to`. */
export function conductor(points: Point[], to: Point): string {
  return points.map(({ x, y }, at) => `${at === 0 ? 'M' : 'L'}${x - to.x},${y - to.y}`).join(' ');
}

/** Ink of symbol and conductors: in trouble, reactive, or plain. */
function inkOf(figure: PartFigure, palette: Palette): string {
  if (figure.off) return palette.ink2;
  if (figure.mark === 'fail') return palette.fail;
  return REACTIVE.has(figure.element.kind) ? palette.reactive : palette.ink;
}

/** Dashed out of service, dotted without voltage: told apart without colour. */
function dashOf(figure: PartFigure): string | undefined {
  if (figure.off) return '4 3';
  return figure.dead ? '1.5 2.5' : undefined;
}

/** A part around its symbol's centre: conductors, symbol, name, nameplate, readings, mark and letters. */
export function PartGlyph({ place, figure, palette, letters }: PartGlyphProps) {
  const ink = inkOf(figure, palette);
  const [first] = place.ends;
  return (
    <g>
      {place.ends.map((end) => (
        <path
          key={end.bus}
          className="conductor"
          d={conductor(end.path, place)}
          fill="none"
          stroke={ink}
          strokeWidth={figure.widths[end.bus] ?? 1.5}
          strokeDasharray={dashOf(figure)}
          strokeLinejoin="round"
        />
      ))}
      {first && figure.flow !== 0 && (
        <FlowArrow
          end={first}
          centre={place}
          into={figure.flow > 0}
          width={figure.widths[first.bus] ?? 1.5}
          ink={ink}
          paper={palette.sheet}
        />
      )}
      <SymbolGlyph
        shape={symbolShape(figure.element, figure.symbols)}
        ink={ink}
        dash={figure.off ? '3 2.5' : undefined}
        turn={turnOf(place)}
      />
      <PartText place={place} figure={figure} palette={palette} />
      <MarkAndLetters place={place} figure={figure} palette={palette} letters={letters ?? ''} />
    </g>
  );
}
