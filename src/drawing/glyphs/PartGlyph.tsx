import { measures, type PartPlace, type Point, textWidth } from '../layout/index.ts';
import { type PartFigure, readingLines } from '../readings/figures.ts';
import { verdictWords } from '../readings/worstVerdict.ts';
import { symbolShape } from '../symbols/symbolShape.ts';
import type { Palette } from './Palette.ts';
import { SymbolGlyph } from './SymbolGlyph.tsx';
import { VerdictMark } from './VerdictMark.tsx';

export interface PartGlyphProps {
  place: PartPlace;
  figure: PartFigure;
  palette: Palette;
  /** Letters of the notes that speak of the part. */
  letters?: string;
}

/** Lines are told apart by their place. */
const PLACES = ['first', 'second', 'third'];
const REACTIVE = new Set(['bank', 'filter']);

function turnOf(place: PartPlace): number {
  if (place.hang === 'across') return -90;
  return place.kind === 'supply' && place.hang === 'below' ? 180 : 0;
}

function relative(points: Point[], to: Point): string {
  return points.map(({ x, y }, at) => `${at === 0 ? 'M' : 'L'}${x - to.x},${y - to.y}`).join(' ');
}

/** Ink of symbol and conductors: in trouble, reactive, or plain. */
function inkOf(figure: PartFigure, palette: Palette): string {
  if (figure.mark === 'fail' && !figure.off) return palette.fail;
  return REACTIVE.has(figure.element.kind) && !figure.off ? palette.reactive : palette.ink;
}

/** A part around its symbol's centre: conductors, symbol, name, nameplate, readings, mark and letters. */
export function PartGlyph({ place, figure, palette, letters }: PartGlyphProps) {
  const { element } = figure;
  const ink = inkOf(figure, palette);
  return (
    <g>
      {place.ends.map((end) => (
        <path
          key={end.bus}
          d={relative(end.path, place)}
          fill="none"
          stroke={ink}
          strokeWidth={figure.widths[end.bus] ?? 1.5}
          strokeDasharray={figure.off ? '4 3' : undefined}
          strokeOpacity={figure.dead ? 0.45 : undefined}
          strokeLinejoin="round"
        />
      ))}
      <SymbolGlyph shape={symbolShape(element)} ink={ink} faint={figure.off} turn={turnOf(place)} />
      <PartText place={place} figure={figure} palette={palette} />
      <MarkAndLetters place={place} figure={figure} palette={palette} letters={letters ?? ''} />
    </g>
  );
}

function PartText({ place, figure, palette }: Omit<PartGlyphProps, 'letters'>) {
  const { name, plate } = figure;
  const middle = place.align === 'middle';
  const x = (middle ? place.label.x + place.label.width / 2 : place.label.x) - place.x;
  const top = place.label.y - place.y + 11;
  const line = measures.LINE_PX;
  const readingInk = figure.mark === 'fail' && !figure.off ? palette.fail : palette.current;
  const firstReading = place.oneLine ? 1 : 2;
  return (
    <g textAnchor={middle ? 'middle' : 'start'} fontSize={measures.FONT_PX}>
      <text x={x} y={top} fontWeight={600} fill={palette.ink}>
        {name}
        {place.oneLine && (
          <tspan className="plate" dx={8} fontWeight={400} fill={palette.ink2}>
            {plate}
          </tspan>
        )}
      </text>
      {!place.oneLine && (
        <text className="plate" x={x} y={top + line} fill={palette.ink2}>
          {plate}
        </text>
      )}
      {readingLines(figure, place.align).map((text, at) => (
        <text
          key={PLACES[at]}
          className="reading"
          x={x}
          y={top + (firstReading + at) * line}
          fill={figure.off ? palette.ink2 : readingInk}
          fontWeight={figure.mark === 'fail' && at === 0 ? 600 : 400}
          fontStyle={figure.off ? 'italic' : undefined}
        >
          {text}
        </text>
      ))}
    </g>
  );
}

interface MarkProps {
  place: PartPlace;
  figure: PartFigure;
  palette: Palette;
  letters: string;
}

/** Beside a hanging symbol the word stands under the mark; elsewhere mark, word and letters share a row. */
function MarkAndLetters({ place, figure, palette, letters }: MarkProps) {
  const shown = figure.mark !== undefined && figure.mark !== 'pass';
  if (!shown && letters === '') return null;
  const stacked = place.hang === 'below';
  const [x, y] = [place.mark.x - place.x + 8, place.mark.y - place.y + 8];
  const word = figure.mark ? verdictWords[figure.mark] : '';
  const lettersX = !shown ? -8 : stacked ? 12 : 18 + textWidth(word, 11);
  return (
    <g>
      {shown && figure.mark && (
        <VerdictMark verdict={figure.mark} palette={palette} x={x} y={y} stacked={stacked} />
      )}
      <text
        className="letters"
        x={x + lettersX}
        y={y + 4}
        fontSize={12}
        fontWeight={600}
        fill={figure.mark === 'fail' ? palette.fail : palette.ink2}
      >
        {letters}
      </text>
    </g>
  );
}
