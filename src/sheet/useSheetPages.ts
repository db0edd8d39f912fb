import { startTransition, useEffect, useState } from 'react';
import { figuresOf } from './document/figuresOf.ts';
import { buildDocument, type Figure, type PaperName, type SheetInput } from './document/index.ts';
import type { FigureComposer } from './FigureComposer.ts';
import { sheetFigures } from './figures.tsx';
import { layoutInTasks } from './layoutInTasks.ts';
import type { SheetPage } from './pages/marks.ts';
import { slicing } from './slicing.ts';
import { withDrawingSize } from './withDrawingSize.ts';

/** A sheet laid out for the preview, and the input it was made from. */
export interface LaidOutSheet {
  input: SheetInput;
  paper: PaperName;
  pages: readonly SheetPage[];
  figures: ReadonlyMap<string, Figure>;
  compose: FigureComposer;
}

async function layOut(input: SheetInput, signal: AbortSignal): Promise<LaidOutSheet> {
  const tasks = slicing(signal);
  await tasks.turn();
  const document = buildDocument(withDrawingSize(input));
  await tasks.turn();
  const pages = await layoutInTasks(document, tasks);
  return { input, paper: document.paper, pages, figures: figuresOf(document), compose: sheetFigures(input) };
}

/** The pages of the newest input that is laid out; null until there is one. Work for an older one is dropped. */
export function useSheetPages(input: SheetInput): LaidOutSheet | null {
  const [sheet, setSheet] = useState<LaidOutSheet | null>(null);
  const [failure, setFailure] = useState<unknown>(null);
  useEffect(() => {
    const abort = new AbortController();
    layOut(input, abort.signal).then(
      (laidOut) => startTransition(() => setSheet(laidOut)),
      (error: unknown) => {
        if (!abort.signal.aborted) setFailure(error);
      },
    );
    return () => abort.abort();
  }, [input]);
  if (failure) throw failure;
  return sheet;
}
