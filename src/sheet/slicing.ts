/** Keeps the page alive during long work on the main thread: tasks of a bounded length, cancel, progress. */

/** A task ends when it has run this long; one unit of work may overrun it. */
const TASK_MS = 24;

function nextTask(): Promise<void> {
  return new Promise((resolve) => {
    const { port1, port2 } = new MessageChannel();
    port1.onmessage = () => {
      port1.close();
      resolve();
    };
    port2.postMessage(null);
  });
}

export interface Slicing {
  /** Begins a new task if the current one has run long enough. Throws the signal's reason once it is aborted. */
  pause(): Promise<void>;
  /** Begins a new task in any case. */
  turn(): Promise<void>;
}

export function slicing(signal: AbortSignal | undefined): Slicing {
  let begun = performance.now();
  const turn = async (): Promise<void> => {
    await nextTask();
    signal?.throwIfAborted();
    begun = performance.now();
  };
  return {
    turn,
    pause: async () => {
      if (performance.now() - begun >= TASK_MS) await turn();
    },
  };
}
