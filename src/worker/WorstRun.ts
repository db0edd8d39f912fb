import { statesOf, type WorstProgress, type WorstResult, worstOver } from '../sizing/index.ts';
import type { Study } from '../study/index.ts';
import type { WorstQuestion, WorstSlice } from './protocol.ts';

/** A slice ends with the state under way when this much time has passed. */
const SLICE_MS = 30;

/** A worst-case run on one study, taken up slice by slice, so that other requests go first in between. */
export class WorstRun {
  private readonly key: string;
  private readonly count: number;
  private steps: Generator<WorstProgress, WorstResult> | null = null;
  private progress: WorstProgress;
  private result: WorstResult | null = null;

  constructor(study: Study, question: WorstQuestion) {
    this.key = JSON.stringify(question);
    const { states, count } = statesOf(study, question.families);
    this.count = count;
    this.progress = { done: 0, total: count, points: 0 };
    if (states) this.steps = worstOver(study, { states, tolerances: question.tolerances });
  }

  /** Whether this run is the one that answers the question. */
  answers(question: WorstQuestion): boolean {
    return this.key === JSON.stringify(question);
  }

  slice(): WorstSlice {
    if (this.result) return { state: 'done', result: this.result };
    if (!this.steps) return { state: 'too-many', count: this.count };
    const end = performance.now() + SLICE_MS;
    while (performance.now() < end) {
      const next = this.steps.next();
      if (next.done) {
        this.result = next.value;
        return { state: 'done', result: next.value };
      }
      this.progress = next.value;
    }
    return { state: 'running', progress: this.progress };
  }
}
