import type { Figure, SheetDocument } from './model.ts';

/** Every figure of the document by its id. */
export function figuresOf(document: SheetDocument): Map<string, Figure> {
  const figures = document.sections
    .flatMap(({ blocks }) => blocks)
    .flatMap((block): Figure[] => {
      if (block.kind === 'figure') return [block];
      return block.kind === 'figureRow' ? block.figures : [];
    });
  return new Map(figures.map((figure) => [figure.id, figure]));
}
