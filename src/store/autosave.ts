import type { WorkbenchStore } from './createWorkbench.ts';
import { type History, tailOf } from './history.ts';
import type { KeptStudy, Shelf } from './shelf.ts';
import type { Workbench } from './types.ts';

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
    } catch (error) {
      if (!toldOfFailure) store.getState().setNotice(failureNotice(error));
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

/** One timer that calls once however often it is asked, and not later than the first asking demands. */
function later(delayMs: number, work: () => void) {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const cancel = (): void => {
    clearTimeout(timer);
    timer = undefined;
  };
  const run = (): void => {
    cancel();
    work();
  };
  return {
    soon: () => {
      timer ??= setTimeout(run, delayMs);
    },
    now: () => {
      if (timer !== undefined) run();
    },
    cancel,
  };
}

function studyChanged(after: Workbench, before: Workbench): boolean {
  return (
    (after.beforePreview ?? after.study) !== (before.beforePreview ?? before.study) ||
    after.history !== before.history ||
    after.documentId !== before.documentId ||
    after.fileName !== before.fileName ||
    after.savedStudy !== before.savedStudy
  );
}

function keptStudy(state: Workbench, slot: string, keptAt: number): KeptStudy | null {
  const { documentId, history, lastEdit, fileName, fileHandle, savedStudy, importWarnings } = state;
  const study = state.beforePreview ?? state.study;
  if (!study) return null;
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

function failureNotice(error: unknown) {
  const full = error instanceof Error && error.name === 'QuotaExceededError';
  const reason = full ? 'its storage is full' : error instanceof Error ? error.message : String(error);
  return {
    severity: 'warning' as const,
    title: `The study could not be kept in this browser (${reason}). Save it to a file.`,
    findings: [],
  };
}
