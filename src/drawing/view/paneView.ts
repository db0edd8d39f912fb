/** How the drawing lies in its pane: screen = drawing · scale + (x, y), px. */
export interface PaneView {
  scale: number;
  x: number;
  y: number;
}

export interface Size {
  width: number;
  height: number;
}

export const LEAST_SCALE = 0.05;
export const MOST_SCALE = 4;
const EDGE = 12;
/** A pane up to this wide shows a small site at 100 %; a wider one, on a large screen, larger in proportion. */
const USUAL_PANE = 1200;
const MOST_FITTED = 1.5;

function clampScale(scale: number): number {
  return Math.min(Math.max(scale, LEAST_SCALE), MOST_SCALE);
}

/** The whole drawing in the pane, no larger than 100 % (150 % in a large pane), centred sideways and close to the top. */
export function fitView(content: Size, pane: Size): PaneView {
  const room = Math.min((pane.width - 2 * EDGE) / content.width, (pane.height - 2 * EDGE) / content.height);
  const most = Math.min(MOST_FITTED, Math.max(1, pane.width / USUAL_PANE));
  const scale = clampScale(Math.min(most, Math.max(room, LEAST_SCALE)));
  const slack = pane.height - content.height * scale;
  return { scale, x: (pane.width - content.width * scale) / 2, y: Math.max(EDGE, slack / 3) };
}

/** Zooms by a factor and keeps what is under the pointer where it is. */
export function zoomAt(view: PaneView, factor: number, at: { x: number; y: number }): PaneView {
  const scale = clampScale(view.scale * factor);
  const ratio = scale / view.scale;
  return { scale, x: at.x - (at.x - view.x) * ratio, y: at.y - (at.y - view.y) * ratio };
}

/** Keeps at least a strip of the drawing inside the pane. */
export function keepInSight(view: PaneView, content: Size, pane: Size): PaneView {
  const strip = 80;
  const clamp = (at: number, length: number, room: number) =>
    Math.min(Math.max(at, strip - length), Math.max(room - strip, strip - length));
  return {
    scale: view.scale,
    x: clamp(view.x, content.width * view.scale, pane.width),
    y: clamp(view.y, content.height * view.scale, pane.height),
  };
}

export function toDrawing(view: PaneView, at: { x: number; y: number }): { x: number; y: number } {
  return { x: (at.x - view.x) / view.scale, y: (at.y - view.y) / view.scale };
}
