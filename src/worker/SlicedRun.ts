/** A slice ends with the step under way when this much time has passed. */
const SLICE_MS = 30;

/** Where a run stands after a slice. */
export type RunSlice<P, R> = { state: 'running'; progress: P } | { state: 'done'; result: R };

/** A long computation taken up slice by slice, so that other requests go first in between. */
export class SlicedRun<P, R> {
  /** What the run answers; another key is another run. */
  readonly key: string;
  private readonly steps: Generator<P, R>;
  private ended: { result: R } | null = null;

  constructor(key: string, steps: Generator<P, R>) {
    this.key = key;
    this.steps = steps;
  }

  /** Goes on for a slice; at least one step is made. */
  slice(): RunSlice<P, R> {
    if (this.ended) return { state: 'done', result: this.ended.result };
    const end = performance.now() + SLICE_MS;
    for (;;) {
      const next = this.steps.next();
      if (next.done) {
        this.ended = { result: next.value };
        return { state: 'done', result: next.value };
      }
      if (performance.now() >= end) return { state: 'running', progress: next.value };
    }
  }
}
