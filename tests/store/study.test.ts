import { beforeEach, describe, expect, it } from 'vitest';
import {
  createWorkbench,
  isUnsaved,
  redoWords,
  undoWords,
  type WorkbenchStore,
} from '../../src/store/index.ts';
import { MemoryFiles } from './MemoryFiles.ts';
import { nothing, removeBus, removeElement, retitle, site } from './site.ts';

let store: WorkbenchStore;
const state = () => store.getState();

beforeEach(() => {
  store = createWorkbench(new MemoryFiles());
  state().openStudy(site, 'dairy.json');
});

describe('opening a study', () => {
  it('shows its first case and the busbar of its bank', () => {
    expect(state().view).toMatchObject({ caseId: 'day', focusBus: 'main', order: 1 });
  });

  it('shows the case and busbar it was last looked at', () => {
    state().openStudy({ ...site, view: { caseId: 'night', focusBus: 'in' } });
    expect(state().view).toMatchObject({ caseId: 'night', focusBus: 'in' });
  });

  it('begins a new history and forgets the answers of the study before', () => {
    state().edit(retitle('A'));
    state().openStudy(site);
    expect(undoWords(state())).toBeNull();
    expect(state()).toMatchObject({ answer: null, probe: null, allVerdicts: null });
  });

  it('keeps theme and place', () => {
    state().setTheme('dark');
    state().setPlace('correction');
    state().openStudy(site);
    expect(state().view).toMatchObject({ theme: 'dark', place: 'correction' });
  });

  it('counts a study from a file as saved and one without a name as not', () => {
    expect(isUnsaved(state())).toBe(false);
    state().openStudy(site);
    expect(isUnsaved(state())).toBe(true);
  });
});

describe('editing', () => {
  it('does, undoes and redoes, naming each in words', () => {
    state().edit(retitle('A'));
    state().edit(retitle('B'));
    expect(state().study?.title).toBe('B');
    expect(undoWords(state())).toBe('name the study B');
    expect(redoWords(state())).toBeNull();

    state().undo();
    expect(state().study?.title).toBe('A');
    expect(undoWords(state())).toBe('name the study A');
    expect(redoWords(state())).toBe('name the study B');

    state().undo();
    expect(state().study).toBe(site);
    state().redo();
    state().redo();
    expect(state().study?.title).toBe('B');
    expect(state().lastEdit).toBe('name the study B');
  });

  it('raises the revision with every edit, undo and redo', () => {
    const first = state().revision;
    state().edit(retitle('A'));
    state().undo();
    state().redo();
    expect(state().revision).toBe(first + 3);
  });

  it('forgets what could be redone when something else is done', () => {
    state().edit(retitle('A'));
    state().undo();
    state().edit(retitle('B'));
    state().redo();
    expect(state().study?.title).toBe('B');
  });

  it('leaves history and revision alone where an edit changes nothing, and where there is nothing to undo', () => {
    const { revision, history } = state();
    state().edit(nothing);
    state().undo();
    state().redo();
    expect(state()).toMatchObject({ revision, history });
  });

  it('undoes further than any fixed number of steps', () => {
    for (let i = 0; i < 300; i += 1) state().edit(retitle(`title ${i}`));
    for (let i = 0; i < 300; i += 1) state().undo();
    expect(state().study).toBe(site);
  });

  it('counts as unsaved until it is undone', () => {
    state().edit(retitle('A'));
    expect(isUnsaved(state())).toBe(true);
    state().undo();
    expect(isUnsaved(state())).toBe(false);
  });

  it('lets selection, slip and busbar go with what was removed', () => {
    state().select(['element:c1', 'element:t1', 'bus:main']);
    state().openSlip('element:c1');
    state().edit(removeElement('c1'));
    expect(state().view).toMatchObject({ selection: ['element:t1', 'bus:main'], openSlip: null });
    state().edit(removeBus('main'));
    expect(state().view).toMatchObject({ selection: [], focusBus: 'in' });
  });

  it('leaves the view object itself alone where nothing on it is gone', () => {
    const { view } = state();
    state().edit(retitle('A'));
    expect(state().view).toBe(view);
  });

  it('pins a quantity, unpins it, and undoes both', () => {
    const pin = { quantity: 'current', element: 't1', bus: 'main' } as const;
    state().togglePin(pin);
    expect(state().study?.view?.pins).toEqual([pin]);
    expect(undoWords(state())).toBe('pin the current into T1');
    state().togglePin({ quantity: 'voltage', bus: 'main' });
    state().togglePin({ ...pin });
    expect(state().study?.view?.pins).toEqual([{ quantity: 'voltage', bus: 'main' }]);
    state().undo();
    state().undo();
    state().undo();
    expect(state().study).toBe(site);
  });
});

describe('a gesture', () => {
  it('shows each state from the beginning of the gesture and leaves one step of history', () => {
    state().preview(retitle('A'));
    state().preview({ ...retitle('B'), apply: (study) => ({ ...study, title: `${study.title} twice` }) });
    expect(state().study?.title).toBe('Fernhill dairy twice');
    expect(undoWords(state())).toBeNull();
    state().edit(retitle('C'));
    expect(state()).toMatchObject({ study: { title: 'C' }, beforePreview: null });
    state().undo();
    expect(state().study).toBe(site);
  });

  it('leaves no trace when it is cancelled', () => {
    const { revision } = state();
    state().preview(retitle('A'));
    state().cancelPreview();
    expect(state()).toMatchObject({ study: site, beforePreview: null, revision: revision + 2 });
    expect(undoWords(state())).toBeNull();
    expect(isUnsaved(state())).toBe(false);
  });

  it('is cancelled by undo, which undoes the step before it as well', () => {
    state().edit(retitle('A'));
    state().preview(retitle('B'));
    state().undo();
    expect(state()).toMatchObject({ study: site, beforePreview: null });
    state().redo();
    expect(state().study?.title).toBe('A');
  });
});

describe('the view', () => {
  it('refuses a case or busbar the study does not have and an order not above 0', () => {
    expect(() => state().setCase('weekend')).toThrow(RangeError);
    expect(() => state().setFocusBus('roof')).toThrow(RangeError);
    expect(() => state().setOrder(0)).toThrow(RangeError);
    expect(() => state().setOrder(Number.NaN)).toThrow(RangeError);
  });

  it('keeps the time cursor within the period', () => {
    state().setTimeCursor(1.25);
    expect(state().view.timeCursor).toBeCloseTo(0.25, 12);
    state().setTimeCursor(-0.25);
    expect(state().view.timeCursor).toBeCloseTo(0.75, 12);
  });

  it('does not raise the revision', () => {
    const { revision } = state();
    state().setCase('night');
    state().setOrder(7.3);
    state().select(['bus:main']);
    expect(state().revision).toBe(revision);
  });

  it('is the same object after a change to what it already is', () => {
    state().setOrder(7);
    const { view } = state();
    state().setOrder(7);
    expect(state().view).toBe(view);
  });
});
