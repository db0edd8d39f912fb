import { useLayoutEffect, useRef, useState } from 'react';
import type { DropOutcome } from '../gestures/DropOutcome.ts';
import type { Layout, Point } from '../layout/index.ts';
import type { PaneControls } from '../view/usePaneView.ts';

export interface HandTagProps {
  plan: DropOutcome;
  /** Where the pointer is, drawing px; absent while the keyboard chooses. */
  at?: Point | undefined;
  layout: Layout;
  controls: PaneControls;
}

const EDGE = 8;

/** Where the tag begins: beside what the pointer holds, else under the busbar, or beside the part, it speaks of. */
function anchorOf({ plan, at, layout }: HandTagProps): Point | undefined {
  if (at) return { x: at.x, y: at.y };
  const part = layout.parts.find((place) => place.id === plan.replaces);
  if (part) return { x: part.x, y: part.y };
  const bar = layout.buses.find((bus) => bus.id === plan.bus);
  return bar && { x: bar.x1, y: bar.y };
}

/** What letting go would do, in words at the place where it would happen. */
export function HandTag(props: HandTagProps) {
  const { plan, at, controls } = props;
  const box = useRef<HTMLDivElement>(null);
  const [size, setSize] = useState({ width: 0, height: 0 });
  const { words } = plan;
  useLayoutEffect(() => {
    if (box.current && words) setSize({ width: box.current.offsetWidth, height: box.current.offsetHeight });
  }, [words]);
  const anchor = anchorOf(props);
  if (!words) return null;
  const { view, pane } = controls;
  const offset = at
    ? { x: 34 * view.scale + 6, y: 18 }
    : plan.replaces
      ? { x: 34 * view.scale, y: -14 }
      : { x: 8, y: 10 };
  const clamp = (value: number, length: number, room: number) =>
    Math.max(EDGE, Math.min(value, room - length - EDGE));
  const left = anchor ? anchor.x * view.scale + view.x + offset.x : EDGE;
  const top = anchor ? anchor.y * view.scale + view.y + offset.y : pane.height;
  return (
    <div
      ref={box}
      className={plan.refused ? 'hand-tag refused' : 'hand-tag'}
      style={{ left: clamp(left, size.width, pane.width), top: clamp(top, size.height, pane.height) }}
      aria-hidden="true"
    >
      {plan.refused && <span className="hand-tag-mark">✕</span>}
      {words}
    </div>
  );
}

export interface KeyLineProps {
  hints: readonly (readonly [key: string, words: string])[];
}

/** What the keys do while something is in the hand, at the foot of the paper. */
export function KeyLine({ hints }: KeyLineProps) {
  if (hints.length === 0) return null;
  return (
    <p className="key-line" aria-hidden="true">
      {hints.map(([key, words]) => (
        <span key={key}>
          <kbd>{key}</kbd> {words}
        </span>
      ))}
    </p>
  );
}
