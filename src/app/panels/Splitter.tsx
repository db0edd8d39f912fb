import { type KeyboardEvent, type PointerEvent, useRef } from 'react';
import type { PanelSize } from './panelPlaces.ts';

interface SplitterProps {
  /** What is made larger or smaller, e.g. "width of the notes". */
  label: string;
  /** Id of the panel. */
  controls: string;
  /** Along which way the panel grows. */
  grows: 'left' | 'up';
  size: PanelSize;
  folded: boolean;
  onSize(size: number): void;
  /** Back to the size that follows the window. */
  onUsual(): void;
  onFold(folded: boolean): void;
}

interface Drag {
  from: number;
  size: number;
  folded: boolean;
}

const STEP = 16;
const BIG_STEP = 80;
/** A panel dragged this far below its least size folds. */
const FOLD_AT = 70;

/** The edge between two panels: dragged, stepped by arrows, folded by Enter, set back by a double click. */
export function Splitter(props: SplitterProps) {
  const { label, controls, grows, size, folded, onSize, onUsual, onFold } = props;
  const drag = useRef<Drag | null>(null);
  const along = (event: PointerEvent) => (grows === 'left' ? event.clientX : event.clientY);
  const resize = (wished: number) => {
    const fold = wished < size.least - FOLD_AT;
    if (fold !== folded) onFold(fold);
    onSize(Math.max(size.least, Math.min(size.most, Math.round(wished))));
  };
  const giveUp = () => {
    if (!drag.current) return;
    onSize(drag.current.size);
    onFold(drag.current.folded);
    drag.current = null;
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const step = event.shiftKey ? BIG_STEP : STEP;
    const [more, less] = grows === 'left' ? ['ArrowLeft', 'ArrowRight'] : ['ArrowUp', 'ArrowDown'];
    if (event.key === more) folded ? onFold(false) : resize(size.size + step);
    else if (event.key === less) resize(Math.max(size.least, size.size - step));
    else if (event.key === 'Home') resize(size.least);
    else if (event.key === 'End') resize(size.most);
    else if (event.key === 'Enter') onFold(!folded);
    else if (event.key === 'Escape' && drag.current) giveUp();
    else return;
    event.preventDefault();
    event.stopPropagation();
  };
  const value = {
    role: 'separator',
    tabIndex: 0,
    'aria-label': label,
    'aria-controls': controls,
    'aria-orientation': grows === 'left' ? ('vertical' as const) : ('horizontal' as const),
    'aria-valuenow': folded ? 0 : size.size,
    'aria-valuemin': 0,
    'aria-valuemax': size.most,
    'aria-valuetext': folded ? 'folded' : `${size.size} pixels`,
  };
  const handlers = {
    onKeyDown,
    onDoubleClick: onUsual,
    onPointerDown: (event: PointerEvent<HTMLElement>) => {
      if (event.button !== 0) return;
      event.currentTarget.setPointerCapture(event.pointerId);
      event.currentTarget.focus();
      drag.current = { from: along(event), size: size.size, folded };
    },
    onPointerMove: (event: PointerEvent<HTMLElement>) => {
      const now = drag.current;
      if (now) resize((now.folded ? 0 : now.size) + now.from - along(event));
    },
    onPointerUp: () => {
      drag.current = null;
    },
    onPointerCancel: giveUp,
  };
  return <div className={`splitter grows-${grows}`} {...value} {...handlers} />;
}
