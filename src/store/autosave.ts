import type { WorkbenchStore } from './createWorkbench.ts';
import { type History, tailOf } from './history.ts';
import { later } from './later.ts';
import type { KeptStudy, Shelf } from './shelf.ts';
import type { Notice, Workbench } from './types.ts';

const historyKept = 50;

export interface AutosaveOptions {
  /** The tab's place on the shelf. */
  slot: () => string;
  now?: () => number;
  /** A change is on its way to the shelf this long after it was made at the latest. */
  studyAfterMs?: number;
  viewAfterMs?: number;
}

export interface Autosave {
  /** Puts away at once what still waits; resolves when it is kept or has been reported as failed. */
  flush(): Promise<void>;
  stop(): void;
}

/**
 * Keeps the workbench on the shelf: the study with the tail of its history soon after each change, the view
 * by itself, so that scrubbing writes little. A gesture under way is not kept: its beginning is. A failure
 * is told once, until keeping works again.
 */
export function autosave(store: WorkbenchStore, shelf: Shelf, options: AutosaveOptions): Autosave {
  const { slot, now = Date.now, studyAfterMs = 100, viewAfterMs = 200 } = options;
  let toldOfFailure = false;
  let writing: Promise<void> = Promise.resolve();

  async function attempt(write: () => Promise<void>): Promise<void> {
    try {
      await write();
      toldOfFailure = false;
      if (store.getState().keptProblem !== null) store.setState({ keptProblem: null });
    } catch (error) {
      const problem = problemOf(error);
      store.setState({ keptProblem: problem });
      if (!toldOfFailure) store.getState().setNotice(failureNotice(problem));
      toldOfFailure = true;
    }
  }

  function put(write: () => Promise<void>): void {
    writing = writing.then(() => attempt(write));
  }

  const study = later(studyAfterMs, () => {
    const kept = keptStudy(store.getState(), slot(), now());
    if (kept) put(() => shelf.putStudy(kept));
  });
  const view = later(viewAfterMs, () => {
    const kept = { slot: slot(), view: store.getState().view };
    put(() => shelf.putView(kept));
  });

  const unsubscribe = store.subscribe((after, before) => {
    if (studyChanged(after, before)) study.soon();
    if (after.view !== before.view) view.soon();
  });

  return {
    flush: () => {
      study.now();
      view.now();
      return writing;
    },
    stop: () => {
      unsubscribe();
      study.cancel();
      view.cancel();
    },
  };
}

function studyChanged(after: Workbench, before: Workbench): boolean {
  return (
    (after.beforePreview ?? after.study) !== (before.beforePreview ?? before.study) ||
    after.history !== before.history ||
    after.documentId !== before.documentId ||
    after.fileName !== before.fileName ||
    after.savedStudy !== before.savedStudy ||
    after.readOnly !== before.readOnly
  );
}

/** The workbench as it is kept; null where there is nothing, or where another tab keeps it. */
export function keptStudy(state: Workbench, slot: string, keptAt: number): KeptStudy | null {
  const { documentId, history, lastEdit, fileName, fileHandle, savedStudy, importWarnings } = state;
  const study = state.beforePreview ?? state.study;
  if (!study || state.readOnly) return null;
  const tail: History = tailOf(history, historyKept);
  return {
    slot,
    keptAt,
    documentId,
    study,
    history: tail,
    lastEdit,
    fileName,
    fileHandle,
    savedStudy,
    importWarnings,
  };
}

function problemOf(error: unknown): string {
  const { name, message } = error instanceof Error ? error : { name: '', message: String(error) };
  if (name === 'QuotaExceededError') return 'its storage is full';
  if (name === 'SecurityError' || name === 'InvalidStateError') return 'its storage is closed to this page';
  return message;
}

function failureNotice(problem: string): Notice {
  return {
    severity: 'warning',
    title: `The study could not be kept in this browser (${problem}). Work goes on; save it to a file.`,
    findings: [],
    offer: 'save',
  };
}
