import type { VerdictWord } from '../../checks/index.ts';
import { VERDICT_WORDS } from './verdictWords.ts';

const GLYPHS: Record<VerdictWord, string> = {
  pass: 'M4.6,8.3l2.4,2.4l4.4,-5',
  watch: 'M8,4v4.8M8,11.3v0.4',
  fail: 'M5.2,5.2l5.6,5.6m0,-5.6l-5.6,5.6',
  unknown: 'M5.9,6.4a2.1,2.1 0 1 1 3.2,1.8c-0.8,0.5 -1.1,0.8 -1.1,1.6M8,11.7v0.3',
};

interface VerdictMarkProps {
  verdict: VerdictWord;
  size?: number;
  /** The word stands beside it already. */
  hidden?: boolean;
}

/** The mark of a verdict: a filled disc with its own sign, an open one where there is no verdict. */
export function VerdictMark({ verdict, size = 17, hidden = false }: VerdictMarkProps) {
  const named = hidden ? { 'aria-hidden': true } : { role: 'img', 'aria-label': VERDICT_WORDS[verdict] };
  return (
    <svg className={`mark mark-${verdict}`} width={size} height={size} viewBox="0 0 16 16" {...named}>
      <circle cx={8} cy={8} r={7.2} />
      <path d={GLYPHS[verdict]} />
    </svg>
  );
}
