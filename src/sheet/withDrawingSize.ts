import { drawingSize, layoutStudy } from '../drawing/index.ts';
import type { SheetInput } from './document/index.ts';

/** The input with the size of its single-line diagram, laid out where the caller has not done so. */
export function withDrawingSize(input: SheetInput): SheetInput {
  if (input.drawingSize) return input;
  return { ...input, drawingSize: drawingSize(input.study, layoutStudy(input.study)) };
}
