import { useStore } from 'zustand';
import { type Computation, createComputation, spawnWorker } from '../worker/index.ts';
import type { KeptDocument } from './archive.ts';
import { autosave } from './autosave.ts';
import { browserArchive } from './browserArchive.ts';
import { browserFiles } from './browserFiles.ts';
import { browserShelf } from './browserShelf.ts';
import { createWorkbench } from './createWorkbench.ts';
import { browserDatabase } from './database.ts';
import { followStudy } from './followStudy.ts';
import { freshId } from './freshId.ts';
import { keepRevisions, type RevisionKeeper } from './keepRevisions.ts';
import { openRecent as openRecentOf } from './openRecent.ts';
import { restore } from './restore.ts';
import { tabSlot } from './tabSlot.ts';
import type { Workbench } from './types.ts';
import { type TabWatch, watchTabs } from './watchTabs.ts';

/** The page's one workbench. Outside components use `workbench.getState()`. */
export const workbench = createWorkbench(browserFiles);

/** Selects from the workbench; the component renders again only when what it selects changes. */
export function useWorkbench<T>(select: (state: Workbench) => T): T {
  return useStore(workbench, select);
}

const database = browserDatabase();
const shelf = browserShelf(database);

/** Former states and recent studies of this browser. */
export const archive = browserArchive(database);

let keeper: RevisionKeeper | null = null;
let tabs: TabWatch | null = null;

/** Everything done so far is in the archive when this resolves. */
export async function archiveNow(): Promise<void> {
  await keeper?.flush();
}

/** Keeps the present state for good under a name. */
export async function keepStateAs(name: string): Promise<void> {
  await keeper?.keepAs(name);
}

/** Opens a study of the recent ones. */
export async function openRecent(document: KeptDocument): Promise<void> {
  await openRecentOf(workbench, archive, shelf, document);
}

/** Goes on here with the study another tab works on. */
export async function workHere(): Promise<void> {
  await tabs?.takeOver();
}

let computation: Computation | null = null;

/** The page's computation, for jobs the store does not do itself; it starts with startWorkbench. */
export function pageComputation(): Computation {
  computation ??= createComputation({
    spawn: spawnWorker,
    report: (workerMessage) =>
      workbench.setState((state) => ({ status: { ...state.status, workerMessage } })),
  });
  return computation;
}

let started: Promise<{ restored: boolean }> | null = null;

/**
 * Brings the page's workbench to life: computation (warmed while nothing is asked of it), what was kept of
 * the last session, autosave, watch for other tabs. Further calls change nothing. Resolves when the study
 * kept, if any, is on the table. `restore: false` begins with an empty one.
 */
export function startWorkbench(options: { restore?: boolean } = {}): Promise<{ restored: boolean }> {
  started ??= start(options.restore ?? true);
  return started;
}

async function start(restoring: boolean): Promise<{ restored: boolean }> {
  const computing = pageComputation();
  followStudy(workbench, computing, { frame: (work) => requestAnimationFrame(work) });
  void computing.warm();
  const { slot, takeFresh } = tabSlot();
  const { restored } = restoring ? await restore(workbench, shelf, slot()) : { restored: false };
  const { flush } = autosave(workbench, shelf, { slot });
  const revisions = keepRevisions(workbench, archive);
  // The study that is left stays on the shelf with its undo, for when it is gone on with.
  workbench.subscribe((after, before) => {
    if (after.documentId === before.documentId || after.openedRevision === before.openedRevision) return;
    if ((before.study?.elements.length ?? 0) > 0) takeFresh();
  });
  keeper = revisions;
  const flushAll = () => void Promise.all([flush(), revisions.flush()]);
  addEventListener('pagehide', flushAll);
  document.addEventListener('visibilitychange', () => {
    if (document.visibilityState === 'hidden') flushAll();
  });
  if (typeof BroadcastChannel !== 'undefined') {
    const watch = watchTabs(workbench, new BroadcastChannel('varwright'), {
      tab: freshId(),
      slot,
      takeFreshSlot: takeFresh,
      shelf,
    });
    tabs = watch;
    addEventListener('pagehide', watch.leave);
    window.addEventListener('pageshow', ({ persisted }) => {
      if (persisted) watch.greet();
    });
  }
  return { restored };
}
