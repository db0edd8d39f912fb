import { type PointerEvent, type RefObject, useEffect, useRef } from 'react';
import { type OrderDomain, panDomain, zoomDomain } from './orderAxis.ts';
import { snappedOrder } from './orderSteps.ts';
import type { PlacedPeak, RailModel } from './railModel.ts';

interface Gesture {
  kind: 'scrub' | 'pan' | 'pinch';
  pointers: Map<number, number>;
  startView: OrderDomain;
  startX: number;
  startGap: number;
  /** As all was before the first touch, for Escape. */
  before: { order: number; view: OrderDomain };
}

export interface RailGestureInputs {
  plot: RefObject<HTMLDivElement | null>;
  model: RailModel;
  order: number;
  view: OrderDomain;
  full: OrderDomain;
  onOrder(order: number): void;
  onView(view: OrderDomain): void;
}

/**
 * Pointer and wheel on the rail.
 *
 *   down on a flag            → its peak
 *   down on the landscape     → scrub, snapping to whole orders (Alt: not)
 *   down below the axis       → pan the axis
 *   second pointer            → pinch: zoom and pan together
 *   Ctrl+wheel / Shift+wheel  → zoom about the pointer / pan; a plain wheel scrolls the page
 *   Escape while pressing     → as before the press
 *
 * At most one order is sent per animation frame.
 */
export function useRailGestures(inputs: RailGestureInputs) {
  const latest = useRef(inputs);
  latest.current = inputs;
  const gesture = useRef<Gesture | null>(null);
  const frame = useRef<{ id: number; order: number } | null>(null);

  const sendOrder = (order: number) => {
    if (frame.current) {
      frame.current.order = order;
      return;
    }
    latest.current.onOrder(order);
    const id = requestAnimationFrame(() => {
      const waiting = frame.current;
      frame.current = null;
      if (waiting && waiting.order !== order) latest.current.onOrder(waiting.order);
    });
    frame.current = { id, order };
  };

  useEffect(() => () => cancelAnimationFrame(frame.current?.id ?? 0), []);
  useWheel(latest);

  const scrub = (event: PointerEvent) => {
    const { model } = latest.current;
    const x = Math.max(model.axis.left, Math.min(model.axis.right, localPoint(event).x));
    sendOrder(event.altKey ? model.axis.order(x) : snappedOrder(model.axis, x));
  };

  const onPointerDown = (event: PointerEvent<HTMLDivElement>) => {
    if (event.button !== 0) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    const { x, y } = localPoint(event);
    const running = gesture.current;
    if (running) {
      running.pointers.set(event.pointerId, x);
      startPinch(running, latest.current.view);
      return;
    }
    const peak = peakUnder(latest.current.model.peaks, x, y);
    if (peak) {
      latest.current.onOrder(peak.peak.order);
      return;
    }
    const kind = y > latest.current.model.layout.axisY + 6 ? 'pan' : 'scrub';
    gesture.current = {
      kind,
      pointers: new Map([[event.pointerId, x]]),
      startView: latest.current.view,
      startX: x,
      startGap: 1,
      before: { order: latest.current.order, view: latest.current.view },
    };
    if (kind === 'scrub') scrub(event);
  };

  const onPointerMove = (event: PointerEvent<HTMLDivElement>) => {
    const running = gesture.current;
    if (!running?.pointers.has(event.pointerId)) return;
    running.pointers.set(event.pointerId, localPoint(event).x);
    if (running.kind === 'scrub') scrub(event);
    else latest.current.onView(movedView(running, latest.current));
  };

  const onPointerUp = (event: PointerEvent<HTMLDivElement>) => {
    const running = gesture.current;
    running?.pointers.delete(event.pointerId);
    if (running?.pointers.size === 0) gesture.current = null;
    // The finger that stays goes on panning from where the pinch left the axis.
    else if (running) startPan(running, latest.current.view);
  };

  const cancel = (): boolean => {
    const running = gesture.current;
    if (!running) return false;
    gesture.current = null;
    cancelAnimationFrame(frame.current?.id ?? 0);
    frame.current = null;
    latest.current.onOrder(running.before.order);
    latest.current.onView(running.before.view);
    return true;
  };

  const handlers = { onPointerDown, onPointerMove, onPointerUp, onPointerCancel: onPointerUp };
  return { handlers, cancel };
}

function localPoint(event: PointerEvent): { x: number; y: number } {
  const box = event.currentTarget.getBoundingClientRect();
  return { x: event.clientX - box.left, y: event.clientY - box.top };
}

function peakUnder(peaks: readonly PlacedPeak[], x: number, y: number): PlacedPeak | undefined {
  return peaks.find(
    ({ box }) => box && x >= box.x && x <= box.x + box.width && y >= box.y && y <= box.y + box.height,
  );
}

function startPinch(gesture: Gesture, view: OrderDomain): void {
  gesture.kind = 'pinch';
  gesture.startView = view;
  gesture.startX = middle(gesture.pointers);
  gesture.startGap = gap(gesture.pointers);
}

function startPan(gesture: Gesture, view: OrderDomain): void {
  gesture.kind = 'pan';
  gesture.startView = view;
  gesture.startX = middle(gesture.pointers);
}

function middle(pointers: ReadonlyMap<number, number>): number {
  return [...pointers.values()].reduce((sum, x) => sum + x, 0) / pointers.size;
}

function gap(pointers: ReadonlyMap<number, number>): number {
  const xs = [...pointers.values()];
  return Math.max(10, Math.max(...xs) - Math.min(...xs));
}

function movedView(gesture: Gesture, { model, full }: RailGestureInputs): OrderDomain {
  const { left, right } = model.axis;
  const { startView } = gesture;
  const span = Math.log(startView.high / startView.low);
  const share = (gesture.startX - left) / (right - left);
  const about = startView.low * Math.exp(share * span);
  const factor = gesture.kind === 'pinch' ? gesture.startGap / gap(gesture.pointers) : 1;
  const zoomed = zoomDomain(startView, full, about, factor);
  const zoomedSpan = Math.log(zoomed.high / zoomed.low);
  return panDomain(zoomed, full, ((gesture.startX - middle(gesture.pointers)) / (right - left)) * zoomedSpan);
}

/** React attaches wheel handlers passively, and a passive one cannot keep the page from zooming. */
function useWheel(latest: RefObject<RailGestureInputs>) {
  useEffect(() => {
    const element = latest.current.plot.current;
    if (!element) return;
    const onWheel = (event: WheelEvent) => {
      const { model, view, full, onView } = latest.current;
      if (!event.ctrlKey && !event.shiftKey && !event.metaKey) return;
      event.preventDefault();
      const travel = event.deltaY || event.deltaX;
      if (event.shiftKey && !event.ctrlKey) {
        onView(panDomain(view, full, (travel / 800) * Math.log(view.high / view.low)));
        return;
      }
      const x = event.clientX - element.getBoundingClientRect().left;
      onView(zoomDomain(view, full, model.axis.order(x), Math.exp(travel / 300)));
    };
    element.addEventListener('wheel', onWheel, { passive: false });
    return () => element.removeEventListener('wheel', onWheel);
  }, [latest]);
}
