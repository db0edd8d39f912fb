import { createStore } from 'zustand';
import { archive, archiveNow, type KeptDocument, openRecent, workbench } from '../../store/index.ts';
import { leaveStudy } from './leaveStudy.ts';
import { momentWords } from './momentWords.ts';

const shown = 8;

/** The studies last worked on in this browser, without the one that is open; newest first. */
export const recentStudies = createStore<{ documents: readonly KeptDocument[] }>(() => ({ documents: [] }));

/** Reads the list anew. Where nothing can be kept there is none, and nothing is said: autosave has told it. */
export async function refreshRecent(): Promise<void> {
  try {
    await archiveNow();
    const open = workbench.getState().documentId;
    const documents = (await archive.documents()).filter(({ documentId }) => documentId !== open);
    recentStudies.setState({ documents: documents.slice(0, shown) });
  } catch {
    recentStudies.setState({ documents: [] });
  }
}

export function openFromRecent(document: KeptDocument): void {
  leaveStudy(() => void openRecent(document).then(refreshRecent));
}

/** "2026-12-01 14:02 · cold-store.json", and whether the file lacks the last changes. */
export function recentWords({ at, fileName, inFile }: KeptDocument): string {
  const file = fileName === null ? 'in no file' : inFile ? fileName : `${fileName}, changed since`;
  return `${momentWords(at, Date.now())} · ${file}`;
}
