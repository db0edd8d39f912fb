import { clipItems } from '../clip/clipItems.ts';
import { type PasteEdit, pasteClip } from '../clip/pasteClip.ts';
import { isSeries } from '../lookup.ts';
import type { Study, StudyElement } from '../types.ts';
import { makeEdit } from './edit.ts';

/**
 * Brings parts of another study, with all that hangs below them, under a busbar of this one: names where
 * they are free, spectra and origins along. On an empty study (null) the busbar they hung from comes too.
 */
export function importParts(
  study: Study,
  from: Study,
  partIds: readonly string[],
  busId: string | null,
): PasteEdit {
  const paste = pasteClip(study, clipItems(from, { parts: partIds, buses: [] }), busId);
  const words = paste.words.replace(/^paste /, 'bring ');
  return { ...paste, ...makeEdit('parts.import', `${words} from ${from.title}`, paste.apply) };
}

/** What hangs from a busbar and can be brought elsewhere: all but what feeds it from above. */
export function partsHangingFrom(study: Study, busId: string): StudyElement[] {
  return study.elements.filter((element) =>
    isSeries(element) ? element.from === busId : element.bus === busId,
  );
}
