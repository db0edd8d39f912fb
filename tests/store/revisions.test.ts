import fc from 'fast-check';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import {
  createWorkbench,
  type KeptRevision,
  keepRevisions,
  type RevisionKeeper,
  revisionsToDrop,
  type WorkbenchStore,
} from '../../src/store/index.ts';
import { MemoryArchive } from './MemoryArchive.ts';
import { MemoryFiles } from './MemoryFiles.ts';
import { removeElement, retitle, site } from './site.ts';

const minute = 60_000;
const hour = 60 * minute;
const day = 24 * hour;
const noon = Date.UTC(2026, 11, 1, 12);

let store: WorkbenchStore;
let archive: MemoryArchive;
let keeper: RevisionKeeper;
const state = () => store.getState();

beforeEach(() => {
  vi.useFakeTimers({ now: noon });
  store = createWorkbench(new MemoryFiles());
  archive = new MemoryArchive();
  keeper = keepRevisions(store, archive);
});
afterEach(() => {
  keeper.stop();
  vi.useRealTimers();
});

const words = async () => (await archive.revisions(state().documentId)).map((one) => one.words);

async function edited(title: string): Promise<void> {
  state().edit(retitle(title));
  await vi.advanceTimersByTimeAsync(1000);
}

describe('former states', () => {
  it('are kept under the words that led to them, the newest first, with their counts', async () => {
    state().openStudy(site);
    await vi.advanceTimersByTimeAsync(1000);
    await edited('A');
    state().edit(removeElement('pumps'));
    await vi.advanceTimersByTimeAsync(1000);
    expect(await words()).toEqual(['remove pumps', 'name the study A', 'opened']);
    const [newest] = await archive.revisions(state().documentId);
    expect(newest).toMatchObject({ parts: 4, buses: 2, name: null });
    expect(await archive.revisionStudy(newest?.id ?? '')).toEqual(state().study);
  });

  it('leave gestures under way out, and say an undo as such', async () => {
    state().openStudy(site);
    await edited('A');
    state().preview(retitle('passing'));
    await vi.advanceTimersByTimeAsync(1000);
    state().cancelPreview();
    state().undo();
    await vi.advanceTimersByTimeAsync(1000);
    expect((await words())[0]).toBe('undo: name the study A');
  });

  it('become one where edits follow each other at once', async () => {
    state().openStudy(site);
    await vi.advanceTimersByTimeAsync(1000);
    for (const title of ['A', 'B', 'C']) state().edit(retitle(title));
    await vi.advanceTimersByTimeAsync(1000);
    expect(await words()).toEqual(['name the study C', 'opened']);
  });

  it('are not doubled when the page is loaded anew', async () => {
    state().openStudy(site);
    await edited('A');
    const before = await words();
    const again = createWorkbench(new MemoryFiles());
    again.getState().openStudy(structuredClone(state().study ?? site));
    again.setState({ documentId: state().documentId });
    const second = keepRevisions(again, archive);
    await vi.advanceTimersByTimeAsync(1000);
    second.stop();
    expect(await words()).toEqual(before);
  });

  it('are not kept of an empty paper, nor by a tab that only looks', async () => {
    state().openStudy({ ...site, buses: [], elements: [], cases: [] });
    await vi.advanceTimersByTimeAsync(1000);
    state().openStudy(site);
    store.setState({ readOnly: true });
    await vi.advanceTimersByTimeAsync(1000);
    expect(archive.heads.size + archive.known.size).toBe(0);
  });

  it('are kept for good under a name', async () => {
    state().openStudy(site);
    await keeper.keepAs('as found');
    for (let step = 0; step < 120; step += 1) await edited(`title ${step}`);
    const kept = await archive.revisions(state().documentId);
    const nameless = kept.filter(({ name }) => name === null);
    expect(nameless.length).toBeGreaterThanOrEqual(50); // and one per ten minutes before them
    expect(nameless.length).toBeLessThanOrEqual(52);
    expect(kept.filter(({ name }) => name !== null)).toMatchObject([{ name: 'as found' }]);
  });

  it('make room by letting the oldest nameless ones go where the storage is full', async () => {
    state().openStudy(site);
    await keeper.keepAs('as found');
    for (let step = 0; step < 10; step += 1) await edited(`title ${step}`);
    archive.room = archive.heads.size;
    await edited('one more');
    expect((await words())[0]).toBe('name the study one more');
    expect(archive.heads.size).toBeLessThanOrEqual(archive.room);
    expect([...archive.heads.values()].some(({ name }) => name === 'as found')).toBe(true);
  });

  it('that cannot be kept do not stop the work', async () => {
    state().openStudy(site);
    archive.refuse = new Error('blocked');
    await edited('A');
    archive.refuse = null;
    await edited('B');
    expect((await words())[0]).toBe('name the study B');
  });
});

