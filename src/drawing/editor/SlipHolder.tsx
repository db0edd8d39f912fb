import { type ReactNode, useLayoutEffect, useRef, useState } from 'react';
import type { Layout } from '../layout/index.ts';
import type { Figures } from '../readings/figures.ts';
import { readSubject, type Subject } from '../subject.ts';
import type { PaneControls } from '../view/usePaneView.ts';
import { partBoxes } from './PartView.tsx';
import { placeSlip, type Size } from './placeSlip.ts';

export interface SlipHolderProps {
  subject: Subject;
  layout: Layout;
  figures: Figures;
  controls: PaneControls;
  children: ReactNode;
}

/** Symbol and text of a part, or name and left end of a bar, in drawing px: what the slip must not cover. */
function anchorBox(subject: Subject, layout: Layout, figures: Figures) {
  const read = readSubject(subject);
  if (read?.kind === 'bus') {
    const bus = layout.buses.find((b) => b.id === read.id);
    return bus && { x: bus.x1, y: bus.label.y, width: bus.label.width, height: bus.y + 6 - bus.label.y };
  }
  const place = layout.parts.find((p) => p.id === read?.id);
  const figure = place && figures.parts.get(place.id);
  if (!place || !figure) return undefined;
  const { symbol, text } = partBoxes(place, figure);
  const x = Math.min(symbol.x, text.x);
  const y = Math.min(symbol.y, text.y);
  return {
    x: place.x + x,
    y: place.y + y,
    width: Math.max(symbol.x + symbol.width, text.x + text.width) - x,
    height: Math.max(symbol.y + symbol.height, text.y + text.height) - y,
  };
}

/** Holds a part's data slip beside the part as the drawing moves. */
export function SlipHolder({ subject, layout, figures, controls, children }: SlipHolderProps) {
  const holder = useRef<HTMLDivElement>(null);
  const [size, setSize] = useState<Size | null>(null);
  const moved = useRef<Subject | null>(null);

  useLayoutEffect(() => {
    const element = holder.current;
    if (!element) return;
    const measure = () => setSize({ width: element.offsetWidth, height: element.offsetHeight });
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);

  const box = anchorBox(subject, layout, figures);
  const { view, pane } = controls;
  const place =
    box && size
      ? placeSlip(
          {
            x: box.x * view.scale + view.x,
            y: box.y * view.scale + view.y,
            width: box.width * view.scale,
            height: box.height * view.scale,
          },
          size,
          pane,
        )
      : undefined;
  const { standing, press } = usePressedStill(place);
  const panX = place?.panX ?? 0;
  useLayoutEffect(() => {
    // Once per opening: the drawing moves aside, afterwards the user may move it as they like.
    if (panX !== 0 && moved.current !== subject) controls.panBy(panX, 0);
    if (size) moved.current = subject;
  }, [panX, subject, size, controls]);

  if (!box) return null;
  // Before its place is known the slip is out of sight, not hidden: what is hidden takes no focus, and what
  // is typed at once would be lost.
  const style = standing ? { left: standing.x, top: standing.y } : { left: 0, top: 0, opacity: 0 };
  return (
    <div
      ref={holder}
      className="slip-holder"
      style={{ ...style, maxHeight: pane.height - 16 }}
      onPointerDownCapture={press}
    >
      {children}
    </div>
  );
}

/**
 * The place, kept as it was while a press inside lasts. A press takes what was typed in the field it leaves;
 * where that moves the part, the slip must not slide away under the pointer before it is let go.
 */
function usePressedStill<T>(place: T | undefined): { standing: T | undefined; press(): void } {
  const [kept, setKept] = useState<{ place: T | undefined } | null>(null);
  const press = () => {
    setKept({ place });
    const release = () => {
      window.removeEventListener('pointerup', release);
      window.removeEventListener('pointercancel', release);
      // The click comes after the release.
      setTimeout(() => setKept(null));
    };
    window.addEventListener('pointerup', release);
    window.addEventListener('pointercancel', release);
  };
  return { standing: kept ? kept.place : place, press };
}
