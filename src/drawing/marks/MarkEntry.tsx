import { useEffect, useRef, useState } from 'react';
import { measures, type Point } from '../layout/index.ts';
import type { PaneView } from '../view/paneView.ts';
import { WORDS_WIDTH } from './markShape.ts';

interface MarkEntryProps {
  text: string;
  /** Top left corner of the words, drawing px. */
  at: Point;
  view: PaneView;
  onDone(text: string): void;
  onGiveUp(): void;
}

/** The words of a mark written in their place: Enter takes them, Shift+Enter begins a line, Escape gives up. */
export function MarkEntry({ text, at, view, onDone, onGiveUp }: MarkEntryProps) {
  const [words, setWords] = useState(text);
  const field = useRef<HTMLTextAreaElement>(null);
  const over = useRef(false);
  const end = (finish: () => void) => {
    if (over.current) return;
    over.current = true;
    finish();
  };
  useEffect(() => {
    field.current?.focus({ preventScroll: true });
    field.current?.select();
  }, []);
  const fontSize = Math.max(11, measures.FONT_PX * view.scale);
  const rows = Math.max(2, words.split('\n').length + Math.floor(words.length / 28));
  return (
    <textarea
      ref={field}
      className="mark-entry"
      aria-label="Words on the drawing"
      placeholder="Words; Enter takes them"
      value={words}
      rows={rows}
      style={{
        left: at.x * view.scale + view.x,
        top: at.y * view.scale + view.y,
        width: Math.max(170, WORDS_WIDTH * view.scale + 18),
        fontSize,
      }}
      onChange={(event) => setWords(event.target.value)}
      onKeyDown={(event) => {
        event.stopPropagation();
        if (event.key === 'Escape') end(onGiveUp);
        else if (event.key === 'Enter' && !event.shiftKey && !event.nativeEvent.isComposing)
          end(() => onDone(words));
        else return;
        event.preventDefault();
      }}
      onBlur={() => end(() => onDone(words))}
    />
  );
}
