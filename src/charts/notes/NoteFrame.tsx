import type { HTMLAttributes, KeyboardEvent, ReactNode } from 'react';

export type NoteState = 'line' | 'card' | 'lens';

/** What the frame of every note can do; the column fills these in. */
export interface NoteHandlers {
  onToggle(): void;
  onHover?: ((hovered: boolean) => void) | undefined;
  onFocus?: (() => void) | undefined;
  onKeyDown?: ((event: KeyboardEvent<HTMLElement>) => void) | undefined;
  onCopy?: ((text: string) => void) | undefined;
}

interface NoteFrameProps extends NoteHandlers {
  noteKey: string;
  state: NoteState;
  className: string;
  /** Mark before the title. */
  mark?: ReactNode;
  title: string;
  letter: string;
  lit: boolean;
  /** Whether this note is the column's tab stop. */
  tabStop: boolean;
  /** Handlers that let the title be dragged. */
  drag?: HTMLAttributes<HTMLButtonElement> | undefined;
  text(): string;
  actions?: ReactNode;
  children?: ReactNode;
}

/** A note: its title folds and unfolds it, its letter ties it to the drawing, its tools show on hover and focus. */
export function NoteFrame(props: NoteFrameProps) {
  const { state, title, letter, onHover, onCopy, text } = props;
  const hover = onHover ? { onPointerEnter: () => onHover(true), onPointerLeave: () => onHover(false) } : {};
  const copy = (event: React.ClipboardEvent) => {
    if (window.getSelection()?.toString()) return;
    event.preventDefault();
    event.clipboardData.setData('text/plain', text());
  };
  return (
    <article
      className={`note note-${state} ${props.className}${props.lit ? ' lit' : ''}`}
      data-note={props.noteKey}
      aria-label={letter ? `${title}, note ${letter}` : title}
      {...hover}
      onCopy={copy}
      onFocus={props.onFocus}
    >
      <header className="note-head">
        {props.mark}
        <button
          type="button"
          className="note-title"
          aria-expanded={state !== 'line'}
          tabIndex={props.tabStop ? 0 : -1}
          {...props.drag}
          onClick={props.onToggle}
          onKeyDown={props.onKeyDown}
        >
          {title}
        </button>
        <span className="note-actions">
          {props.actions}
          {onCopy && (
            <button type="button" title="This note as text (Ctrl+C)" onClick={() => onCopy(text())}>
              copy
            </button>
          )}
        </span>
        {letter && (
          <span className="note-letter" aria-hidden="true">
            {letter}
          </span>
        )}
      </header>
      {state !== 'line' && <div className="note-body">{props.children}</div>}
    </article>
  );
}
