import { type KeyboardEvent, type ReactNode, useEffect, useRef } from 'react';
import type { Field } from '../../study/index.ts';
import { Formula } from './Formula.tsx';
import { useSlipFocus } from './useSlipFocus.ts';

export interface SlipFrameProps {
  /** Accessible name: "Data of Bank C1". */
  label: string;
  /** Kind in trade words, above the name. */
  kind: string;
  /** Changes when the slip shows another part: the focus goes to its first field again. */
  subjectKey: string;
  head: ReactNode;
  children: ReactNode;
  foot: ReactNode;
  /** The field with the focus; its formula stands in the foot. */
  focused: Field | null;
  onClose(): void;
}

/**
 * The paper of a data slip. Keys and wheel stay inside, so that arrows step a value instead of the drawing;
 * Escape closes unless a field used it to put its text back; shortcuts with Ctrl or Command pass.
 */
export function SlipFrame({
  label,
  kind,
  subjectKey,
  head,
  children,
  foot,
  focused,
  onClose,
}: SlipFrameProps) {
  const paper = useRef<HTMLElement>(null);
  useSlipFocus(paper, subjectKey);
  useEffect(() => {
    const element = paper.current;
    const keepWheel = (event: WheelEvent) => {
      if (!event.ctrlKey) event.stopPropagation();
    };
    element?.addEventListener('wheel', keepWheel, { passive: true });
    return () => element?.removeEventListener('wheel', keepWheel);
  }, []);
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey) return;
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
        <span className="slip-kind">{kind}</span>
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
      <div className="slip-body" data-slip={subjectKey}>
        {children}
      </div>
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
