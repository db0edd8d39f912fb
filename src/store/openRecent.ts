import { checkStudy } from '../study/index.ts';
import type { Archive, KeptDocument } from './archive.ts';
import type { WorkbenchStore } from './createWorkbench.ts';
import { putHistoryBack, putKept } from './restore.ts';
import type { Shelf } from './shelf.ts';

/** What a file handle can be asked beyond the DOM's own description of it. */
interface AskableHandle extends FileSystemFileHandle {
  queryPermission?(options: { mode: 'read' | 'readwrite' }): Promise<PermissionState>;
  requestPermission?(options: { mode: 'read' | 'readwrite' }): Promise<PermissionState>;
}

/**
 * Opens a study of the recent ones. Where its last state is in a file and the browser still has the file's
 * handle, the file is read; otherwise what this browser kept of it comes back, with its history where a tab
 * still keeps that. A file that cannot be read is said, and the kept state opened in its stead.
 */
export async function openRecent(
  store: WorkbenchStore,
  archive: Archive,
  shelf: Shelf,
  document: KeptDocument,
): Promise<void> {
  const unread = document.inFile && document.fileHandle ? await openFromFile(store, document.fileHandle) : '';
  if (unread === null) return;
  const opened = await openKept(store, archive, shelf, document);
  const name = document.fileName ?? document.title;
  if (!opened) {
    const why = unread === '' ? 'this browser keeps no state of it any more' : unread;
    fail(store, 'error', `${name} was not opened: ${why}.`);
  } else if (unread !== '')
    fail(store, 'warning', `${name} could not be read (${unread}); what this browser kept of it is open.`);
}

function fail(store: WorkbenchStore, severity: 'error' | 'warning', title: string): void {
  store.getState().setNotice({ severity, title, findings: [] });
}

/** Null once the file is open, or refused with its findings; else why it could not be had. */
async function openFromFile(store: WorkbenchStore, handle: AskableHandle): Promise<string | null> {
  try {
    const asked = { mode: 'read' } as const;
    const given = (await handle.queryPermission?.(asked)) ?? 'granted';
    const allowed = given === 'granted' || (await handle.requestPermission?.(asked)) === 'granted';
    if (!allowed) return 'reading it was not allowed';
    const file = await handle.getFile();
    store.getState().openText(await file.text(), file.name, handle);
    return null;
  } catch (error) {
    if (error instanceof Error && error.name === 'NotFoundError') return 'it was moved or deleted';
    return error instanceof Error ? error.message : String(error);
  }
}

async function openKept(
  store: WorkbenchStore,
  archive: Archive,
  shelf: Shelf,
  { documentId, fileName, fileHandle, inFile }: KeptDocument,
): Promise<boolean> {
  const kept = await shelf.newestOf(documentId).catch(() => null);
  if (kept && checkStudy(kept.study).study) {
    putKept(store, kept, null);
    await putHistoryBack(store, kept);
    return true;
  }
  const [newest] = await archive.revisions(documentId).catch(() => []);
  const former = newest && (await archive.revisionStudy(newest.id));
  const { study } = former ? checkStudy(former) : { study: null };
  if (!study) return false;
  store.getState().openStudy(study, fileName, documentId);
  store.setState({ fileHandle, savedStudy: inFile ? study : null });
  return true;
}
