import { type RefObject, useEffect, useRef } from 'react';
import {
  type Chosen,
  clipItems,
  clipText,
  countedTogether,
  type Edit,
  makeEdit,
  pasteClip,
  readClip,
  removalWords,
  removeItems,
  type Study,
} from '../../study/index.ts';
import type { Layout } from '../layout/index.ts';
import { busSubject, partSubject, type Subject, selectedIds } from '../subject.ts';
import { busInFocus } from './carryKeys.ts';

export interface ClipboardContext {
  study: Study;
  layout: Layout;
  selection: readonly Subject[];
  current: Subject | undefined;
  onEdit(edit: Edit, said?: string): void;
  onSelect(items: readonly Subject[]): void;
  onSay(words: string): void;
}

/**
 * Copy, cut and paste of parts by the browser's own events, so that the system's clipboard serves without a
 * question, between windows and studies alike. A field or a marked text keeps the keys for itself.
 */
export function useClipboard(paneRef: RefObject<HTMLElement | null>, context: ClipboardContext): void {
  const latest = useRef(context);
  latest.current = context;
  useEffect(() => {
    const isOurs = () => {
      const holder = document.activeElement;
      const nowhere = holder === null || holder === document.body;
      if (document.querySelector('.veil')) return false;
      return nowhere ? (getSelection()?.isCollapsed ?? true) : (paneRef.current?.contains(holder) ?? false);
    };
    const onCopy = (event: ClipboardEvent) => isOurs() && copy(latest.current, event, event.type === 'cut');
    const onPaste = (event: ClipboardEvent) => isOurs() && paste(latest.current, event);
    document.addEventListener('copy', onCopy);
    document.addEventListener('cut', onCopy);
    document.addEventListener('paste', onPaste);
    return () => {
      document.removeEventListener('copy', onCopy);
      document.removeEventListener('cut', onCopy);
      document.removeEventListener('paste', onPaste);
    };
  }, [paneRef]);
}

function copy(c: ClipboardContext, event: ClipboardEvent, cutting: boolean): void {
  const chosen = selectedIds(c.selection);
  if (chosen.parts.length + chosen.buses.length === 0 || !event.clipboardData) return;
  event.preventDefault();
  const clip = clipItems(c.study, chosen);
  event.clipboardData.setData('text/plain', clipText(clip));
  const carried = clip.study.buses.length - clip.hangsFrom.length;
  const what = countedTogether([
    [clip.study.elements.length, 'part'],
    [carried, 'busbar'],
  ]);
  const said = `${cutting ? 'Cut' : 'Copied'} ${what}; paste onto a busbar, here or in another window`;
  if (cutting) c.onEdit(cutEdit(c.study, chosen), said);
  else c.onSay(said);
}

function cutEdit(study: Study, chosen: Chosen): Edit {
  const removal = removeItems(study, chosen);
  return makeEdit('parts.cut', `cut ${removalWords(study, chosen)}`, removal.apply);
}

function paste(c: ClipboardContext, event: ClipboardEvent): void {
  const outcome = readClip(event.clipboardData?.getData('text/plain') ?? '');
  event.preventDefault();
  if (!outcome.ok) {
    c.onSay(`${outcome.words}. Nothing has changed`);
    return;
  }
  const edit = pasteClip(c.study, outcome.clip, busInFocus(c) ?? null);
  const said = edit.words.charAt(0).toUpperCase() + edit.words.slice(1).replace(/^aste/, 'asted');
  c.onEdit(edit, [said, ...edit.remarks].join('. '));
  c.onSelect([...edit.elementIds.map(partSubject), ...edit.busIds.map(busSubject)]);
}
