import metrics from '../fonts/metrics.json';
import type { Weight } from './marks.ts';

/** Widths of text, from the advance widths of the very fonts that screen and PDF draw with (no kerning). */

export type Face = 'varwright-sans-regular' | 'varwright-sans-semibold' | 'varwright-marks';

const FACE_OF: Record<Weight, Face> = {
  regular: 'varwright-sans-regular',
  semibold: 'varwright-sans-semibold',
};

function widthsOf(face: Face): Map<number, number> {
  const widths = new Map<number, number>();
  for (const [first, run] of Object.entries(metrics[face])) {
    run.split(' ').forEach((width, index) => {
      widths.set(Number(first) + index, Number(width));
    });
  }
  return widths;
}

const WIDTHS: Record<Face, Map<number, number>> = {
  'varwright-sans-regular': widthsOf('varwright-sans-regular'),
  'varwright-sans-semibold': widthsOf('varwright-sans-semibold'),
  'varwright-marks': widthsOf('varwright-marks'),
};

/** Subscripts are not set smaller than this many points. */
const SMALLEST = 7;

/** Printed for a character none of the fonts has. */
const STAND_IN = '□';

/** Part of a line that one font draws in one size. */
export interface FaceRun {
  face: Face;
  text: string;
  width: number;
  size: number;
  /** How far its baseline lies below the line's, in points: a subscript's. */
  drop: number;
}

/** A symbol of one letter with its subscript as the trade types it: I_rms, u_k, U_C,h, P_EC-R. */
const SUBSCRIPT = /(?<![\p{L}\p{N}_])(\p{L}\p{M}?″?)_([\p{L}\p{Nd}]+(?:,[\p{L}\p{Nd}]+)*(?:-R)?)/gu;
const SUBSCRIPT_SIZE = 0.8;
const SUBSCRIPT_DROP = 0.2;

/** Splits text into what stands on the line and what is set as a subscript. */
function scripts(text: string): { text: string; lowered: boolean }[] {
  const parts: { text: string; lowered: boolean }[] = [];
  let from = 0;
  for (const match of text.matchAll(SUBSCRIPT)) {
    const [, symbol = '', subscript = ''] = match;
    parts.push({ text: text.slice(from, match.index + symbol.length), lowered: false });
    parts.push({ text: subscript, lowered: true });
    from = match.index + match[0].length;
  }
  return [...parts, { text: text.slice(from), lowered: false }].filter((part) => part.text !== '');
}

/** Splits a line into runs by the font that has each character; widths in points. */
export function faceRuns(text: string, size: number, weight: Weight): FaceRun[] {
  const runs: FaceRun[] = [];
  for (const part of scripts(text.normalize('NFC'))) {
    const set = part.lowered ? Math.max(SMALLEST, size * SUBSCRIPT_SIZE) : size;
    const drop = part.lowered ? size * SUBSCRIPT_DROP : 0;
    for (const character of part.text) {
      const [face, printed, width] = glyphOf(character, FACE_OF[weight]);
      const last = runs.at(-1);
      const points = (width * set) / 1000;
      if (last?.face === face && last.drop === drop) {
        last.text += printed;
        last.width += points;
      } else {
        runs.push({ face, text: printed, width: points, size: set, drop });
      }
    }
  }
  return runs;
}

function glyphOf(character: string, face: Face): [Face, string, number] {
  const code = character.codePointAt(0) ?? 0;
  const own = WIDTHS[face].get(code);
  if (own !== undefined) return [face, character, own];
  const marks = WIDTHS['varwright-marks'].get(code);
  if (marks !== undefined) return ['varwright-marks', character, marks];
  return [face, STAND_IN, WIDTHS[face].get(0x25a1) ?? 600];
}

const known = new Map<string, number>();
const KNOWN_LIMIT = 20_000;

/** Width of one line of text in points. */
export function textWidth(text: string, size: number, weight: Weight = 'regular'): number {
  const key = `${weight} ${size} ${text}`;
  const found = known.get(key);
  if (found !== undefined) return found;
  const width = faceRuns(text, size, weight).reduce((sum, run) => sum + run.width, 0);
  if (known.size >= KNOWN_LIMIT) known.clear();
  known.set(key, width);
  return width;
}
