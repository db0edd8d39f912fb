import type { CaseSolution } from '../engine/index.ts';
import { solveCase } from '../engine/index.ts';
import type { Study } from '../study/index.ts';
import { judgeNumbers, probeOrder, resultsOf, scanPair, solveNumbers } from './compute.ts';
import type { Job, JobKind, Replies, ReplyMessage, RequestMessage } from './protocol.ts';
import { createWarmUp } from './warmUp.ts';

/** What the worker remembers between messages, and what it answers to each. */
export interface Session {
  /** Never throws: a job that does is answered with its reason. */
  handle(message: RequestMessage): ReplyMessage;
}

export function createSession(): Session {
  let held: { revision: number; study: Study } | null = null;
  /** The case solved last, copied before its arrays leave: its verdicts are usually asked for next. */
  let solved: { revision: number; solution: CaseSolution } | null = null;
  const warmUp = createWarmUp();

  function studyAt(revision: number): Study {
    if (held?.revision !== revision) {
      throw new RangeError(`revision ${revision} is not at hand; held is ${held?.revision ?? 'none'}`);
    }
    return held.study;
  }

  function solutionOf(study: Study, revision: number, caseId: string): CaseSolution {
    if (solved?.revision === revision && solved.solution.caseId === caseId) return solved.solution;
    return solveCase(study, caseId);
  }

  function answer(job: Job, revision: number): Replies[JobKind] {
    if (job.kind === 'warm') return warmUp();
    const study = studyAt(revision);
    switch (job.kind) {
      case 'solve': {
        const numbers = solveNumbers(study, job.caseId, job.focusBus);
        solved = { revision, solution: structuredClone(numbers.solution) };
        return numbers;
      }
      case 'scan':
        return scanPair(study, job.caseId, job.focusBus);
      case 'probe':
        return probeOrder(study, job.caseId, job.order);
      case 'judge':
        return judgeNumbers(study, solutionOf(study, revision, job.caseId));
      case 'results':
        return resultsOf(study);
    }
  }

  return {
    handle({ id, revision, study, job }) {
      if (study) held = { revision, study };
      try {
        return { id, reply: answer(job, revision) };
      } catch (error) {
        return { id, failed: error instanceof Error ? error.message : String(error) };
      }
    },
  };
}
