import type { jsPDF } from 'jspdf';
import type { ReactElement } from 'react';
import { svg2pdf } from 'svg2pdf.js';
import type { FigureMark } from '../pages/marks.ts';
import type { Slicing } from '../slicing.ts';
import { PDF_FONT } from './fontFiles.ts';
import { mountFigure } from './mountFigure.ts';
import { portions } from './portions.ts';
import { markRuns } from './svgForPdf.ts';

/** Fonts must be ready in the page too, as figures are measured there. */
async function pageFonts(): Promise<void> {
  await Promise.all(
    ['400 10px "Varwright Sans"', '600 10px "Varwright Sans"', '10px "Varwright Marks"'].map((font) =>
      document.fonts.load(font, 'Aφ∠'),
    ),
  );
}

/** Draws a figure into its place on the current page, in as many tasks as it has portions. Needs a page. */
export async function drawFigure(
  pdf: jsPDF,
  mark: FigureMark,
  element: ReactElement,
  tasks: Slicing,
): Promise<void> {
  await pageFonts();
  await tasks.turn();
  const figure = mountFigure(element, mark.width, mark.height);
  try {
    markRuns(figure.svg);
    const { family, style, weight } = PDF_FONT['varwright-sans-regular'];
    const place = { x: mark.x, y: mark.y, width: mark.width, height: mark.height };
    for (const portion of portions(figure.svg)) {
      await tasks.turn();
      // svg2pdf begins with a family of its own in the style last set, which must be one that family has.
      pdf.setFont(family, style, weight);
      await svg2pdf(portion, pdf, place);
    }
  } finally {
    figure.remove();
  }
  await tasks.turn();
}
