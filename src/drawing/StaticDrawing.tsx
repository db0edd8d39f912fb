import { useMemo } from 'react';
import type { Verdict } from '../checks/index.ts';
import type { CaseSolution } from '../engine/index.ts';
import { marksOf, type Study, studyInCase } from '../study/index.ts';
import { BusGlyph } from './glyphs/BusGlyph.tsx';
import { type Palette, printPalette } from './glyphs/Palette.ts';
import { PartGlyph } from './glyphs/PartGlyph.tsx';
import { differencesByPart, type Layout, layoutStudy } from './layout/index.ts';
import { drawingSize } from './marks/drawingSize.ts';
import { MarkGlyph } from './marks/MarkGlyph.tsx';
import { markShape } from './marks/markShape.ts';
import { figuresOf } from './readings/figures.ts';
import type { ReadingMode } from './readings/ReadingMode.ts';

export interface StaticDrawingProps {
  study: Study;
  caseId: string;
  layout?: Layout;
  solution: CaseSolution | null;
  verdicts?: readonly Verdict[];
  readingMode?: ReadingMode;
  /** The order of the readings in the order mode. */
  order?: number;
  palette?: Palette;
  fontFamily?: string;
  /** Accessible name. */
  title?: string;
}

/**
 * The single-line diagram as one still SVG with its colours as plain attributes, for the results sheet and
 * for copies: every state is told by shape, dash or word as well.
 */
export function StaticDrawing(props: StaticDrawingProps) {
  const { study, caseId, solution, palette = printPalette, fontFamily, verdicts = NO_VERDICTS } = props;
  const inCase = useMemo(() => studyInCase(study, caseId), [study, caseId]);
  const layout = useMemo(() => props.layout ?? layoutStudy(study), [props.layout, study]);
  const size = drawingSize(study, layout);
  const beside = { base: study, differences: differencesByPart(study, caseId) };
  const { readingMode = 'fundamental', order = 1 } = props;
  const figures = figuresOf(inCase, solution, verdicts, readingMode, order, null, beside);
  return (
    <svg
      xmlns="http://www.w3.org/2000/svg"
      viewBox={`0 0 ${size.width} ${size.height}`}
      width={size.width}
      height={size.height}
      fontFamily={fontFamily}
      role="img"
      aria-label={props.title ?? `Single-line diagram of ${study.title}`}
    >
      {layout.parts.map((place) => {
        const figure = figures.parts.get(place.id);
        if (!figure) return null;
        return (
          <g key={place.id} transform={`translate(${place.x} ${place.y})`}>
            <PartGlyph place={place} figure={figure} palette={palette} />
          </g>
        );
      })}
      {layout.buses.map((place) => {
        const figure = figures.buses.get(place.id);
        if (!figure) return null;
        return (
          <g key={place.id} transform={`translate(${place.x1} ${place.y})`}>
            <BusGlyph place={place} figure={figure} palette={palette} />
          </g>
        );
      })}
      {marksOf(study).map((mark) => (
        <MarkGlyph key={mark.id} shape={markShape(mark, layout)} palette={palette} />
      ))}
    </svg>
  );
}

const NO_VERDICTS: readonly Verdict[] = [];
