import { type Finding, readStudy, type Study, writeStudy } from '../study/index.ts';
import type { Notice, Workbench, WorkbenchActions, WorkbenchState } from './types.ts';

/** A file as opened from or saved to the machine. Absent handle: the browser cannot write back to it. */
export interface OpenedFile {
  text: string;
  name: string;
  handle?: FileSystemFileHandle;
}

/** The machine's file dialogs. null: the user changed their mind. Rejects where the file cannot be had. */
export interface Files {
  open(): Promise<OpenedFile | null>;
  save(
    text: string,
    name: string,
    handle: FileSystemFileHandle | null,
  ): Promise<{ name: string; handle: FileSystemFileHandle | null } | null>;
}

type Set = (change: (state: Workbench) => Partial<WorkbenchState>) => void;
type Get = () => Workbench;
type FileActions = Pick<WorkbenchActions, 'openText' | 'openFile' | 'saveFile' | 'saveFileAs'>;

/** A file that cannot be read as a study, with everything that is wrong. */
export function refusal(name: string, findings: Finding[]): Notice {
  const errors = findings.filter((finding) => finding.severity === 'error').length;
  const count = errors === 1 ? 'an error' : `${errors} errors`;
  return { severity: 'error', title: `${name} was not opened: it has ${count}.`, findings };
}

function warningOf(name: string, findings: Finding[]): Notice | null {
  if (findings.length === 0) return null;
  const count = findings.length === 1 ? 'a warning' : `${findings.length} warnings`;
  return { severity: 'warning', title: `${name} was opened with ${count}.`, findings };
}

function failure(title: string, error: unknown): Notice {
  const reason = error instanceof Error ? error.message : String(error);
  return { severity: 'error', title: `${title}: ${reason}`, findings: [] };
}

/** The tab that works on a study is the one that writes its file; a file of its own may be saved anywhere. */
function notSaved(name: string): Notice {
  return {
    severity: 'info',
    title: `${name} was not saved: another tab works on this study. Save it under another name, or work here.`,
    findings: [],
  };
}

/** The study as the file keeps it: with the case and busbar last looked at. */
export function studyToSave(study: Study, view: Workbench['view']): Study {
  const { caseId, focusBus } = view;
  return { ...study, view: { ...study.view, caseId, ...(focusBus === '' ? {} : { focusBus }) } };
}

/** A file name of the study's title, for the first save. */
export function fileNameOf(study: Study): string {
  const words = study.title
    .normalize('NFKD')
    .toLowerCase()
    .match(/[a-z0-9]+/g);
  return `${words?.join('-') ?? 'study'}.json`;
}

export function fileActions(set: Set, get: Get, files: Files): FileActions {
  function openText(text: string, name: string, handle?: FileSystemFileHandle): boolean {
    const { study, findings } = readStudy(text);
    if (!study) {
      set(() => ({ notice: refusal(name, findings) }));
      return false;
    }
    get().openStudy(study, name);
    set(() => ({
      fileHandle: handle ?? null,
      importWarnings: findings,
      notice: warningOf(name, findings),
    }));
    return true;
  }

  async function save(toName: string, toHandle: FileSystemFileHandle | null): Promise<void> {
    const { study, beforePreview, view } = get();
    const settled = beforePreview ?? study;
    if (!settled) return;
    if (get().readOnly && toHandle) {
      set(() => ({ notice: notSaved(toName) }));
      return;
    }
    try {
      const saved = await files.save(writeStudy(studyToSave(settled, view)), toName, toHandle);
      if (saved) set(() => ({ fileName: saved.name, fileHandle: saved.handle, savedStudy: settled }));
    } catch (error) {
      set(() => ({ notice: failure(`${toName} was not saved`, error) }));
    }
  }

  const nameFor = (state: Workbench): string =>
    state.fileName ?? (state.study ? fileNameOf(state.study) : 'study.json');

  return {
    openText,
    openFile: async () => {
      try {
        const file = await files.open();
        if (file) openText(file.text, file.name, file.handle);
      } catch (error) {
        set(() => ({ notice: failure('The file was not opened', error) }));
      }
    },
    saveFile: () => save(nameFor(get()), get().fileHandle),
    saveFileAs: () => save(nameFor(get()), null),
  };
}
