import { jsPDF } from 'jspdf';
import type { SheetDocument } from '../document/index.ts';
import type { SheetPages } from '../pages/marks.ts';

/** Stands for the creation date where a study has no revision date, as no clock may enter the file. */
const NO_DATE = '2000-01-01';

/** An empty PDF, its streams left plain (deflatePdf compresses them), whose metadata depend on the document alone: date, file id, title. */
export function newPdf(document: SheetDocument, pages: SheetPages): jsPDF {
  const pdf = new jsPDF({
    unit: 'pt',
    format: [pages.width, pages.height],
    orientation: pages.width > pages.height ? 'landscape' : 'portrait',
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
