import { fileOpen, fileSave } from 'browser-fs-access';
import type { Files } from './fileActions.ts';

const studyFiles = {
  description: 'Varwright study',
  mimeTypes: ['application/json'],
  extensions: ['.json'],
  id: 'varwright-study',
};

/** A dialog closed without a choice rejects with this name; that is no failure. */
function isChangeOfMind(error: unknown): boolean {
  return error instanceof DOMException && error.name === 'AbortError';
}

async function orNull<T>(dialog: Promise<T>): Promise<T | null> {
  try {
    return await dialog;
  } catch (error) {
    if (isChangeOfMind(error)) return null;
    throw error;
  }
}

/** The browser's file dialogs; where it has none for writing, a download. */
export const browserFiles: Files = {
  open: async () => {
    const file = await orNull(fileOpen(studyFiles));
    if (!file) return null;
    const text = await file.text();
    return { text, name: file.name, ...(file.handle ? { handle: file.handle } : {}) };
  },
  save: async (text, name, handle) => {
    const blob = new Blob([text], { type: 'application/json' });
    const dialog = fileSave(blob, { ...studyFiles, fileName: name }, handle);
    const done = await orNull(dialog.then((result) => ({ handle: result ?? null })));
    if (!done) return null;
    return { name: done.handle?.name ?? name, handle: done.handle };
  },
};
