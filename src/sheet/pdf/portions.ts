/** Children put into one portion of a crowded drawing. */
const PORTION = 16;
/** Elements other ones refer to: every portion keeps them. */
const REFERRED = new Set(['defs', 'clipPath', 'pattern', 'linearGradient', 'marker', 'style', 'symbol']);

const drawnChildren = (element: Element): Element[] =>
  [...element.children].filter(({ tagName }) => !REFERRED.has(tagName));

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

/** What is drawn before and after a group: its siblings and those of the groups around it. */
function around(svg: Element, crowd: Element): { before: Element[]; after: Element[] } {
  const before: Element[] = [];
  const after: Element[] = [];
  for (let inner = crowd; inner !== svg && inner.parentElement; inner = inner.parentElement) {
    const siblings = drawnChildren(inner.parentElement);
    const place = siblings.indexOf(inner);
    before.push(...siblings.slice(0, place));
    after.push(...siblings.slice(place + 1));
  }
  return { before, after };
}

/** Takes elements out of the drawing; the returned function puts them back where they stood. */
function taken(elements: readonly Element[]): () => void {
  const places = elements.map((element) => {
    const place = document.createComment('');
    element.replaceWith(place);
    return { element, place };
  });
  return () => {
    for (const { element, place } of places) place.replaceWith(element);
  };
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
  const drawn = drawnChildren(crowd);
  const kept = [...crowd.children].filter((child) => !drawn.includes(child));
  const shown = drawn.filter((child) => !apart(child.getBoundingClientRect(), frame));
  const { before, after } = around(svg, crowd);
  const restore = taken(after);
  for (let first = 0; first === 0 || first < shown.length; first += PORTION) {
    if (first === PORTION) taken(before);
    if (first + PORTION >= shown.length) restore();
    crowd.replaceChildren(...kept, ...shown.slice(first, first + PORTION));
    yield svg;
  }
}
