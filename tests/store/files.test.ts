import { beforeEach, describe, expect, it } from 'vitest';
import { createWorkbench, isUnsaved, type WorkbenchStore } from '../../src/store/index.ts';
import { readStudy } from '../../src/study/index.ts';
import { MemoryFiles } from './MemoryFiles.ts';
import { retitle, site } from './site.ts';

let store: WorkbenchStore;
let files: MemoryFiles;
const state = () => store.getState();

beforeEach(() => {
  files = new MemoryFiles();
  store = createWorkbench(files);
});

describe('opening text', () => {
  it('puts a sound study on the table', () => {
    expect(state().openText(JSON.stringify(site), 'dairy.json')).toBe(true);
    expect(state()).toMatchObject({
      study: { title: 'Fernhill dairy' },
      fileName: 'dairy.json',
      notice: null,
    });
  });

  it('never replaces the open study by a broken file and lists every finding', () => {
    state().openStudy(site, 'dairy.json');
    state().edit(retitle('A'));
    const before = state();
    const broken = { ...site, buses: [{ id: 'in', nominalV: -1 }], elements: site.elements.slice(0, 2) };
    expect(state().openText(JSON.stringify(broken), 'broken.json')).toBe(false);
    expect(state()).toMatchObject({
      study: before.study,
      revision: before.revision,
      history: before.history,
      fileName: 'dairy.json',
      notice: { severity: 'error', title: expect.stringContaining('broken.json was not opened') },
    });
    const paths = state().notice?.findings.map((finding) => finding.path);
    expect(paths).toContain('$.buses[0].nominalV');
    expect(paths).toContain('$.elements[1].to');
  });

  it('refuses text that is no JSON, and a foreign file', () => {
    state().openStudy(site);
    expect(state().openText('no study at all', 'notes.txt')).toBe(false);
    expect(state().openText('{"format":"something-else"}', 'foreign.json')).toBe(false);
    expect(state().study).toBe(site);
    expect(state().notice?.findings.length).toBeGreaterThan(0);
  });

  it('keeps the warnings of the import and the unknown field that caused one', () => {
    const text = JSON.stringify({ ...site, surveyor: 'unknown to this version' });
    expect(state().openText(text, 'dairy.json')).toBe(true);
    expect(state().importWarnings.map((finding) => finding.severity)).toEqual(['warning']);
    expect(state().notice).toMatchObject({ severity: 'warning' });
    expect(state().study).toMatchObject({ surveyor: 'unknown to this version' });
  });
});

describe('the file dialogs', () => {
  it('open a file and remember its handle', async () => {
    const handle = { name: 'dairy.json' } as FileSystemFileHandle;
    files.next = { text: JSON.stringify(site), name: 'dairy.json', handle };
    await state().openFile();
    expect(state()).toMatchObject({ fileName: 'dairy.json', fileHandle: handle });
  });

  it('change nothing when the user changes their mind', async () => {
    state().openStudy(site);
    await state().openFile();
    expect(state()).toMatchObject({ study: site, notice: null });
  });

  it('say why a file could not be had', async () => {
    files.next = new Error('the disk is gone');
    await state().openFile();
    expect(state().notice).toMatchObject({
      severity: 'error',
      title: expect.stringContaining('the disk is gone'),
    });
  });

  it('save what can be read back, with the case and busbar looked at, and count it as saved', async () => {
    state().openText(JSON.stringify(site), 'dairy.json');
    state().edit(retitle('A'));
    state().setCase('night');
    state().setFocusBus('in');
    await state().saveFile();
    const { study, findings } = readStudy(files.saved[0]?.text ?? '');
    expect(findings.filter((finding) => finding.severity === 'error')).toEqual([]);
    expect(study).toMatchObject({ title: 'A', view: { caseId: 'night', focusBus: 'in' } });
    expect(files.saved[0]?.name).toBe('dairy.json');
    expect(isUnsaved(state())).toBe(false);
  });

  it('save a study without a file under its title, and a copy without the handle', async () => {
    state().openStudy(site);
    await state().saveFile();
    expect(files.saved[0]).toMatchObject({ name: 'fernhill-dairy.json', handle: null });
    const handle = { name: 'x.json' } as FileSystemFileHandle;
    store.setState({ fileHandle: handle });
    await state().saveFile();
    await state().saveFileAs();
    expect(files.saved.map((saved) => saved.handle)).toEqual([null, handle, null]);
  });

  it('say why a file could not be saved and count the study as unsaved', async () => {
    state().openStudy(site, 'dairy.json');
    state().edit(retitle('A'));
    files.refuse = new Error('the disk is full');
    await state().saveFile();
    expect(state().notice?.title).toContain('the disk is full');
    expect(isUnsaved(state())).toBe(true);
  });
});
