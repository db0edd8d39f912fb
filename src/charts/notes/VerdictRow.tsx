import { memo } from 'react';
import type { Verdict } from '../../checks/index.ts';
import type { ColumnHandlers } from './columnHandlers.ts';
import { VerdictNote } from './VerdictNote.tsx';
import type { WorstCase } from './verdictWords.ts';

interface VerdictRowProps {
  verdict: Verdict;
  subjectName: string;
  letter: string;
  caseName: string | undefined;
  namesCase: boolean;
  worst: WorstCase | undefined;
  folded: boolean;
  lit: boolean;
  tabStop: boolean;
  handlers: ColumnHandlers;
  onJump: ((verdict: Verdict) => void) | undefined;
  onTry: ((verdict: Verdict) => void) | undefined;
  onOrder: ((order: number) => void) | undefined;
}

/** A verdict's note in the column; draws anew only when its own verdict, place or light changes. */
export const VerdictRow = memo(function VerdictRow({ handlers, ...note }: VerdictRowProps) {
  const { key, subject } = note.verdict;
  return (
    <VerdictNote
      {...note}
      onToggle={() => handlers.toggle(key)}
      onHover={(hovered) => handlers.hover(key, subject, hovered)}
      onFocus={() => handlers.focus(key, subject)}
      onMenu={(anchor) => handlers.menu(key, anchor)}
      onKeyDown={(event) => handlers.press(key, event)}
    />
  );
});
