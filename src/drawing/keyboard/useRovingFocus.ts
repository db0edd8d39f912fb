import { type RefObject, useCallback, useEffect, useRef, useState } from 'react';
import type { Box, Layout } from '../layout/index.ts';
import { busSubject, readSubject, type Subject } from '../subject.ts';
import type { PaneControls } from '../view/usePaneView.ts';

/**
 * The part or busbar holding the drawing's one tab stop. It follows the selection made elsewhere, takes the
 * keyboard focus along while the drawing has it, and falls to the busbar of a part that goes.
 */
export function useRovingFocus(
  paneRef: RefObject<HTMLElement | null>,
  layout: Layout,
  selection: readonly Subject[],
  controls: PaneControls,
): [Subject | undefined, (subject: Subject) => void] {
  const [wished, setWished] = useState<Subject | undefined>();
  const stoodAt = useRef<string | undefined>(undefined);
  const last = selection.at(-1);
  const [followed, setFollowed] = useState(last);
  if (followed !== last) {
    setFollowed(last);
    if (last) setWished(last);
  }
  const current = stands(layout, wished) ? wished : busLeft(layout, stoodAt.current);
  const owns = useOwnsFocus(paneRef);
  const latest = useRef({ layout, controls });
  latest.current = { layout, controls };

  useEffect(() => {
    stoodAt.current = busOf(layout, current) ?? stoodAt.current;
    const pane = paneRef.current;
    if (!pane || !current || !owns()) return;
    const element = pane.querySelector<SVGGElement>(`[data-subject="${CSS.escape(current)}"]`);
    if (!element || element === document.activeElement) return;
    element.focus({ preventScroll: true });
    // A drawing that fits itself to the pane does so first.
    const frame = requestAnimationFrame(() =>
      bringIntoSight(current, latest.current.layout, latest.current.controls),
    );
    return () => cancelAnimationFrame(frame);
  }, [layout, current, paneRef, owns]);
  return [current, useCallback((subject: Subject) => setWished(subject), [])];
}

function stands(layout: Layout, subject: Subject | undefined): boolean {
  const read = subject ? readSubject(subject) : undefined;
  const list = read?.kind === 'bus' ? layout.buses : layout.parts;
  return read !== undefined && list.some((place) => place.id === read.id);
}

function busOf(layout: Layout, subject: Subject | undefined): string | undefined {
  const read = subject ? readSubject(subject) : undefined;
  return read?.kind === 'bus' ? read.id : layout.parts.find((part) => part.id === read?.id)?.bus;
}

function busLeft(layout: Layout, wished: string | undefined): Subject | undefined {
  const bus = layout.buses.find((place) => place.id === wished) ?? layout.buses[0];
  return bus && busSubject(bus.id);
}

/**
 * Whether the keyboard is the drawing's: the focus is in it, or was there last and is nowhere now, because
 * what held it was removed. A dialog above the page only borrows it.
 */
function useOwnsFocus(paneRef: RefObject<HTMLElement | null>): () => boolean {
  const owner = useRef(false);
  useEffect(() => {
    const onFocus = ({ target }: FocusEvent) => {
      if (!(target instanceof Element) || target.closest('.veil')) return;
      owner.current = paneRef.current?.contains(target) ?? false;
    };
    document.addEventListener('focusin', onFocus);
    return () => document.removeEventListener('focusin', onFocus);
  }, [paneRef]);
  return useCallback(() => {
    const nowhere = document.activeElement === null || document.activeElement === document.body;
    return nowhere ? owner.current : (paneRef.current?.contains(document.activeElement) ?? false);
  }, [paneRef]);
}

const MARGIN = 24;

/** Pans as little as needed to show a part's symbol, or the part of a busbar that fits. */
function bringIntoSight(subject: Subject, layout: Layout, { view, pane, panBy }: PaneControls): void {
  const box = boxOf(subject, layout);
  if (!box) return;
  const shift = (from: number, length: number, offset: number, room: number) => {
    const [least, most] = [from * view.scale + offset, (from + length) * view.scale + offset];
    if (length * view.scale > room) return 0;
    return least < 0 ? MARGIN - least : most > room ? room - most - MARGIN : 0;
  };
  const dx = shift(box.x, box.width, view.x, pane.width);
  const dy = shift(box.y, box.height, view.y, pane.height);
  if (dx !== 0 || dy !== 0) panBy(dx, dy);
}

function boxOf(subject: Subject, layout: Layout): Box | undefined {
  const read = readSubject(subject);
  if (read?.kind === 'bus') {
    const bus = layout.buses.find((place) => place.id === read.id);
    return bus && { x: bus.x1, y: bus.y - 24, width: bus.x2 - bus.x1, height: 32 };
  }
  const part = layout.parts.find((place) => place.id === read?.id);
  return part && { x: part.x - 30, y: part.y - 30, width: 60, height: 60 };
}
