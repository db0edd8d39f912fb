import { makeEdit } from '../edits/edit.ts';
import type { Edit, Study } from '../types.ts';
import type { DrawnSite } from './drawSite.ts';

const untitled: ReadonlySet<string> = new Set(['New study', 'Untitled study']);

/** Puts a drawn site on an empty paper as one step of undo; a title the user gave, and who prepared it, stay. */
export function quickStartEdit(drawn: DrawnSite): Edit {
  return makeEdit('study.quickStart', 'draw the site of the quick start', (current) =>
    withSite(current, drawn.study),
  );
}

function withSite(current: Study, site: Study): Study {
  const title = untitled.has(current.title) ? site.title : current.title;
  const notes = [current.notes, site.notes].filter(Boolean).join('\n\n');
  return { ...current, ...site, title, notes };
}
