import { useLayoutEffect, useState } from 'react';
import type { Subject } from '../../drawing/index.ts';

interface Props {
  subject: Subject;
  note: string;
}

function boxOf(attribute: string, value: string): DOMRect | undefined {
  return document.querySelector(`[${attribute}="${CSS.escape(value)}"]`)?.getBoundingClientRect();
}

/** The thin line from a note to its part, while the note is hovered or focused. */
export function Leader({ subject, note }: Props) {
  const [path, setPath] = useState('');
  useLayoutEffect(() => {
    const part = boxOf('data-subject', subject);
    const card = boxOf('data-note', note);
    const paper = document.querySelector('.paper')?.getBoundingClientRect();
    if (!part || !card || !paper) return setPath('');
    const from = { x: card.left, y: Math.min(card.top + 16, card.bottom) };
    const to = {
      x: Math.min(part.right, paper.right),
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
