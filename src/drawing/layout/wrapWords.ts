import { textWidth } from './textWidth.ts';

/** How much wider two lines may become where they part at a separating dot instead of within words. */
const DOT_WORTH = 10;

interface Parting {
  first: string;
  second: string;
  /** Width of the wider line, px. */
  width: number;
  atDot: boolean;
}

/** Every way to part the words in two at a plain space; a no-break space keeps number and unit together. */
function partings(text: string, bold: boolean): Parting[] {
  const words = text.split(' ').filter(Boolean);
  return words.slice(1).map((word, index) => {
    const atDot = word === '·' || words[index] === '·';
    const first = words.slice(0, words[index] === '·' ? index : index + 1).join(' ');
    const second = words.slice(word === '·' ? index + 2 : index + 1).join(' ');
    const width = Math.max(textWidth(first, undefined, bold), textWidth(second, undefined, bold));
    return { first, second, width, atDot };
  });
}

/**
 * Words in at most two lines of at most `width` px, parted where the wider line is shortest; a separating dot
 * between the lines is dropped. What does not fit is cut and ends in an ellipsis.
 */
export function wrapWords(text: string, width: number, lines: number, bold = false): string[] {
  if (text === '' || lines === 0) return [];
  const fits = (line: string) => textWidth(line, undefined, bold) <= width;
  if (lines === 1 || fits(text)) return [cut(text, fits)];
  const worth = ({ atDot, width: wide }: Parting) => wide - (atDot && wide <= width ? DOT_WORTH : 0);
  const best = partings(text, bold).sort((a, b) => worth(a) - worth(b))[0];
  return best ? [cut(best.first, fits), cut(best.second, fits)] : [cut(text, fits)];
}

function cut(line: string, fits: (line: string) => boolean): string {
  if (fits(line)) return line;
  const characters = [...line];
  let [kept, most] = [0, characters.length];
  while (kept < most) {
    const middle = Math.ceil((kept + most) / 2);
    if (fits(`${characters.slice(0, middle).join('')}…`)) kept = middle;
    else most = middle - 1;
  }
  return `${characters.slice(0, kept).join('').trimEnd()}…`;
}

/** The least width at which the words stand in two lines uncut. */
export function twoLineWidth(text: string, bold = false): number {
  const whole = textWidth(text, undefined, bold);
  return Math.min(whole, ...partings(text, bold).map(({ width }) => width));
}
