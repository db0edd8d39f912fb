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

/** Printed for a character none of the fonts has. */
const STAND_IN = '□';

/** Part of a line that one font draws. */
export interface FaceRun {
  face: Face;
  text: string;
  width: number;
}

/** Splits a line into runs by the font that has each character; widths in points. */
export function faceRuns(text: string, size: number, weight: Weight): FaceRun[] {
  const runs: FaceRun[] = [];
  for (const character of text.normalize('NFC')) {
    const [face, printed, width] = glyphOf(character, FACE_OF[weight]);
    const last = runs.at(-1);
    const points = (width * size) / 1000;
    if (last?.face === face) {
      last.text += printed;
      last.width += points;
    } else {
      runs.push({ face, text: printed, width: points });
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

/** Width of one line of text in points. */
export function textWidth(text: string, size: number, weight: Weight = 'regular'): number {
  return faceRuns(text, size, weight).reduce((sum, run) => sum + run.width, 0);
}
