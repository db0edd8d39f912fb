import { useStore } from 'zustand';
import { type Computation, createComputation, spawnWorker } from '../worker/index.ts';
import { browserFiles } from './browserFiles.ts';
import { createWorkbench } from './createWorkbench.ts';
import { followStudy } from './followStudy.ts';
import type { Workbench } from './types.ts';

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

let started: Promise<void> | null = null;

/** Brings the page's workbench to life; further calls change nothing. */
export function startWorkbench(): Promise<void> {
  started ??= start();
  return started;
}

async function start(): Promise<void> {
  const computing = pageComputation();
  followStudy(workbench, computing, { frame: (work) => requestAnimationFrame(work) });
  void computing.warm();
}
