import { type RefObject, useCallback, useEffect, useLayoutEffect, useRef, useState } from 'react';
import { fitView, keepInSight, type PaneView, type Size, zoomAt } from './paneView.ts';

export interface PaneControls {
  view: PaneView;
  pane: Size;
  panBy(dx: number, dy: number): void;
  /** About a point of the pane, its middle without one. */
  zoomBy(factor: number, at?: { x: number; y: number }): void;
  fit(): void;
}

const WHEEL_ZOOM = 0.0022;

/**
 * Zoom and pan of the drawing in its pane. Until the user moves it, the drawing stays fitted as it grows;
 * afterwards it stays where it was put.
 */
export function usePaneView(
  paneRef: RefObject<HTMLElement | null>,
  content: Size,
  fitKey: string,
): PaneControls {
  const [pane, setPane] = useState<Size>({ width: 0, height: 0 });
  const [view, setView] = useState<PaneView>({ scale: 1, x: 0, y: 0 });
  const touched = useRef(false);
  const fitted = useRef(fitKey);
  const latest = useRef({ content, pane });
  latest.current = { content, pane };

  useLayoutEffect(() => {
    const element = paneRef.current;
    if (!element) return;
    const measure = () => setPane({ width: element.clientWidth, height: element.clientHeight });
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, [paneRef]);

  const { width, height } = content;
  useLayoutEffect(() => {
    if (fitted.current !== fitKey) touched.current = false;
    fitted.current = fitKey;
    if (pane.width > 0 && !touched.current) setView(fitView({ width, height }, pane));
  }, [width, height, pane, fitKey]);

  const change = useCallback((next: (view: PaneView) => PaneView) => {
    touched.current = true;
    setView((view) => keepInSight(next(view), latest.current.content, latest.current.pane));
  }, []);
  const panBy = useCallback(
    (dx: number, dy: number) => change((view) => ({ ...view, x: view.x + dx, y: view.y + dy })),
    [change],
  );
  const zoomBy = useCallback(
    (factor: number, at?: { x: number; y: number }) => {
      const { width, height } = latest.current.pane;
      change((view) => zoomAt(view, factor, at ?? { x: width / 2, y: height / 2 }));
    },
    [change],
  );
  const fit = useCallback(() => {
    touched.current = false;
    setView(fitView(latest.current.content, latest.current.pane));
  }, []);

  useEffect(() => {
    const element = paneRef.current;
    if (!element) return;
    const onWheel = (event: WheelEvent) => {
      event.preventDefault();
      const unit = event.deltaMode === 1 ? 16 : 1;
      const box = element.getBoundingClientRect();
      if (event.ctrlKey || event.metaKey) {
        const at = { x: event.clientX - box.left, y: event.clientY - box.top };
        zoomBy(Math.exp(-event.deltaY * unit * WHEEL_ZOOM), at);
      } else if (event.shiftKey && event.deltaX === 0) {
        panBy(-event.deltaY * unit, 0);
      } else {
        panBy(-event.deltaX * unit, -event.deltaY * unit);
      }
    };
    // React listens to wheel passively; zooming the page must be prevented.
    element.addEventListener('wheel', onWheel, { passive: false });
    return () => element.removeEventListener('wheel', onWheel);
  }, [paneRef, panBy, zoomBy]);

  return { view, pane, panBy, zoomBy, fit };
}
