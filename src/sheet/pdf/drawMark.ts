import type { jsPDF } from 'jspdf';
import { type FigureMark, INKS, type PageMark, type TextMark } from '../pages/marks.ts';
import { faceRuns } from '../pages/measure.ts';
import { PDF_FONT } from './fontFiles.ts';

function drawText(pdf: jsPDF, mark: TextMark): void {
  let x = mark.x;
  for (const run of faceRuns(mark.text, mark.size, mark.weight)) {
    const { family, style, weight } = PDF_FONT[run.face];
    pdf.setFont(family, style, weight);
    pdf.setFontSize(run.size);
    pdf.setTextColor(INKS[mark.ink]);
    pdf.text(run.text, x, mark.y + run.drop);
    x += run.width;
  }
}

/** Puts one mark on the current page. Figures have their own way in. */
export function drawMark(pdf: jsPDF, mark: Exclude<PageMark, FigureMark>): void {
  if (mark.kind === 'text') {
    drawText(pdf, mark);
    return;
  }
  pdf.setDrawColor(INKS[mark.ink]);
  if (mark.kind === 'line') {
    pdf.setLineWidth(mark.width);
    pdf.line(mark.x1, mark.y1, mark.x2, mark.y2);
    return;
  }
  pdf.setLineWidth(mark.stroke);
  pdf.rect(mark.x, mark.y, mark.width, mark.height, 'S');
}
