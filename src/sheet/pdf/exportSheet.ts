import type { jsPDF } from 'jspdf';
import { figuresOf } from '../document/figuresOf.ts';
import type { SheetDocument } from '../document/index.ts';
import type { ExportOptions } from '../ExportOptions.ts';
import type { FigureComposer } from '../FigureComposer.ts';
import { layoutInTasks } from '../layoutInTasks.ts';
import type { FigureMark, SheetPage } from '../pages/marks.ts';
import { type Slicing, slicing } from '../slicing.ts';
import { deflatePdf } from './deflatePdf.ts';
import { drawMark } from './drawMark.ts';
import { addFonts, type FontFiles, loadFontFiles } from './fontFiles.ts';
import { newPdf, orientationOf } from './newPdf.ts';

interface WriterOptions extends ExportOptions {
  /** Already loaded fonts; absent: fetched from the programme's own files. */
  fonts?: FontFiles;
}

async function drawPage(
  pdf: jsPDF,
  page: SheetPage,
  draw: (mark: FigureMark) => Promise<void>,
  tasks: Slicing,
): Promise<void> {
  for (const mark of page.marks) {
    if (mark.kind === 'figure') await draw(mark);
    else drawMark(pdf, mark);
    await tasks.pause();
  }
}

/**
 * Writes the sheet as a PDF: vectors, selectable text, embedded fonts. The same document and figures give
 * the same bytes. Works in short tasks on the main thread; an aborted signal rejects with its reason.
 */
export async function exportSheet(
  document: SheetDocument,
  compose: FigureComposer,
  options: WriterOptions = {},
): Promise<Blob> {
  const { signal, onProgress } = options;
  signal?.throwIfAborted();
  const tasks = slicing(signal);
  const fonts = options.fonts ?? (await loadFontFiles());
  await tasks.turn();
  const pages = await layoutInTasks(document, tasks);
  const figures = figuresOf(document);
  await tasks.turn();
  const [first] = pages;
  if (!first) throw new RangeError('the sheet has no page');
  const pdf = newPdf(document, first);
  addFonts(pdf, fonts);
  const count = pages.length;
  const total = count + figures.size;
  let done = 0;
  const draw = async (mark: FigureMark): Promise<void> => {
    const block = figures.get(mark.id);
    const element = block && compose(block, mark.width, mark.height);
    if (element) {
      const { drawFigure } = await import('./drawFigure.ts');
      await drawFigure(pdf, mark, element, tasks);
    }
    done += 1;
    onProgress?.({ done, total, what: `figures and pages, ${done} of ${total}` });
  };
  for (const page of pages) {
    if (page.number > 1) pdf.addPage([page.width, page.height], orientationOf(page));
    for (const section of page.sections) pdf.outline.add(null, section.title, { pageNumber: page.number });
    await drawPage(pdf, page, draw, tasks);
    done += 1;
    onProgress?.({ done, total, what: `page ${page.number} of ${count}` });
    await tasks.turn();
  }
  const plain = new Uint8Array(pdf.output('arraybuffer'));
  await tasks.turn();
  const parts = await deflatePdf(plain, () => tasks.pause());
  return new Blob(parts, { type: 'application/pdf' });
}
