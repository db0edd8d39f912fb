import type { WorkerLike } from './dispatcher.ts';

/** The module worker the page computes in. */
export function spawnWorker(): WorkerLike {
  return new Worker(new URL('./computation.worker.ts', import.meta.url), {
    type: 'module',
    name: 'computation',
  });
}
