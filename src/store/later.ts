/** One timer that calls once however often it is asked, and not later than the first asking demands. */
export function later(delayMs: number, work: () => void) {
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
