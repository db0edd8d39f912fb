import { beforeEach, describe, expect, it } from 'vitest';
import {
  autosave,
  createWorkbench,
  type TabChannel,
  type TabMessage,
  undoWords,
  type WorkbenchStore,
  watchTabs,
} from '../../src/store/index.ts';
import { MemoryFiles } from './MemoryFiles.ts';
import { MemoryShelf } from './MemoryShelf.ts';
import { retitle, site } from './site.ts';

let channels: TabChannel[];
let shelf: MemoryShelf;

/** Channels that hear each other, as those of one name do in a browser. */
function channel(): TabChannel {
  const own: TabChannel = {
    onmessage: null,
    postMessage: (message) => {
      const data = structuredClone(message);
      for (const other of channels) {
        if (other !== own) other.onmessage?.({ data } as MessageEvent<TabMessage>);
      }
    },
    close: () => {
      channels = channels.filter((other) => other !== own);
    },
  };
  channels.push(own);
  return own;
}

function tab(name: string, slotAtStart = `slot of ${name}`) {
  const store = createWorkbench(new MemoryFiles());
  let slot = slotAtStart;
  const takeFreshSlot = (): void => {
    slot = `fresh slot of ${name}`;
  };
  const options = { tab: name, slot: () => slot, takeFreshSlot, shelf, yieldWithinMs: 5 };
  const watch = watchTabs(store, channel(), options);
  return { store, ...watch, slot: () => slot, title: () => store.getState().notice?.title };
}

/** Another tab with the same document, as a restored or reopened one has it. */
function sameDocument(of: { store: WorkbenchStore }, name: string) {
  const other = tab(name);
  const { study, documentId, fileName } = of.store.getState();
  if (study) other.store.getState().openStudy(study, fileName);
  other.store.setState({ documentId });
  return other;
}

beforeEach(() => {
  channels = [];
  shelf = new MemoryShelf();
});

describe('two tabs', () => {
  it('with different files, or two studies never saved, are told nothing', () => {
    const [a, b] = [tab('a'), tab('b')];
    a.store.getState().openStudy(site, 'dairy.json');
    b.store.getState().openStudy(site, 'copy.json');
    b.store.getState().openStudy(site);
    a.store.getState().openStudy(site);
    expect(a.title()).toBeUndefined();
    expect(b.title()).toBeUndefined();
  });

  it('with two documents of one file name and title are both told, and both go on', () => {
    const [a, b] = [tab('a'), tab('b')];
    a.store.getState().openStudy(site, 'dairy.json');
    expect(a.title()).toBeUndefined();
    b.store.getState().openStudy(site, 'dairy.json');
    for (const one of [a, b]) {
      expect(one.title()).toContain('“Fernhill dairy” is also open in another tab');
      expect(one.store.getState().readOnly).toBe(false);
    }
  });

  it('do not share a place on the shelf: the newcomer takes a fresh one', () => {
    const a = tab('a', 'one slot');
    a.store.getState().openStudy(site, 'dairy.json');
    const b = tab('b', 'one slot');
    b.store.getState().openStudy({ ...site, title: 'Another' }, 'another.json');
    expect(a.slot()).toBe('one slot');
    expect(b.slot()).toBe('fresh slot of b');
  });

  it('hear nothing of each other once one is closed', () => {
    const [a, b] = [tab('a'), tab('b')];
    a.stop();
    a.store.getState().openStudy(site, 'dairy.json');
    b.store.getState().openStudy(site, 'dairy.json');
    expect(b.title()).toBeUndefined();
  });
});

