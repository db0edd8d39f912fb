import type { HTMLAttributes, KeyboardEvent, ReactNode } from 'react';

export type NoteState = 'line' | 'card' | 'lens';

/** What the frame of every note can do; the column fills these in. */
export interface NoteHandlers {
  onToggle(): void;
  onHover?: ((hovered: boolean) => void) | undefined;
  onFocus?: (() => void) | undefined;
  onKeyDown?: ((event: KeyboardEvent<HTMLElement>) => void) | undefined;
  /** Opens the note's menu at its button, or at its title. */
  onMenu?: ((anchor: HTMLElement) => void) | undefined;
}

interface NoteFrameProps extends NoteHandlers {
  noteKey: string;
  state: NoteState;
  className: string;
  /** Mark before the title. */
  mark?: ReactNode;
  title: string;
  /** What it is called for a screen reader, where the title is shortened. */
  name?: string;
  /** The one figure that stands beside the title. */
  figure?: ReactNode;
  letter: string;
  lit: boolean;
  /** Whether this note is the column's tab stop. */
  tabStop: boolean;
  /** Handlers that let the title be dragged. */
  drag?: HTMLAttributes<HTMLButtonElement> | undefined;
  text(): string;
  children?: ReactNode;
}

/** A note: its title folds and unfolds it, its letter ties it to the drawing, its button opens what can be done. */
export function NoteFrame(props: NoteFrameProps) {
  const { state, title, name = props.title, letter, onHover, onMenu, text, tabStop } = props;
  const hover = onHover ? { onPointerEnter: () => onHover(true), onPointerLeave: () => onHover(false) } : {};
  const copy = (event: React.ClipboardEvent) => {
    if (window.getSelection()?.toString()) return;
    event.preventDefault();
    event.clipboardData.setData('text/plain', text());
  };
  const openMenu = (event: React.MouseEvent<HTMLElement>) => {
    const own = event.currentTarget.querySelector<HTMLElement>('.note-title');
    if (!onMenu || !own) return;
    event.preventDefault();
    own.focus();
    onMenu(own);
  };
  return (
    <article
      className={`note note-${state} ${props.className}${props.lit ? ' lit' : ''}`}
      data-note={props.noteKey}
      aria-label={letter ? `${name}, note ${letter}` : name}
      {...hover}
      onCopy={copy}
      onContextMenu={openMenu}
      onFocus={props.onFocus}
    >
      <header className="note-head">
        {props.mark}
        <button
          type="button"
          className="note-title"
          aria-expanded={state !== 'line'}
          {...(name === title ? {} : { 'aria-label': name })}
          tabIndex={tabStop ? 0 : -1}
          {...props.drag}
          onClick={props.onToggle}
          onKeyDown={props.onKeyDown}
        >
          {title}
        </button>
        {props.figure && <span className="note-figure">{props.figure}</span>}
        {onMenu && <MenuButton tabStop={tabStop} onMenu={onMenu} />}
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

/** Three dots that take their own place in the head, so that they hide nothing. */
function MenuButton({ tabStop, onMenu }: { tabStop: boolean; onMenu(anchor: HTMLElement): void }) {
  return (
    <button
      type="button"
      className="note-menu"
      aria-label="What can be done with this note"
      aria-haspopup="menu"
      tabIndex={tabStop ? 0 : -1}
      onClick={(event) => onMenu(event.currentTarget)}
    >
      <svg width={14} height={14} viewBox="0 0 14 14" aria-hidden="true">
        <circle cx={2.5} cy={7} r={1.4} />
        <circle cx={7} cy={7} r={1.4} />
        <circle cx={11.5} cy={7} r={1.4} />
      </svg>
    </button>
  );
}
