import { type KeyboardEvent, type ReactNode, useEffect, useId, useRef } from 'react';

interface Props {
  title: string;
  children: ReactNode;
  onClose(): void;
}

/**
 * A sheet beside the drawing that leaves it in sight and at work. It takes the keyboard as it opens, gives
 * it back as it closes, and closes by Escape.
 */
export function Drawer({ title, children, onClose }: Props) {
  const id = useId();
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => {
    const before = document.activeElement;
    heading.current?.focus();
    return () => {
      const back = before instanceof HTMLElement && before.isConnected ? before : null;
      (back ?? document.querySelector<HTMLElement>('.study-title'))?.focus({ preventScroll: true });
    };
  }, []);
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key !== 'Escape' || event.defaultPrevented) return;
    event.preventDefault();
    event.stopPropagation();
    onClose();
  };
  return (
    <section className="drawer" aria-labelledby={id} onKeyDown={onKeyDown}>
      <header>
        <h2 id={id} ref={heading} tabIndex={-1}>
          {title}
        </h2>
        <button type="button" className="drawer-close" onClick={onClose} aria-label={`Close: ${title}`}>
          ✕
        </button>
      </header>
      {children}
    </section>
  );
}