describe('one document in two tabs', () => {
  it('is worked on by the first; the newcomer only looks, and says so when it is edited', () => {
    const a = tab('a');
    a.store.getState().openStudy(site);
    const b = sameDocument(a, 'b');
    expect(a.store.getState().readOnly).toBe(false);
    expect(a.title()).toContain('opened in another tab');
    expect(b.store.getState().readOnly).toBe(true);
    const before = b.store.getState();
    b.store.getState().edit(retitle('B'));
    b.store.getState().undo();
    b.store.getState().preview(retitle('B'));
    expect(b.store.getState()).toMatchObject({ study: before.study, history: before.history });
    expect(b.title()).toContain('Nothing was changed');
  });

  it('is not kept by the tab that only looks', async () => {
    const a = tab('a');
    a.store.getState().openStudy(site);
    const b = sameDocument(a, 'b');
    const keeping = autosave(b.store, shelf, { slot: b.slot });
    b.store.setState({ savedStudy: site });
    await keeping.flush();
    keeping.stop();
    expect(shelf.studies.size).toBe(0);
  });

  it('is taken over with everything done in the other tab, its undo included', async () => {
    const a = tab('a');
    a.store.getState().openStudy(site, 'dairy.json');
    const b = sameDocument(a, 'b');
    a.store.getState().edit(retitle('A'));
    a.store.getState().preview(retitle('under way'));
    await b.takeOver();
    expect(b.store.getState()).toMatchObject({
      readOnly: false,
      study: { title: 'A' },
      fileName: 'dairy.json',
    });
    expect(b.store.getState().documentId).toBe(a.store.getState().documentId);
    expect(undoWords(b.store.getState())).toBe('name the study A');
    expect(a.store.getState()).toMatchObject({ readOnly: true, beforePreview: null });
    expect(a.title()).toContain('taken over');
    await a.takeOver();
    expect(a.store.getState().readOnly).toBe(false);
    expect(b.store.getState().readOnly).toBe(true);
  });

  it('is taken over from the shelf where the other tab does not answer any more', async () => {
    const a = tab('a');
    const keeping = autosave(a.store, shelf, { slot: a.slot });
    a.store.getState().openStudy(site);
    const b = sameDocument(a, 'b');
    a.store.getState().edit(retitle('A'));
    await keeping.flush();
    keeping.stop();
    channels = channels.slice(1); // the tab crashed
    await b.takeOver();
    expect(b.store.getState()).toMatchObject({ readOnly: false, study: { title: 'A' } });
  });

  it('goes on here as it is where nothing newer can be had', async () => {
    const a = tab('a');
    a.store.getState().openStudy(site);
    const b = sameDocument(a, 'b');
    channels = channels.slice(1);
    shelf.refuse = new Error('blocked');
    await b.takeOver();
    expect(b.store.getState()).toMatchObject({ readOnly: false, study: { title: 'Fernhill dairy' } });
  });

  it('says when the working tab is closed', () => {
    const a = tab('a');
    a.store.getState().openStudy(site);
    const b = sameDocument(a, 'b');
    a.stop();
    expect(b.title()).toContain('The other tab is closed');
  });

  it('can be left as it is for a copy of one’s own', () => {
    const a = tab('a');
    a.store.getState().openStudy(site, 'dairy.json');
    const b = sameDocument(a, 'b');
    b.store.getState().makeCopy();
    const copy = b.store.getState();
    expect(copy).toMatchObject({ readOnly: false, fileName: null, savedStudy: null });
    expect(copy.study?.title).toBe('Fernhill dairy, copy');
    expect(copy.documentId).not.toBe(a.store.getState().documentId);
    b.store.getState().edit(retitle('B'));
    expect(b.store.getState().study?.title).toBe('B');
  });

  it('leaves its file to the working tab', async () => {
    const a = tab('a');
    a.store.getState().openStudy(site, 'dairy.json');
    const b = sameDocument(a, 'b');
    b.store.setState({ fileHandle: { name: 'dairy.json' } as FileSystemFileHandle });
    await b.store.getState().saveFile();
    expect(b.title()).toContain('dairy.json was not saved');
    await b.store.getState().saveFileAs();
    expect(b.store.getState().fileName).toBe('dairy.json');
  });
});
