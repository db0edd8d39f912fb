import type { Study } from '../study/index.ts';
import { sameData } from '../study/index.ts';
import type { Archive, KeptDocument, KeptRevision } from './archive.ts';
import type { WorkbenchStore } from './createWorkbench.ts';
import { freshId } from './freshId.ts';
import { later } from './later.ts';
import { isUnsaved } from './selectors.ts';
import { revisionsToDrop } from './thinRevisions.ts';
import type { Workbench } from './types.ts';

export interface KeepRevisionsOptions {
  now?: () => number;
  /** States that follow each other faster than this become one. */
  afterMs?: number;
}

export interface RevisionKeeper {
  /** Writes at once what still waits. */
  flush(): Promise<void>;
  /** Keeps the present state for good under a name. Rejects with the reason where it cannot. */
  keepAs(name: string): Promise<void>;
  stop(): void;
}

const documentsKept = 30;

/**
 * Puts every settled state of the study into the archive, under the words that led to it, and notes the study
 * among the recent ones. A file opened again goes on under the document it had, so that its former states
 * stay at hand. What cannot be kept here is not said here: autosave tells it, and the list of states is short.
 */
export function keepRevisions(
  store: WorkbenchStore,
  archive: Archive,
  options: KeepRevisionsOptions = {},
): RevisionKeeper {
  const { now = Date.now, afterMs = 400 } = options;
  let writing: Promise<void> = Promise.resolve();
  let kept: { documentId: string; study: Study } | null = null;

  function enqueue(work: () => Promise<void>): void {
    writing = writing.then(work).catch(() => undefined);
  }

  async function keep(words: string): Promise<void> {
    const state = store.getState();
    const study = settled(state);
    const { documentId, readOnly } = state;
    if (!study || readOnly || study.elements.length === 0) return;
    await archive.putDocument(documentOf(state, study, now()));
    if (kept?.documentId === documentId && kept.study === study) return;
    const known = await archive.revisions(documentId);
    const newest = known[0];
    const same = kept === null && newest && sameData(await archive.revisionStudy(newest.id), study);
    if (!same) {
      const revision = revisionOf(documentId, study, words, now());
      await withRoom(archive, () => archive.putRevision(revision, study));
      await archive.dropRevisions(revisionsToDrop([revision, ...known], now()));
    }
    kept = { documentId, study };
  }

  async function adopt(): Promise<void> {
    const state = store.getState();
    const documents = await archive.documents();
    for (const { documentId } of documents.slice(documentsKept)) await forget(archive, documentId);
    const same = await sameFile(documents, state);
    if (!same || same.documentId === state.documentId) return;
    store.setState((current) =>
      current.documentId === state.documentId ? { documentId: same.documentId } : {},
    );
  }

  let words = '';
  const waiting = later(afterMs, () => {
    const said = words;
    enqueue(() => keep(said));
  });

  function follow(after: Workbench, before: Workbench): void {
    const opened = after.openedRevision !== before.openedRevision;
    if (opened) kept = null;
    const handled = after.fileHandle !== before.fileHandle && after.fileHandle !== null;
    if ((opened && after.fileName !== null) || handled) enqueue(adopt);
    if (settled(after) === settled(before) && after.savedStudy === before.savedStudy && !opened) return;
    words = opened ? 'opened' : wordsOf(after, before);
    waiting.soon();
  }

  const unsubscribe = store.subscribe(follow);
  if (store.getState().study) {
    words = 'opened';
    waiting.soon();
  }
  return {
    flush: () => {
      waiting.now();
      return writing;
    },
    keepAs: async (name) => {
      waiting.now();
      await writing;
      const study = settled(store.getState());
      if (!study) return;
      const { documentId, lastEdit } = store.getState();
      const newest = kept?.study === study ? (await archive.revisions(documentId))[0] : undefined;
      if (newest?.name === null) return archive.nameRevision(newest.id, name);
      const revision = revisionOf(documentId, study, lastEdit ?? 'opened', now());
      await archive.putDocument(documentOf(store.getState(), study, now()));
      await withRoom(archive, () => archive.putRevision({ ...revision, name }, study));
    },
    stop: () => {
      unsubscribe();
      waiting.cancel();
    },
  };
}

function settled({ study, beforePreview }: Workbench): Study | null {
  return beforePreview ?? study;
}

function wordsOf(after: Workbench, before: Workbench): string {
  const undone = after.history.future.length > before.history.future.length;
  const last = after.history.future.at(-1);
  if (undone && last) return `undo: ${last.words}`;
  return after.lastEdit ?? 'opened';
}

function revisionOf(documentId: string, study: Study, words: string, at: number): KeptRevision {
  const { elements, buses } = study;
  return { id: freshId(), documentId, at, words, name: null, parts: elements.length, buses: buses.length };
}

function documentOf(state: Workbench, study: Study, at: number): KeptDocument {
  const { documentId, fileName, fileHandle } = state;
  return {
    documentId,
    title: study.title,
    site: study.site ?? '',
    fileName,
    fileHandle,
    at,
    parts: study.elements.length,
    inFile: !isUnsaved(state),
  };
}

/** Lets an old document go, unless a state of it is kept under a name. */
async function forget(archive: Archive, documentId: string): Promise<void> {
  const revisions = await archive.revisions(documentId);
  if (revisions.every(({ name }) => name === null)) await archive.dropDocument(documentId);
}

/** The document of the same file: by its handle, or by name and title where the browser gives no handles. */
async function sameFile(documents: readonly KeptDocument[], state: Workbench): Promise<KeptDocument | null> {
  const { fileHandle, fileName, study } = state;
  for (const one of documents) {
    if (fileHandle && one.fileHandle) {
      if (await fileHandle.isSameEntry(one.fileHandle)) return one;
    } else if (!fileHandle && !one.fileHandle && fileName !== null) {
      if (one.fileName === fileName && one.title === study?.title) return one;
    }
  }
  return null;
}

/** Tries once more after letting the older half of all nameless states go, where the storage is full. */
async function withRoom(archive: Archive, write: () => Promise<void>): Promise<void> {
  try {
    await write();
  } catch (error) {
    if (!(error instanceof Error) || error.name !== 'QuotaExceededError') throw error;
    const documents = await archive.documents();
    const all = await Promise.all(documents.map(({ documentId }) => archive.revisions(documentId)));
    const nameless = all.flat().filter(({ name }) => name === null);
    const oldest = nameless.toSorted((a, b) => a.at - b.at).slice(0, Math.ceil(nameless.length / 2));
    await archive.dropRevisions(oldest.map(({ id }) => id));
    await write();
  }
}
