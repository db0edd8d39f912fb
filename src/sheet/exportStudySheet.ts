import { buildDocument, type SheetDocument, type SheetInput } from './document/index.ts';
import type { ExportOptions } from './ExportOptions.ts';
import { sheetFigures } from './figures.tsx';
import { withDrawingSize } from './withDrawingSize.ts';

/** A file name that tells site and revision: "kelder-cold-store-revision-b.pdf". */
export function sheetFileName(document: Pick<SheetDocument, 'title' | 'titleBlock'>): string {
  const plain = (text: string): string =>
    text
      .normalize('NFKD')
      .replace(/\p{M}/gu, '')
      .toLowerCase()
      .replace(/[^a-z0-9]+/g, '-')
      .replace(/^-|-$/g, '');
  const revision =
    document.titleBlock.revision === '' ? '' : `-revision-${plain(document.titleBlock.revision)}`;
  return `${plain(document.title) || 'results'}${revision}.pdf`;
}

/**
 * Writes the results sheet of a study as a PDF. The writer is loaded on first use; the work is cut into
 * short tasks, reports progress, and rejects with the signal's reason once that is aborted.
 */
export async function exportStudySheet(input: SheetInput, options: ExportOptions = {}): Promise<Blob> {
  const { exportSheet } = await import('./pdf/exportSheet.ts');
  options.signal?.throwIfAborted();
  return exportSheet(buildDocument(withDrawingSize(input)), sheetFigures(input), options);
}
