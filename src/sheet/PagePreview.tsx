import { memo } from 'react';
import type { Figure } from './document/index.ts';
import type { FigureComposer } from './FigureComposer.ts';
import { type FigureMark, INKS, type PageMark, type SheetPage, type TextMark } from './pages/marks.ts';
import { faceRuns } from './pages/measure.ts';

const FAMILY = '"Varwright Sans", "Varwright Marks", sans-serif';
const TEXT_STYLE = { fontKerning: 'none', whiteSpace: 'pre' } as const;

interface PageProps {
  page: SheetPage;
  figures: ReadonlyMap<string, Figure>;
  compose: FigureComposer;
}

function PlacedFigure({
  mark,
  figures,
  compose,
}: { mark: FigureMark } & Pick<PageProps, 'figures' | 'compose'>) {
  const figure = figures.get(mark.id);
  const drawing = figure && compose(figure, mark.width, mark.height);
  if (!figure || !drawing) return null;
  return (
    <g transform={`translate(${mark.x} ${mark.y})`}>
      <title>{figure.label}</title>
      {drawing}
    </g>
  );
}

/** Marks of one kind never begin at the same place. */
function placeOf(mark: PageMark): string {
  return mark.kind === 'line' ? `line ${mark.x1} ${mark.y1}` : `${mark.kind} ${mark.x} ${mark.y}`;
}

/** Runs stand where the page layout put them, as in the PDF: subscripts and marks have runs of their own. */
function TextRuns({ mark }: { mark: TextMark }) {
  const runs = faceRuns(mark.text, mark.size, mark.weight);
  const [only] = runs;
  const style = {
    fontWeight: mark.weight === 'semibold' ? 600 : 400,
    fill: INKS[mark.ink],
    style: TEXT_STYLE,
  };
  if (runs.length === 1 && only) {
    return (
      <text x={mark.x} y={mark.y} fontSize={mark.size} {...style}>
        {only.text}
      </text>
    );
  }
  let x = mark.x;
  const placed = runs.map((run) => {
    const span = { ...run, x };
    x += run.width;
    return span;
  });
  return (
    <text {...style}>
      {placed.map((run) => (
        <tspan key={run.x} x={run.x} y={mark.y + run.drop} fontSize={run.size}>
          {run.text}
        </tspan>
      ))}
    </text>
  );
}

function Mark({ mark, ...rest }: { mark: PageMark } & Pick<PageProps, 'figures' | 'compose'>) {
  switch (mark.kind) {
    case 'figure':
      return <PlacedFigure mark={mark} {...rest} />;
    case 'line':
      return (
        <line
          x1={mark.x1}
          y1={mark.y1}
          x2={mark.x2}
          y2={mark.y2}
          stroke={INKS[mark.ink]}
          strokeWidth={mark.width}
        />
      );
    case 'box':
      return (
        <rect
          x={mark.x}
          y={mark.y}
          width={mark.width}
          height={mark.height}
          fill="none"
          stroke={INKS[mark.ink]}
          strokeWidth={mark.stroke}
        />
      );
    case 'text':
      return <TextRuns mark={mark} />;
  }
}

/** One page of the sheet, drawn from the same marks the PDF is written from. */
export const PagePreview = memo(function PagePreview({ page, ...rest }: PageProps) {
  return (
    <svg className="sheet-page" viewBox={`0 0 ${page.width} ${page.height}`} fontFamily={FAMILY}>
      {page.marks.map((mark) => (
        <Mark key={placeOf(mark)} mark={mark} {...rest} />
      ))}
    </svg>
  );
});
