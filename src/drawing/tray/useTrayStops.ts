import { type KeyboardEvent, useRef, useState } from 'react';
import type { TrayKind } from '../gestures/TrayKind.ts';

const STEPS: Record<string, number> = { ArrowDown: 1, ArrowRight: 1, ArrowUp: -1, ArrowLeft: -1 };

/** The tray is one tab stop; arrows, Home and End go through its kinds. */
export function useTrayStops() {
  const list = useRef<HTMLDivElement>(null);
  const [stop, setStop] = useState<TrayKind>('supply');
  const onKeyDown = (event: KeyboardEvent) => {
    const items = [...(list.current?.querySelectorAll<HTMLElement>('[data-tray]') ?? [])];
    const at = items.indexOf(event.target as HTMLElement);
    const step = STEPS[event.key];
    const next =
      event.key === 'Home'
        ? items[0]
        : event.key === 'End'
          ? items.at(-1)
          : step && items.at((at + step) % items.length);
    if (!next || at < 0) return;
    event.preventDefault();
    next.focus();
  };
  return { list, stop, setStop, onKeyDown };
}
