import type { Palette } from '../glyphs/Palette.ts';
import { measures } from '../layout/index.ts';
import type { MarkShape } from './markShape.ts';

const LINE = measures.FONT_PX + 3;

/** A mark in the reviewer's pen: a stroke beside words, a cloud, a box, an arrow. */
export function MarkGlyph({ shape, palette }: { shape: MarkShape; palette: Palette }) {
  const { kind, path, lines, words, wordsBox } = shape;
  return (
    <g fontSize={measures.FONT_PX} fill={palette.pen}>
      {path !== '' && (
        <path
          d={path}
          fill="none"
          stroke={palette.pen}
          strokeWidth={1.5}
          strokeLinejoin="round"
          strokeLinecap="round"
          {...(kind === 'box' ? { strokeDasharray: '7 4' } : {})}
        />
      )}
      {kind === 'note' && lines.length > 0 && (
        <path
          d={`M${wordsBox.x - 5},${wordsBox.y + 1}v${wordsBox.height - 2}`}
          stroke={palette.pen}
          strokeWidth={1.5}
          fill="none"
        />
      )}
      {lines.length > 0 && <rect {...wordsBox} fill={palette.sheet} fillOpacity={0.82} stroke="none" />}
      {lines.length > 0 && (
        <text x={words.x} y={words.y} stroke="none">
          {lines
            .map((line, at) => ({ line, y: words.y + at * LINE }))
            .map(({ line, y }) => (
              <tspan key={y} x={words.x} y={y}>
                {line}
              </tspan>
            ))}
        </text>
      )}
    </g>
  );
}
