import { jsPDF } from 'jspdf';
import type { SheetDocument } from '../document/index.ts';
import type { SheetPage } from '../pages/marks.ts';

/** Stands for the creation date where a study has no revision date, as no clock may enter the file. */
const NO_DATE = '2000-01-01';

/** jsPDF turns a page's sides round unless it is told how they stand. */
export const orientationOf = ({ width, height }: Pick<SheetPage, 'width' | 'height'>) =>
  width > height ? 'landscape' : 'portrait';

/** An empty PDF, its streams left plain (deflatePdf compresses them), whose metadata depend on the document alone: date, file id, title. */
export function newPdf(document: SheetDocument, first: Pick<SheetPage, 'width' | 'height'>): jsPDF {
  const pdf = new jsPDF({
    unit: 'pt',
    format: [first.width, first.height],
    orientation: orientationOf(first),
    compress: false,
    putOnlyUsedFonts: true,
    precision: 3,
    floatPrecision: 3,
  });
  const day = (document.revisionDate ?? NO_DATE).replaceAll('-', '');
  pdf.setCreationDate(`D:${day}000000+00'00'`);
  pdf.setFileId(document.fingerprint.padEnd(32, '0').slice(0, 32).toUpperCase());
  pdf.setDocumentProperties({
    title: document.title,
    subject: document.subtitle,
    author: document.titleBlock.preparedBy,
    keywords: document.fingerprint,
    creator: document.programme,
  });
  pdf.setLanguage('en-GB');
  return pdf;
}
