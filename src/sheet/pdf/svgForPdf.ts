import { faceRuns } from '../pages/measure.ts';

const SVG = 'http://www.w3.org/2000/svg';

/**
 * Sets characters the text family lacks in the family of marks, run by run: the PDF writer knows no
 * fallback font inside a text. Changes the given drawing.
 */
export function markRuns(svg: SVGElement): void {
  if (!svg.hasAttribute('font-family')) svg.setAttribute('font-family', 'Varwright Sans');
  // There is no slanted cut in the file: such text stands upright.
  for (const slanted of svg.querySelectorAll('[font-style]')) slanted.removeAttribute('font-style');
  const walker = document.createTreeWalker(svg, NodeFilter.SHOW_TEXT);
  const texts: Text[] = [];
  for (let node = walker.nextNode(); node; node = walker.nextNode()) {
    if (node.parentElement?.closest('text') && node.nodeValue?.trim()) texts.push(node as Text);
  }
  for (const text of texts) {
    const runs = faceRuns(text.data, 10, 'regular');
    if (runs.every(({ face }) => face !== 'varwright-marks')) continue;
    const parts = runs.map((run) => {
      const span = document.createElementNS(SVG, 'tspan');
      if (run.face === 'varwright-marks') {
        span.setAttribute('font-family', 'Varwright Marks');
        span.setAttribute('font-weight', '400');
      }
      span.textContent = run.text;
      return span;
    });
    text.replaceWith(...parts);
  }
}
