import { memo } from 'react';
import { BusGlyph } from '../glyphs/BusGlyph.tsx';
import { screenPalette } from '../glyphs/Palette.ts';
import { type BusPlace, measures } from '../layout/index.ts';
import type { BusFigure } from '../readings/figures.ts';
import { verdictWords } from '../readings/worstVerdict.ts';
import { busSubject } from '../subject.ts';
import { asButton } from './asButton.ts';

export interface BusViewProps {
  place: BusPlace;
  figure: BusFigure;
  letters: string;
  selected: boolean;
  current: boolean;
  /** Spoken of by a note under the pointer. */
  lit: boolean;
  /** Comes along with a part in the hand. */
  held: boolean;
  /** Under a part in the hand. */
  target: boolean;
  /** The rail stands here. */
  focus: boolean;
}

function sameFigure(a: BusFigure, b: BusFigure): boolean {
  return (
    a.name === b.name &&
    a.plate === b.plate &&
    a.text === b.text &&
    a.more === b.more &&
    a.mark === b.mark &&
    a.deenergised === b.deenergised &&
    a.darkened === b.darkened &&
    samePhasors(a.phasors, b.phasors)
  );
}

function samePhasors(a: BusFigure['phasors'], b: BusFigure['phasors']): boolean {
  if (!a || !b) return a === b;
  return a.every(([re, im], at) => {
    const other = b[at];
    return other && Math.abs(re - other[0]) < 2e-3 && Math.abs(im - other[1]) < 2e-3;
  });
}

function sameProps(a: BusViewProps, b: BusViewProps): boolean {
  return (
    a.place === b.place &&
    a.letters === b.letters &&
    a.selected === b.selected &&
    a.current === b.current &&
    a.lit === b.lit &&
    a.held === b.held &&
    a.target === b.target &&
    a.focus === b.focus &&
    sameFigure(a.figure, b.figure)
  );
}

/** One busbar on the drawing with its hit areas. */
export const BusView = memo(function BusView(props: BusViewProps) {
  const { place, figure, letters, selected, current, lit, held, target, focus } = props;
  const width = place.x2 - place.x1;
  const mark = figure.mark ? verdictWords[figure.mark] : '';
  const spoken = [
    'busbar',
    figure.name,
    figure.plate,
    figure.darkened ? `in this case ${figure.text}` : figure.text,
    figure.more,
    mark,
    focus ? 'on the rail' : '',
  ]
    .filter(Boolean)
    .join(', ');
  const classes = [
    'bus',
    selected && 'selected',
    lit && 'lit',
    held && 'held',
    target && 'target',
    focus && 'focus',
  ].filter(Boolean);
  return (
    <g
      className={classes.join(' ')}
      data-subject={busSubject(place.id)}
      {...asButton(selected)}
      aria-label={spoken}
      tabIndex={current ? 0 : -1}
      style={{ transform: `translate(${place.x1}px, ${place.y}px)` }}
    >
      <rect className="halo" x={-6} y={-6} width={width + 12} height={12} rx={6} />
      <BusGlyph place={place} figure={figure} palette={screenPalette} letters={letters} />
      <rect className="hit" x={-6} y={-9} width={width + 12} height={18} />
      <rect
        className="hit"
        x={place.label.x - place.x1}
        y={place.label.y - place.y}
        width={place.label.width}
        height={place.label.height}
      />
      {place.dial && (
        <circle
          className="hit"
          cx={place.dial.x - place.x1}
          cy={place.dial.y - place.y}
          r={measures.DIAL_RADIUS + 1}
        />
      )}
    </g>
  );
}, sameProps);
