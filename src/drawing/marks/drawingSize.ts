import { marksOf, type Study } from '../../study/index.ts';
import type { Layout } from '../layout/index.ts';
import { markShape } from './markShape.ts';

const EDGE = 14;

/** Size of the drawing with the marks on it, which may reach beyond the parts. */
export function drawingSize(study: Study, layout: Layout): { width: number; height: number } {
  let { width, height } = layout;
  for (const mark of marksOf(study)) {
    const { box } = markShape(mark, layout);
    width = Math.max(width, box.x + box.width + EDGE);
    height = Math.max(height, box.y + box.height + EDGE);
  }
  return { width, height };
}
