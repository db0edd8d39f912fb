import type { VerdictWord } from '../../checks/index.ts';
import { verdictWords } from '../readings/worstVerdict.ts';
import type { Palette } from './Palette.ts';

export interface VerdictMarkProps {
  verdict: VerdictWord;
  palette: Palette;
  x: number;
  y: number;
  /** The word stands below the mark instead of beside it. */
  stacked?: boolean;
}

/**
 * A verdict's mark and word around (x, y): a disc with a cross fails, a triangle watches, an open ring with a
 * question mark has no verdict, a bare tick passes. Each shape is told apart without colour.
 */
export function VerdictMark({ verdict, palette, x, y, stacked = false }: VerdictMarkProps) {
  const ink = { fail: palette.fail, watch: palette.watch, pass: palette.pass, unknown: palette.ink2 }[
    verdict
  ];
  return (
    <g transform={`translate(${x} ${y})`} data-verdict={verdict}>
      {verdict === 'fail' && (
        <>
          <circle r={7.5} fill={ink} />
          <path d="M-3,-3 L3,3 M3,-3 L-3,3" stroke={palette.sheet} strokeWidth={1.8} />
        </>
      )}
      {verdict === 'watch' && (
        <>
          <path d="M0,-8 L8.5,6.5 H-8.5 Z" fill={ink} strokeLinejoin="round" stroke={ink} />
          <path d="M0,-3.5 V1.5 M0,3.2 V5" stroke={palette.sheet} strokeWidth={1.8} />
        </>
      )}
      {verdict === 'unknown' && (
        <>
          <circle r={7} fill="none" stroke={ink} />
          <text y={4} fontSize={11} fontWeight={600} textAnchor="middle" fill={ink}>
            ?
          </text>
        </>
      )}
      {verdict === 'pass' && <path d="M-5,0 L-1.5,4 L5,-4.5" fill="none" stroke={ink} strokeWidth={1.8} />}
      {/* Stacked there is room for the short words only; the ring with its mark stands alone. */}
      {!(stacked && verdict === 'unknown') && (
        <text x={stacked ? -8 : 12} y={stacked ? 20 : 4} fontSize={11} fill={ink}>
          {verdictWords[verdict]}
        </text>
      )}
      <title>{verdictWords[verdict]}</title>
    </g>
  );
}