describe('recent studies', () => {
  it('stand with title, file, parts and whether the file has their last state', async () => {
    state().openStudy({ ...site, site: 'Fernhill' }, 'dairy.json');
    await vi.advanceTimersByTimeAsync(1000);
    expect(await archive.documents()).toMatchObject([
      { title: 'Fernhill dairy', site: 'Fernhill', fileName: 'dairy.json', parts: 5, inFile: true },
    ]);
    await edited('A');
    expect(await archive.documents()).toMatchObject([{ title: 'A', inFile: false }]);
    await state().saveFile();
    await vi.advanceTimersByTimeAsync(1000);
    expect(await archive.documents()).toMatchObject([{ title: 'A', inFile: true }]);
  });

  it('of one file are one: opened again it goes on under its document, with its former states', async () => {
    const handle = { name: 'dairy.json', isSameEntry: async () => true } as unknown as FileSystemFileHandle;
    state().openText(JSON.stringify(site), 'dairy.json', handle);
    await edited('A');
    const { documentId } = state();
    state().openStudy({ ...site, title: 'Another' });
    await vi.advanceTimersByTimeAsync(1000);
    state().openText(JSON.stringify(site), 'dairy.json', handle);
    await vi.advanceTimersByTimeAsync(1000);
    expect(state().documentId).toBe(documentId);
    expect(await words()).toEqual(['opened', 'name the study A']);
    expect(await archive.documents()).toHaveLength(2);
  });

  it('of the same name at another place stay apart', async () => {
    const at = () =>
      ({ name: 'dairy.json', isSameEntry: async () => false }) as unknown as FileSystemFileHandle;
    state().openText(JSON.stringify(site), 'dairy.json', at());
    await vi.advanceTimersByTimeAsync(1000);
    state().openText(JSON.stringify(site), 'dairy.json', at());
    await vi.advanceTimersByTimeAsync(1000);
    expect(await archive.documents()).toHaveLength(2);
  });
});

describe('thinning out', () => {
  let count = 0;
  const revision = (at: number, name: string | null = null): KeptRevision => {
    count += 1;
    return { id: `r${count}`, documentId: 'd', at, words: 'edit', name, parts: 5, buses: 2 };
  };
  const every = (ms: number, number: number, from = noon) =>
    Array.from({ length: number }, (_, step) => revision(from - step * ms));
  const left = (revisions: readonly KeptRevision[]) => {
    const gone = new Set(revisionsToDrop(revisions, noon));
    return revisions.filter(({ id }) => !gone.has(id));
  };

  it('keeps the newest fifty whatever their age', () => {
    expect(left(every(30 * day, 50))).toHaveLength(50);
  });

  it('keeps one per ten minutes before them, the last of each', () => {
    const newest = every(1000, 50);
    const older = every(minute, 60, noon - hour);
    const kept = left([...newest, ...older]).slice(50);
    expect(kept).toHaveLength(7); // 60 minutes touch seven windows of ten
    expect(kept[0]?.at).toBe(noon - hour);
  });

  it('keeps one per day before the last day, for ninety days', () => {
    const newest = every(1000, 50);
    const older = every(hour, 24 * 120, noon - 2 * day);
    const kept = left([...newest, ...older]).slice(50);
    expect(kept.length).toBeGreaterThanOrEqual(88);
    expect(kept.length).toBeLessThanOrEqual(90);
    const days = kept.map(({ at }) => Math.floor(at / day));
    expect(new Set(days).size).toBe(days.length);
  });

  it('never touches a named one, and a second thinning finds nothing more to drop', () => {
    const moment = fc.integer({ min: 0, max: 200 * day });
    fc.assert(
      fc.property(fc.array(fc.tuple(moment, fc.boolean()), { maxLength: 300 }), (moments) => {
        const revisions = moments.map(([ago, named]) => revision(noon - ago, named ? 'kept' : null));
        const kept = left(revisions);
        expect(kept.filter(({ name }) => name !== null)).toEqual(
          revisions.filter(({ name }) => name !== null),
        );
        expect(revisionsToDrop(kept, noon)).toEqual([]);
        const newest = revisions.filter(({ name }) => name === null).toSorted((a, b) => b.at - a.at);
        for (const one of newest.slice(0, 50)) expect(kept).toContain(one);
      }),
      { seed: 502, numRuns: 100 },
    );
  });
});
