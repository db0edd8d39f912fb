/** Children put into one portion of a crowded drawing. */
const PORTION = 16;
/** Elements other ones refer to: every portion keeps them. */
const REFERRED = new Set(['defs', 'clipPath', 'pattern', 'linearGradient', 'marker', 'style', 'symbol']);

function mostCrowded(svg: SVGSVGElement): Element {
  let crowd: Element = svg;
  for (const element of svg.querySelectorAll('g, svg')) {
    if (element.childElementCount > crowd.childElementCount) crowd = element;
  }
  return crowd;
}

function apart(a: DOMRect, b: DOMRect): boolean {
  return a.right < b.left || b.right < a.left || a.bottom < b.top || b.bottom < a.top;
}

/**
 * The same drawing in portions that drawn one over the other give the whole, so that a crowded one is not
 * drawn in one task. What lies wholly outside the drawing's frame is left out. Each portion is the given
 * element with other children: draw it before asking for the next.
 */
export function* portions(svg: SVGSVGElement): Generator<SVGSVGElement> {
  const crowd = mostCrowded(svg);
  if (crowd.childElementCount <= PORTION) {
    yield svg;
    return;
  }
  const frame = svg.getBoundingClientRect();
  const children = [...crowd.children];
  const kept = children.filter(({ tagName }) => REFERRED.has(tagName));
  const shown = children.filter(
    (child) => !kept.includes(child) && !apart(child.getBoundingClientRect(), frame),
  );
  for (let first = 0; first < shown.length; first += PORTION) {
    crowd.replaceChildren(...kept, ...shown.slice(first, first + PORTION));
    yield svg;
  }
}
