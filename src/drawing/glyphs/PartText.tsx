import { differenceMark, measures, type PartPlace, wrapWords } from '../layout/index.ts';
import { differenceWords } from '../readings/differenceWords.ts';
import type { PartFigure } from '../readings/figures.ts';
import type { Palette } from './Palette.ts';

const { LINE_PX, BASELINE, CELL_SHIFT, CELL_WIDTH, CELL_GAP, VALUE_WIDTH, UNIT_GAP } = measures;

export interface PartTextProps {
  place: PartPlace;
  figure: PartFigure;
  palette: Palette;
}

/** A piece of text with its place, told apart by its place among the others. */
interface Piece {
  key: string;
  x: number;
  y: number;
  text: string;
}

function pieces(texts: readonly string[], x: (at: number) => number, y: (at: number) => number): Piece[] {
  return texts.map((text, at) => ({ key: `piece${at}`, x: x(at), y: y(at), text }));
}

function Pieces({ of }: { of: readonly Piece[] }) {
  return of.map(({ key, x, y, text }) => (
    <tspan key={key} x={x} y={y}>
      {text}
    </tspan>
  ));
}

/** Name, nameplate and live figures; figures end and units begin at fixed places, so nothing jumps while scrubbing. */
export function PartText({ place, figure, palette }: PartTextProps) {
  const { text, label } = place;
  const middle = text.align === 'middle';
  const x = (middle ? label.x + label.width / 2 : label.x) - place.x;
  const top = label.y - place.y + BASELINE;
  const plateY = top + text.name.length * LINE_PX;
  const readingY = plateY + text.plateLines * LINE_PX;
  const ink = figure.mark === 'fail' && !figure.off ? palette.fail : palette.current;
  const cells = figure.cells.slice(0, text.readings);
  // Most units are short: half their room to the right keeps figures in the middle.
  const cellLeft = middle ? x - CELL_WIDTH / 2 + CELL_SHIFT : x;
  const valueX = (at: number) => cellLeft + (at % text.columns) * (CELL_WIDTH + CELL_GAP) + VALUE_WIDTH;
  const valueY = (at: number) => readingY + Math.floor(at / text.columns) * LINE_PX;
  const line = (from: number) => (at: number) => from + at * LINE_PX;
  const values = cells.map(({ value }) => value);
  const units = cells.map(({ unit }) => unit);
  const plate = wrapWords(figure.plate, label.width, text.plateLines);
  const changed = figure.differences.length > 0;
  // Where no nameplates are drawn the name carries the mark of what the case changes.
  const name =
    changed && plate.length === 0 ? text.name.with(0, `${differenceMark}${text.name[0] ?? ''}`) : text.name;
  const told = [
    ...(plate.at(-1)?.endsWith('…') ? [figure.plate] : []),
    ...differenceWords(figure.differences),
  ];
  return (
    <g textAnchor={middle ? 'middle' : 'start'} fontSize={measures.FONT_PX}>
      <text fontWeight={600} fill={palette.ink}>
        {text.name.at(-1)?.endsWith('…') && <title>{figure.name}</title>}
        <Pieces of={pieces(name, () => x, line(top))} />
      </text>
      <text className="plate" fill={changed ? palette.ink : palette.ink2}>
        {told.length > 0 && <title>{told.join('\n')}</title>}
        <Pieces of={pieces(plate, () => x, line(plateY))} />
      </text>
      {figure.words !== '' && (
        <text className="reading" x={x} y={readingY} fill={palette.ink2} fontStyle="italic">
          {figure.words}
        </text>
      )}
      <text className="reading" textAnchor="end" fill={ink} fontWeight={figure.mark === 'fail' ? 600 : 400}>
        <Pieces of={pieces(values, valueX, valueY)} />
      </text>
      <text className="reading" textAnchor="start" fill={ink}>
        <Pieces of={pieces(units, (at) => valueX(at) + UNIT_GAP, valueY)} />
      </text>
    </g>
  );
}
