import { type KeyboardEvent, type ReactNode, useEffect, useRef } from 'react';
import type { Field } from '../../study/index.ts';
import type { Subject } from '../subject.ts';
import { Formula } from './Formula.tsx';
import { nextStop } from './slipWalk.ts';
import { useSlipFocus } from './useSlipFocus.ts';

export interface SlipFrameProps {
  /** Accessible name: "Data of Bank C1". */
  label: string;
  /** Kind in trade words, above the name. */
  kind: string;
  /** The busbars it stands at. */
  place?: string;
  /** Another subject is another slip: the focus goes to its first field again. */
  subject: Subject;
  head: ReactNode;
  children: ReactNode;
  foot: ReactNode;
  /** The field with the focus; its formula stands in the foot. */
  focused: Field | null;
  onClose(): void;
}

/**
 * The paper of a data slip. Keys and wheel stay inside, so that arrows step a value instead of the drawing.
 * Enter takes the value and goes on, Shift+Enter back; past the last essential field, and with Ctrl or
 * Command at once, it closes the slip. A field that refuses its value keeps the focus. Escape closes, and
 * what was half typed goes with it; other shortcuts with Ctrl or Command pass.
 */
export function SlipFrame(props: SlipFrameProps) {
  const { label, kind, place, subject, head, children, foot, focused, onClose } = props;
  const paper = useRef<HTMLElement>(null);
  useSlipFocus(paper, subject);
  useEffect(() => {
    const element = paper.current;
    const keepWheel = (event: WheelEvent) => {
      if (!event.ctrlKey) event.stopPropagation();
    };
    element?.addEventListener('wheel', keepWheel, { passive: true });
    return () => element?.removeEventListener('wheel', keepWheel);
  }, []);
  const goOn = (event: KeyboardEvent, from: Element) => {
    event.preventDefault();
    const next =
      event.ctrlKey || event.metaKey ? 'close' : nextStop(paper.current as HTMLElement, from, event.shiftKey);
    if (next === 'close') onClose();
    else next?.focus();
    if (next instanceof HTMLInputElement && next.type === 'text') next.select();
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const from = event.target;
    const inField = from instanceof HTMLInputElement || from instanceof HTMLSelectElement;
    const enters = event.key === 'Enter' && !event.nativeEvent.isComposing;
    if (inField && enters && !event.defaultPrevented) goOn(event, from);
    if (!enters && (event.ctrlKey || event.metaKey)) return;
    event.stopPropagation();
    if (event.key === 'Escape' && !event.defaultPrevented) onClose();
  };
  return (
    <section
      ref={paper}
      className="slip"
      role="dialog"
      aria-label={label}
      onKeyDown={onKeyDown}
      onPointerDown={(event) => event.stopPropagation()}
      onDoubleClick={(event) => event.stopPropagation()}
    >
      <header className="slip-head">
        <span className="slip-kind">
          {kind}
          {place && <> · {place}</>}
        </span>
        <button
          type="button"
          className="slip-close"
          aria-label="Close the data slip"
          title="Close (Escape)"
          onClick={onClose}
        >
          ×
        </button>
        {head}
      </header>
      <div className="slip-body">{children}</div>
      <footer className="slip-foot">
        <p className="slip-help" aria-hidden="true">
          <Formula
            text={focused ? `${focused.help}${focused.typical ? ` Typical: ${focused.typical}.` : ''}` : ' '}
          />
        </p>
        <div className="slip-actions">{foot}</div>
      </footer>
    </section>
  );
}
