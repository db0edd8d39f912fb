import type { ReactElement } from 'react';
import { mountFigure } from '../../sheet/index.ts';

const SVG = 'http://www.w3.org/2000/svg';

/** Named first; the others stand in where it is not installed. */
export const FONTS =
  "'Varwright Sans', 'Varwright Marks', 'Source Sans 3', 'Segoe UI', Helvetica, Arial, sans-serif";

export interface Picture {
  /** What it shows; the file is named after it. */
  name: string;
  figure: ReactElement;
  width: number;
  height: number;
}

/** A figure as SVG text that stands by itself: title, fonts named, white paper, no reference to the page. */
export function standaloneSvg({ name, figure, width, height }: Picture, fonts = ''): string {
  const { svg, remove } = mountFigure(figure, width, height);
  svg.setAttribute('width', String(width));
  svg.setAttribute('height', String(height));
  if (!svg.hasAttribute('viewBox')) svg.setAttribute('viewBox', `0 0 ${width} ${height}`);
  svg.setAttribute('font-family', FONTS);
  for (const named of svg.querySelectorAll('[font-family]')) named.removeAttribute('font-family');
  // Hooks of the page's own style sheet mean nothing outside it.
  for (const classed of svg.querySelectorAll('[class]')) classed.removeAttribute('class');
  const title = document.createElementNS(SVG, 'title');
  title.textContent = name;
  const paper = document.createElementNS(SVG, 'rect');
  for (const [key, value] of Object.entries({ width: '100%', height: '100%', fill: '#ffffff' }))
    paper.setAttribute(key, value);
  const style = document.createElementNS(SVG, 'style');
  style.textContent = fonts;
  svg.prepend(title, ...(fonts ? [style] : []), paper);
  const text = new XMLSerializer().serializeToString(svg);
  remove();
  return text;
}
