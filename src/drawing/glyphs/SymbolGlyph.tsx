import type { SymbolShape } from '../symbols/primitives.ts';

export interface SymbolGlyphProps {
  shape: SymbolShape;
  ink: string;
  /** Out of service: the outline is dashed. */
  dash?: string | undefined;
  /** Degrees, clockwise. */
  turn?: number;
  strokePx?: number;
}

/** A part's symbol around (0, 0), from the plain list of its shapes. */
export function SymbolGlyph({ shape, ink, dash, turn = 0, strokePx = 1.5 }: SymbolGlyphProps) {
  return (
    <g
      transform={turn === 0 ? undefined : `rotate(${turn})`}
      fill="none"
      stroke={ink}
      strokeWidth={strokePx}
      strokeDasharray={dash}
      strokeLinejoin="round"
    >
      {shape.primitives.map((primitive, at) => {
        // A symbol's list never changes its order: the place in it is the key.
        const key = `${primitive.shape}${at}`;
        if (primitive.shape === 'path') {
          const strokeWidth = primitive.weight === 'bold' ? strokePx * 2 : strokePx;
          return (
            <path key={key} d={primitive.d} strokeWidth={strokeWidth} fill={primitive.fill ? ink : 'none'} />
          );
        }
        if (primitive.shape === 'circle') {
          const { cx, cy, r, fill } = primitive;
          return <circle key={key} cx={cx} cy={cy} r={r} fill={fill ? ink : 'none'} />;
        }
        return (
          <text
            key={key}
            x={primitive.x}
            y={primitive.y}
            fontSize={primitive.sizePx}
            fontWeight={600}
            textAnchor="middle"
            fill={ink}
            stroke="none"
          >
            {primitive.text}
          </text>
        );
      })}
    </g>
  );
}
