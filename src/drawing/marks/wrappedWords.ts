import { textWidth } from '../layout/index.ts';

/** Words in lines no wider than `width` px; line feeds are kept, a word too long alone is broken. */
export function wrappedWords(text: string, width: number): string[] {
  if (text.trim() === '') return [];
  return text
    .replace(/\s+$/, '')
    .split('\n')
    .flatMap((line) => wrapped(line, width));
}

function wrapped(line: string, width: number): string[] {
  const lines: string[] = [];
  let standing = '';
  for (const word of line.split(/\s+/).flatMap((one) => broken(one, width))) {
    const longer = standing === '' ? word : `${standing} ${word}`;
    if (standing !== '' && textWidth(longer) > width) {
      lines.push(standing);
      standing = word;
    } else standing = longer;
  }
  return [...lines, standing];
}

function broken(word: string, width: number): string[] {
  const pieces: string[] = [];
  let piece = '';
  for (const letter of word) {
    if (piece !== '' && textWidth(piece + letter) > width) {
      pieces.push(piece);
      piece = '';
    }
    piece += letter;
  }
  return [...pieces, piece];
}
