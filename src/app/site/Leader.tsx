import { useLayoutEffect, useState } from 'react';
import type { Subject } from '../../drawing/index.ts';

interface Props {
  subject: Subject;
  note: string;
}

function boxOf(selector: string): DOMRect | undefined {
  return document.querySelector(selector)?.getBoundingClientRect();
}

/** The letter beside a part or busbar, else its symbol, else all of it, as in the outline. */
function partBox(subject: Subject): DOMRect | undefined {
  const own = `[data-subject="${CSS.escape(subject)}"]`;
  return boxOf(`${own} .letters`) ?? boxOf(`${own} .frame`) ?? boxOf(own);
}

/** The thin line from a note to its part, while the note is hovered or focused. */
export function Leader({ subject, note }: Props) {
  const [path, setPath] = useState('');
  useLayoutEffect(() => {
    const part = partBox(subject);
    // A lens lies over the drawing; a line under it would lead nowhere.
    const card = boxOf(`[data-note="${CSS.escape(note)}"]:not(.note-lens)`);
    const paper = boxOf('.paper');
    if (!part || !card || !paper) return setPath('');
    const from = { x: card.left, y: Math.min(card.top + 16, card.bottom) };
    const to = {
      x: Math.min(part.right + 3, paper.right),
      y: Math.min(Math.max((part.top + part.bottom) / 2, paper.top), paper.bottom),
    };
    setPath(`M${from.x} ${from.y}H${paper.right + 4}L${to.x} ${to.y}`);
  }, [subject, note]);
  return (
    <svg className="leader" aria-hidden="true">
      <path d={path} />
    </svg>
  );
}
