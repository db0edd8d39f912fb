import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import {
  type Autosave,
  autosave,
  createWorkbench,
  isUnsaved,
  redoWords,
  restore,
  undoWords,
  type WorkbenchStore,
} from '../../src/store/index.ts';
import { MemoryFiles } from './MemoryFiles.ts';
import { MemoryShelf } from './MemoryShelf.ts';
import { retitle, site } from './site.ts';

let store: WorkbenchStore;
let shelf: MemoryShelf;
let keeping: Autosave;
let clock = 0;
const state = () => store.getState();

function tab(slot: string): { store: WorkbenchStore; keeping: Autosave } {
  const opened = createWorkbench(new MemoryFiles());
  return { store: opened, keeping: autosave(opened, shelf, { slot: () => slot, now: () => ++clock }) };
}

/** A page loaded anew in the tab of a slot. */
async function reloaded(slot = 'tab 1') {
  const fresh = createWorkbench(new MemoryFiles());
  const { restored, history } = await restore(fresh, shelf, slot);
  await history;
  return { fresh, restored };
}

beforeEach(() => {
  shelf = new MemoryShelf();
  ({ store, keeping } = tab('tab 1'));
});
afterEach(() => keeping.stop());

describe('autosave', () => {
  beforeEach(() => vi.useFakeTimers());
  afterEach(() => vi.useRealTimers());

  it('keeps a change within 250 ms, also while changes go on', async () => {
    state().openStudy(site);
    for (let ms = 0; ms < 250; ms += 10) {
      state().edit(retitle(`after ${ms} ms`));
      await vi.advanceTimersByTimeAsync(10);
    }
    expect(shelf.studyWrites).toBeGreaterThanOrEqual(2);
    expect(shelf.studyWrites).toBeLessThanOrEqual(4);
    await vi.advanceTimersByTimeAsync(250);
    expect(shelf.studies.get('tab 1')?.study.title).toBe('after 240 ms');
  });

  it('keeps the view by itself, so that scrubbing writes no study', async () => {
    state().openStudy(site);
    await vi.advanceTimersByTimeAsync(250);
    const writes = shelf.studyWrites;
    state().setOrder(7.2);
    await vi.advanceTimersByTimeAsync(250);
    expect(shelf.studyWrites).toBe(writes);
    expect(shelf.views.get('tab 1')?.view.order).toBe(7.2);
  });

  it('keeps the beginning of a gesture, not its passing states', async () => {
    state().openStudy(site);
    await vi.advanceTimersByTimeAsync(250);
    const writes = shelf.studyWrites;
    state().preview(retitle('passing'));
    await vi.advanceTimersByTimeAsync(250);
    expect(shelf.studyWrites).toBe(writes);
    state().edit(retitle('final'));
    await vi.advanceTimersByTimeAsync(250);
    expect(shelf.studies.get('tab 1')?.study.title).toBe('final');
  });

  it('keeps at once when the page is about to go', async () => {
    state().openStudy(site);
    state().edit(retitle('A'));
    await keeping.flush();
    expect(shelf.studies.get('tab 1')?.study.title).toBe('A');
  });

  it('keeps the last 50 steps of the history, sharing the unchanged parts', async () => {
    state().openStudy(site);
    for (let i = 0; i < 60; i += 1) state().edit(retitle(`title ${i}`));
    await keeping.flush();
    const kept = shelf.studies.get('tab 1');
    expect(kept?.history.past).toHaveLength(50);
    expect(kept?.history.past[0]?.words).toBe('name the study title 10');
    expect(kept?.history.past[0]?.study.elements).toBe(kept?.study.elements);
  });

  it('says once that it cannot keep the study, and again only after it could in between', async () => {
    state().openStudy(site);
    shelf.refuse = Object.assign(new Error('quota'), { name: 'QuotaExceededError' });
    await keeping.flush();
    expect(state().notice?.title).toContain('storage is full');
    state().dismissNotice();
    state().edit(retitle('A'));
    await keeping.flush();
    expect(state().notice).toBeNull();
    shelf.refuse = null;
    state().edit(retitle('B'));
    await keeping.flush();
    shelf.refuse = new Error('the disk is gone');
    state().edit(retitle('C'));
    await keeping.flush();
    expect(state().notice?.title).toContain('the disk is gone');
  });
});

describe('a reload', () => {
  it('finds study, history, view and file name', async () => {
    state().openStudy(site, 'dairy.json');
    state().edit(retitle('A'));
    state().edit(retitle('B'));
    state().undo();
    state().setCase('night');
    state().setOrder(5.3);
    state().select(['element:t1']);
    await keeping.flush();

    const { fresh, restored } = await reloaded();
    expect(restored).toBe(true);
    const found = fresh.getState();
    expect(found).toMatchObject({
      study: { title: 'A' },
      fileName: 'dairy.json',
      documentId: state().documentId,
    });
    expect(found.view).toMatchObject({ caseId: 'night', order: 5.3, selection: ['element:t1'] });
    expect(undoWords(found)).toBe('name the study A');
    expect(redoWords(found)).toBe('name the study B');
    expect(isUnsaved(found)).toBe(true);
    found.undo();
    expect(isUnsaved(fresh.getState())).toBe(false);
    expect(fresh.getState().study).toEqual(site);
  });

  it('finds nothing on an empty shelf, and says nothing', async () => {
    const { fresh, restored } = await reloaded();
    expect(restored).toBe(false);
    expect(fresh.getState()).toMatchObject({ study: null, notice: null });
  });

  it('finds the tab’s own study rather than the newest, and the newest in a new tab', async () => {
    state().openStudy({ ...site, title: 'First tab' });
    await keeping.flush();
    const second = tab('tab 2');
    second.store.getState().openStudy({ ...site, title: 'Second tab' });
    await second.keeping.flush();
    second.keeping.stop();
    expect((await reloaded('tab 1')).fresh.getState().study?.title).toBe('First tab');
    expect((await reloaded('tab 3')).fresh.getState().study?.title).toBe('Second tab');
  });

  it('refuses a kept study that does not pass the reading of a file, and says why', async () => {
    state().openStudy({ ...site, buses: [] });
    await keeping.flush();
    const { fresh, restored } = await reloaded();
    expect(restored).toBe(false);
    expect(fresh.getState()).toMatchObject({ study: null, notice: { severity: 'error' } });
    expect(fresh.getState().notice?.findings.length).toBeGreaterThan(0);
  });

  it('leaves out the history before a step that cannot be read', async () => {
    state().openStudy(site);
    state().edit({ label: 'break', words: 'break it', apply: (study) => ({ ...study, buses: [] }) });
    state().edit({ label: 'mend', words: 'mend it', apply: () => site });
    state().edit(retitle('A'));
    await keeping.flush();
    const { fresh } = await reloaded();
    expect(fresh.getState().history.past.map((step) => step.words)).toEqual(['name the study A']);
  });

  it('puts the history behind edits made before it was read', async () => {
    state().openStudy(site);
    state().edit(retitle('A'));
    await keeping.flush();
    const fresh = createWorkbench(new MemoryFiles());
    const { history } = await restore(fresh, shelf, 'tab 1');
    fresh.getState().edit(retitle('B'));
    await history;
    fresh.getState().undo();
    fresh.getState().undo();
    expect(fresh.getState().study).toEqual(site);
  });

  it('says that the shelf cannot be reached', async () => {
    shelf.refuse = new Error('blocked');
    const { fresh, restored } = await reloaded();
    expect(restored).toBe(false);
    expect(fresh.getState().notice?.title).toContain('blocked');
  });
});
