import type { ReactElement } from 'react';
import type { Figure } from './document/index.ts';

/** The drawing of a figure, an svg of the given size in points; null where there is nothing to draw. */
export type FigureComposer = (figure: Figure, width: number, height: number) => ReactElement | null;
