import type { VerdictWord } from '../../checks/index.ts';
import { verdictWords } from '../readings/worstVerdict.ts';
import type { Palette } from './Palette.ts';

export interface VerdictMarkProps {
  verdict: VerdictWord;
  palette: Palette;
  x: number;
  y: number;
  /** Where the word stands: beside the mark, below it, or below it and ending with it. */
  word?: 'beside' | 'below' | 'below-left';
}

const WORD_PLACES = {
  beside: { x: 11, y: 4, textAnchor: 'start' },
  below: { x: -8, y: 19, textAnchor: 'start' },
  'below-left': { x: 8, y: 19, textAnchor: 'end' },
} as const;

/**
 * A verdict's mark and word around (x, y): a disc with a cross fails, a triangle watches, an open ring with a
 * question mark has no verdict, a bare tick passes. Each shape is told apart without colour.
 */
export function VerdictMark({ verdict, palette, x, y, word = 'beside' }: VerdictMarkProps) {
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
          <path d="M0,-7 L7.5,6 H-7.5 Z" fill={ink} strokeLinejoin="round" stroke={ink} />
          <path d="M0,-3 V1.5 M0,3 V4.8" stroke={palette.sheet} strokeWidth={1.8} />
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
      {/* The drawing has room for short words only; the ring with its question mark stands alone. */}
      {verdict !== 'unknown' && (
        <text {...WORD_PLACES[word]} fontSize={11} fill={ink}>
          {verdictWords[verdict]}
        </text>
      )}
      <title>{verdictWords[verdict]}</title>
    </g>
  );
}
