import type { Weight } from './marks.ts';
import { textWidth } from './measure.ts';

/** Pieces of a word too long for its line, cut where it fits. */
function cut(word: string, width: number, size: number, weight: Weight): string[] {
  const pieces: string[] = [];
  let piece = '';
  for (const character of word) {
    if (piece !== '' && textWidth(piece + character, size, weight) > width) {
      pieces.push(piece);
      piece = '';
    }
    piece += character;
  }
  return [...pieces, piece];
}

/** Lines of a text no wider than `width`, broken at spaces, inside a word only where it alone is too wide. */
export function wrap(text: string, width: number, size: number, weight: Weight = 'regular'): string[] {
  const space = textWidth(' ', size, weight);
  const lines: string[] = [];
  let line = '';
  let filled = 0;
  for (const word of text.split(/[ \n]+/)) {
    const own = textWidth(word, size, weight);
    const longer = line === '' ? own : filled + space + own;
    if (longer <= width) {
      line = line === '' ? word : `${line} ${word}`;
      filled = longer;
      continue;
    }
    if (line !== '') lines.push(line);
    const pieces = own <= width ? [word] : cut(word, width, size, weight);
    line = pieces.pop() ?? '';
    filled = own <= width ? own : textWidth(line, size, weight);
    lines.push(...pieces);
  }
  return [...lines, line];
}
