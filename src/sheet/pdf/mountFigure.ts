import type { ReactElement } from 'react';
import { flushSync } from 'react-dom';
import { createRoot } from 'react-dom/client';

/** A drawing standing off-screen in the page, so that it can be measured. */
export interface MountedFigure {
  svg: SVGSVGElement;
  remove(): void;
}

/** Renders a figure off-screen; the drawing is a copy that may be changed. Throws RangeError where it renders no drawing. */
export function mountFigure(element: ReactElement, width: number, height: number): MountedFigure {
  const host = document.createElement('div');
  host.setAttribute('aria-hidden', 'true');
  host.style.cssText = `position:absolute;left:-10000px;top:0;width:${width}px;height:${height}px;overflow:hidden;contain:strict;color-scheme:light`;
  document.body.append(host);
  const root = createRoot(host);
  flushSync(() => root.render(element));
  const drawn = host.querySelector('svg');
  const copy = drawn?.cloneNode(true);
  flushSync(() => root.unmount());
  if (!(copy instanceof SVGSVGElement)) {
    host.remove();
    throw new RangeError('a figure of the sheet rendered no drawing');
  }
  host.replaceChildren(copy);
  return { svg: copy, remove: () => host.remove() };
}
