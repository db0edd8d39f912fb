import { memo } from 'react';
import { trayNames } from '../gestures/TrayKind.ts';
import { FLAG, type FlagSeverity, FlagShape } from '../glyphs/FindingFlag.tsx';
import { screenPalette } from '../glyphs/Palette.ts';
import { PartGlyph } from '../glyphs/PartGlyph.tsx';
import { differenceMark, measures, type PartPlace } from '../layout/index.ts';
import type { PartFigure } from '../readings/figures.ts';
import { verdictWords } from '../readings/worstVerdict.ts';
import { partSubject } from '../subject.ts';
import { symbolShape } from '../symbols/symbolShape.ts';
import { asButton } from './asButton.ts';

export interface PartViewProps {
  place: PartPlace;
  figure: PartFigure;
  letters: string;
  flag: FlagSeverity | undefined;
  selected: boolean;
  /** Holds the drawing's one tab stop. */
  current: boolean;
  /** Spoken of by a note under the pointer. */
  lit: boolean;
  /** In the hand. */
  held: boolean;
  hatchId: string;
}

function sameFigure(a: PartFigure, b: PartFigure): boolean {
  return (
    a.element === b.element &&
    a.name === b.name &&
    a.plate === b.plate &&
    a.differences === b.differences &&
    a.mark === b.mark &&
    a.off === b.off &&
    a.dead === b.dead &&
    a.flow === b.flow &&
    a.words === b.words &&
    a.symbols === b.symbols &&
    a.cells.length === b.cells.length &&
    a.cells.every(({ value, unit }, at) => value === b.cells[at]?.value && unit === b.cells[at]?.unit) &&
    Object.entries(a.widths).every(([bus, width]) => b.widths[bus] === width)
  );
}

function sameProps(a: PartViewProps, b: PartViewProps): boolean {
  return (
    a.place === b.place &&
    a.letters === b.letters &&
    a.flag === b.flag &&
    a.selected === b.selected &&
    a.current === b.current &&
    a.lit === b.lit &&
    a.held === b.held &&
    sameFigure(a.figure, b.figure)
  );
}

/** Symbol box and text box of a part, around its symbol's centre. */
export function partBoxes(place: PartPlace, figure: PartFigure) {
  const shape = symbolShape(figure.element, figure.symbols);
  const [w, h] = place.hang === 'across' ? [shape.reach * 2, shape.width] : [shape.width, shape.reach * 2];
  const symbol = { x: -w / 2 - 5, y: -h / 2 - 5, width: w + 10, height: h + 10 };
  const text = { ...place.label, x: place.label.x - place.x, y: place.label.y - place.y };
  return { symbol, text };
}

function spoken(figure: PartFigure, letters: string, flag: FlagSeverity | undefined): string {
  const { element, name, cells, words, mark, off } = figure;
  const plate = figure.plate.replaceAll(differenceMark, 'in this case ');
  const readings = cells.map(({ value, unit, spoken }) => spoken ?? `${value} ${unit}`);
  const verdict = mark ? verdictWords[mark] : '';
  const notes = letters ? `notes ${letters}` : '';
  const data = flag ? flagWords[flag] : '';
  return [
    trayNames[element.kind],
    name,
    plate,
    off ? 'out of service' : words,
    ...readings,
    verdict,
    data,
    notes,
  ]
    .filter(Boolean)
    .join(', ');
}

/** One part on the drawing, with its hit areas, selection frame and foot handles. */
export const PartView = memo(function PartView(props: PartViewProps) {
  const { place, figure, letters, selected, current, lit, held, hatchId } = props;
  const { symbol, text } = partBoxes(place, figure);
  const classes = ['part', selected && 'selected', lit && 'lit', held && 'held'].filter(Boolean).join(' ');
  return (
    <g
      className={classes}
      data-subject={partSubject(place.id)}
      {...asButton(selected)}
      aria-label={spoken(figure, letters, props.flag)}
      tabIndex={current ? 0 : -1}
      style={{ transform: `translate(${place.x}px, ${place.y}px)` }}
    >
      <rect className="hit" {...symbol} />
      <rect className="hit" {...text} />
      {place.ends.map((end) => (
        <polyline
          key={end.bus}
          className="hit-line"
          points={end.path.map((p) => `${p.x - place.x},${p.y - place.y}`).join(' ')}
        />
      ))}
      <rect className="frame" {...symbol} rx={3} />
      <ReadingHatch place={place} figure={figure} hatchId={hatchId} />
      <PartGlyph place={place} figure={figure} palette={screenPalette} letters={letters} />
      {props.flag && <Flag place={place} symbol={symbol} severity={props.flag} />}
    </g>
  );
}, sameProps);

const flagWords: Record<FlagSeverity, string> = {
  error: 'an error in its data',
  warning: 'a warning about its data',
  note: 'a remark on its data',
};

interface FlagProps {
  place: PartPlace;
  symbol: { x: number; y: number };
  severity: FlagSeverity;
}

/** The flag of a finding, left of the symbol: below a source's verdict, above a tie. */
function Flag({ place, symbol, severity }: FlagProps) {
  const tie = place.hang === 'across';
  const x = tie ? -FLAG.width / 2 : symbol.x - FLAG.width + 2;
  const y = tie ? symbol.y - FLAG.height : place.hang === 'above' ? 2 : -FLAG.height / 2;
  const ink = { error: screenPalette.fail, warning: screenPalette.watch, note: screenPalette.ink2 }[severity];
  return (
    <g className="finding-flag" transform={`translate(${x} ${y})`}>
      <FlagShape severity={severity} ink={ink} />
      <title>{`There is ${flagWords[severity]}: see the findings (!)`}</title>
    </g>
  );
}

/** Shown while the readings are older than the drawing. */
function ReadingHatch({ place, figure, hatchId }: Pick<PartViewProps, 'place' | 'figure' | 'hatchId'>) {
  if (figure.cells.length === 0) return null;
  const { text, label } = place;
  const width = text.columns * (measures.CELL_WIDTH + measures.CELL_GAP);
  const x = (text.align === 'middle' ? label.x + (label.width - width) / 2 : label.x) - place.x;
  const above = (text.name.length + text.plateLines) * measures.LINE_PX;
  return (
    <rect
      className="reading-hatch"
      x={x}
      y={label.y - place.y + above}
      width={width}
      height={Math.ceil(figure.cells.length / text.columns) * measures.LINE_PX}
      fill={`url(#${hatchId})`}
    />
  );
}
