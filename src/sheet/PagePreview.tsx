import { memo } from 'react';
import type { Figure } from './document/index.ts';
import type { FigureComposer } from './FigureComposer.ts';
import { type FigureMark, INKS, type PageMark, type SheetPage } from './pages/marks.ts';

const FAMILY = '"Varwright Sans", "Varwright Marks", sans-serif';
const TEXT_STYLE = { fontKerning: 'none', whiteSpace: 'pre' } as const;

interface PageProps {
  page: SheetPage;
  width: number;
  height: number;
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
      return (
        <text
          x={mark.x}
          y={mark.y}
          fontSize={mark.size}
          fontWeight={mark.weight === 'semibold' ? 600 : 400}
          fill={INKS[mark.ink]}
          style={TEXT_STYLE}
        >
          {mark.text}
        </text>
      );
  }
}

/** One page of the sheet, drawn from the same marks the PDF is written from. */
export const PagePreview = memo(function PagePreview({ page, width, height, ...rest }: PageProps) {
  return (
    <svg className="sheet-page" viewBox={`0 0 ${width} ${height}`} fontFamily={FAMILY}>
      {page.marks.map((mark) => (
        <Mark key={placeOf(mark)} mark={mark} {...rest} />
      ))}
    </svg>
  );
});
