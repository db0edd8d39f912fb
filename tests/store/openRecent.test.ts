import { beforeEach, describe, expect, it } from 'vitest';
import {
  autosave,
  createWorkbench,
  isUnsaved,
  type KeptDocument,
  keepRevisions,
  openRecentOf,
  undoWords,
  type WorkbenchStore,
} from '../../src/store/index.ts';
import { MemoryArchive } from './MemoryArchive.ts';
import { MemoryFiles } from './MemoryFiles.ts';
import { MemoryShelf } from './MemoryShelf.ts';
import { retitle, site } from './site.ts';

let store: WorkbenchStore;
let archive: MemoryArchive;
let shelf: MemoryShelf;
const state = () => store.getState();

/** A file on the machine, as its handle gives it. */
function handleOf(file: string | Error, permission: PermissionState = 'granted'): FileSystemFileHandle {
  return {
    name: 'dairy.json',
    isSameEntry: async () => true,
    queryPermission: async () => permission,
    requestPermission: async () => permission,
    getFile: async () => {
      if (file instanceof Error) throw file;
      return { name: 'dairy.json', text: async () => file };
    },
  } as unknown as FileSystemFileHandle;
}

/** Works on the site for a while in a tab that is closed afterwards, and gives its entry in the recent list. */
async function workedOn(handle: FileSystemFileHandle | null, title: string | null): Promise<KeptDocument> {
  const first = createWorkbench(new MemoryFiles());
  const keeping = autosave(first, shelf, { slot: () => 'closed tab' });
  const revisions = keepRevisions(first, archive, { afterMs: 0 });
  if (handle) first.getState().openText(JSON.stringify(site), 'dairy.json', handle);
  else first.getState().openStudy(site);
  if (title !== null) first.getState().edit(retitle(title));
  await keeping.flush();
  await revisions.flush();
  keeping.stop();
  revisions.stop();
  const [document] = await archive.documents();
  if (!document) throw new Error('nothing in the recent list');
  // Handles do not survive the copying of the memory shelf; the browser's keeps them.
  return { ...document, fileHandle: handle };
}

const open = (document: KeptDocument) => openRecentOf(store, archive, shelf, document);

beforeEach(() => {
  store = createWorkbench(new MemoryFiles());
  archive = new MemoryArchive();
  shelf = new MemoryShelf();
});

describe('a recent study', () => {
  it('is read from its file where that has its last state', async () => {
    const handle = handleOf(JSON.stringify({ ...site, title: 'Changed by hand' }));
    shelf.putStudy = async () => undefined;
    await open(await workedOn(handle, null));
    expect(state()).toMatchObject({
      study: { title: 'Changed by hand' },
      fileName: 'dairy.json',
      fileHandle: handle,
    });
    expect(isUnsaved(state())).toBe(false);
  });

  it('comes back with changes that are in no file, and with its undo', async () => {
    await open(await workedOn(null, 'A'));
    expect(state().study?.title).toBe('A');
    expect(undoWords(state())).toBe('name the study A');
    expect(isUnsaved(state())).toBe(true);
  });

  it('comes back from its former states where no tab keeps it any more', async () => {
    const document = await workedOn(null, 'A');
    shelf.studies.clear();
    await open(document);
    expect(state()).toMatchObject({ study: { title: 'A' }, documentId: document.documentId });
  });

  it('is shown as kept where its file is gone or closed to the page, and that is said', async () => {
    const gone = Object.assign(new Error('no such file'), { name: 'NotFoundError' });
    shelf.putStudy = async () => undefined;
    await open({ ...(await workedOn(handleOf(gone), null)), inFile: true });
    expect(state().study?.title).toBe('Fernhill dairy');
    expect(state().notice).toMatchObject({
      severity: 'warning',
      title: expect.stringContaining('moved or deleted'),
    });
    await open({ ...(await workedOn(handleOf('{}', 'denied'), null)), inFile: true });
    expect(state().notice?.title).toContain('not allowed');
  });

  it('is refused in words where nothing of it is left, and the open study stays', async () => {
    const document = await workedOn(null, 'A');
    shelf.studies.clear();
    await archive.dropDocument(document.documentId);
    state().openStudy({ ...site, title: 'Open' });
    await open(document);
    expect(state().study?.title).toBe('Open');
    expect(state().notice).toMatchObject({
      severity: 'error',
      title: expect.stringContaining('keeps no state'),
    });
  });

  it('with a broken file leaves the open study and lists what is wrong', async () => {
    shelf.putStudy = async () => undefined;
    const document = await workedOn(handleOf('{"format":"something"}'), null);
    state().openStudy({ ...site, title: 'Open' });
    await open({ ...document, inFile: true });
    expect(state().study?.title).toBe('Open');
    expect(state().notice?.findings.length).toBeGreaterThan(0);
  });
});
