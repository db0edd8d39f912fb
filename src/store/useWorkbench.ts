import { useStore } from 'zustand';
import { type Computation, createComputation, spawnWorker } from '../worker/index.ts';
import { autosave } from './autosave.ts';
import { browserFiles } from './browserFiles.ts';
import { createWorkbench } from './createWorkbench.ts';
import { followStudy } from './followStudy.ts';
import { freshId } from './freshId.ts';
import { restore } from './restore.ts';
import { browserShelf } from './shelf.ts';
import { tabSlot } from './tabSlot.ts';
import type { Workbench } from './types.ts';
import { watchTabs } from './watchTabs.ts';

/** The page's one workbench. Outside components use `workbench.getState()`. */
export const workbench = createWorkbench(browserFiles);

/** Selects from the workbench; the component renders again only when what it selects changes. */
export function useWorkbench<T>(select: (state: Workbench) => T): T {
  return useStore(workbench, select);
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
  const shelf = browserShelf();
  const { restored } = restoring ? await restore(workbench, shelf, slot()) : { restored: false };
  const { flush } = autosave(workbench, shelf, { slot });
  addEventListener('pagehide', () => void flush());
  document.addEventListener('visibilitychange', () => {
    if (document.visibilityState === 'hidden') void flush();
  });
  if (typeof BroadcastChannel !== 'undefined') {
    watchTabs(workbench, new BroadcastChannel('varwright'), {
      tab: freshId(),
      slot,
      takeFreshSlot: takeFresh,
    });
  }
  return { restored };
}
