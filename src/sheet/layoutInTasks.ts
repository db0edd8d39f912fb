import type { SheetDocument } from './document/index.ts';
import { layoutSteps } from './pages/layoutPages.ts';
import type { SheetPage } from './pages/marks.ts';
import type { Slicing } from './slicing.ts';

/** The pages of a document, laid out in tasks of a bounded length. */
export async function layoutInTasks(document: SheetDocument, tasks: Slicing): Promise<SheetPage[]> {
  const steps = layoutSteps(document);
  for (;;) {
    const step = steps.next();
    if (step.done) return step.value;
    await tasks.pause();
  }
}
