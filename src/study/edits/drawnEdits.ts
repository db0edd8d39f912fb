import { drawnItems, drawnWords, symbolSetWords } from '../drawn.ts';
import type { DrawnItem, Edit, Study, StudyView, SymbolSet } from '../types.ts';
import { makeEdit, patched } from './edit.ts';

/** The study with entries of its view replaced; one without any left has no view. */
export function withView(study: Study, patch: Partial<Record<keyof StudyView, unknown>>): Study {
  const before = study.view ?? {};
  const view = patched(before, patch);
  if (view === before) return study;
  const { view: _, ...rest } = study;
  return Object.keys(view).length > 0 ? { ...study, view } : rest;
}

/** Draws the study with the shapes of the other standard. */
export function setSymbols(_study: Study, symbols: SymbolSet): Edit {
  return makeEdit('drawing.symbols', `draw with symbols after ${symbolSetWords[symbols]}`, (current) =>
    withView(current, { symbols: symbols === 'iec60617' ? undefined : symbols }),
  );
}

/** Shows or hides one kind of figure on the drawing. */
export function setDrawn(_study: Study, item: DrawnItem, shown: boolean): Edit {
  const words = `${shown ? 'show' : 'hide'} the ${drawnWords[item]} on the drawing`;
  return makeEdit('drawing.show', words, (current) => {
    const before = current.view?.hidden ?? [];
    const hidden = drawnItems.filter((other) => (other === item ? !shown : before.includes(other)));
    return withView(current, { hidden: hidden.length > 0 ? hidden : undefined });
  });
}
