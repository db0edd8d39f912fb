import { beforeEach, describe, expect, it } from 'vitest';
import { createWorkbench, type TabChannel, type TabMessage, watchTabs } from '../../src/store/index.ts';
import { MemoryFiles } from './MemoryFiles.ts';
import { site } from './site.ts';

let channels: TabChannel[];

/** Channels that hear each other, as those of one name do in a browser. */
function channel(): TabChannel {
  const own: TabChannel = {
    onmessage: null,
    postMessage: (message) => {
      for (const other of channels) {
        if (other !== own) other.onmessage?.({ data: message } as MessageEvent<TabMessage>);
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
  const stop = watchTabs(store, channel(), { tab: name, slot: () => slot, takeFreshSlot });
  return { store, stop, slot: () => slot, title: () => store.getState().notice?.title };
}

beforeEach(() => {
  channels = [];
});

describe('two tabs', () => {
  it('with the same file open are both told', () => {
    const [a, b] = [tab('a'), tab('b')];
    a.store.getState().openStudy(site, 'dairy.json');
    expect(a.title()).toBeUndefined();
    b.store.getState().openStudy(site, 'dairy.json');
    expect(a.title()).toContain('“Fernhill dairy” is also open in another tab');
    expect(b.title()).toContain('“Fernhill dairy” is also open in another tab');
  });

  it('with different files, or two studies never saved, are told nothing', () => {
    const [a, b] = [tab('a'), tab('b')];
    a.store.getState().openStudy(site, 'dairy.json');
    b.store.getState().openStudy(site, 'copy.json');
    b.store.getState().openStudy(site);
    a.store.getState().openStudy(site);
    expect(a.title()).toBeUndefined();
    expect(b.title()).toBeUndefined();
  });

  it('with the same study restored are told, also when it was never saved', () => {
    const [a, b] = [tab('a'), tab('b')];
    a.store.getState().openStudy(site);
    b.store.getState().openStudy(site);
    b.store.setState({ documentId: a.store.getState().documentId });
    expect(a.title()).toContain('also open');
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
