import type { Verdict } from '../checks/index.ts';
import { type CaseSolution, solveCase } from '../engine/index.ts';
import {
  type ImpedanceEnvelope,
  impedanceEnvelope,
  statesOf,
  type WorstProgress,
  type WorstResult,
  worstOver,
} from '../sizing/index.ts';
import { baseStateId, casesOf, type Study, withBaseState } from '../study/index.ts';
import { judgeNumbers, probeOrder, resultsOf, scanPair, solveNumbers } from './compute.ts';
import type {
  CaseDossier,
  CaseNumbers,
  EnvelopeSlice,
  Job,
  JobKind,
  Replies,
  ReplyMessage,
  RequestMessage,
  WorstQuestion,
  WorstSlice,
} from './protocol.ts';
import { SlicedRun } from './SlicedRun.ts';
import { railAxis } from './scanAxis.ts';
import { createWarmUp } from './warmUp.ts';

/** What the worker remembers between messages, and what it answers to each. */
export interface Session {
  /** Never throws: a job that does is answered with its reason. */
  handle(message: RequestMessage): ReplyMessage;
}

/** The study of one revision with the solutions of its cases, each solved once. */
interface Held {
  revision: number;
  study: Study;
  solutions: Map<string, CaseSolution>;
  without: Map<string, CaseSolution>;
  worst?: SlicedRun<WorstProgress, WorstResult>;
  envelope?: SlicedRun<unknown, ImpedanceEnvelope | null>;
}

export function createSession(): Session {
  let held: Held | null = null;
  const warmUp = createWarmUp();

  function heldAt(revision: number): Held {
    if (held?.revision === revision) return held;
    throw new RangeError(`revision ${revision} is not at hand; held is ${held?.revision ?? 'none'}`);
  }

  function answer(job: Job, revision: number): Replies[JobKind] {
    if (job.kind === 'warm') return warmUp();
    const now = heldAt(revision);
    switch (job.kind) {
      case 'solve':
        return solveAndKeep(now, job.caseId);
      case 'scan':
        return scanPair(now.study, job.caseId, job.focusBus);
      case 'probe':
        return probeOrder(now.study, job.caseId, job.order);
      case 'judge':
        return judgeKept(now, job.caseId, job.screening);
      case 'dossier':
        return dossierOf(now, job.caseId, job.buses);
      case 'envelope':
        return envelopeSlice(now, job.bus, job.question);
      case 'worst':
        return worstSlice(now, job.question);
      case 'results':
        return resultsOf(now.study);
    }
  }

  return {
    handle({ id, revision, study, job }) {
      if (study) held = { revision, study, solutions: new Map(), without: new Map() };
      try {
        return { id, reply: answer(job, revision) };
      } catch (error) {
        return { id, failed: error instanceof Error ? error.message : String(error) };
      }
    },
  };
}

/** The numbers are copied before their arrays leave: other answers rest on them. */
function solveAndKeep(held: Held, caseId: string): CaseNumbers {
  const numbers = solveNumbers(held.study, caseId);
  held.solutions.set(caseId, structuredClone(numbers.solution));
  held.without.set(caseId, structuredClone(numbers.without));
  return numbers;
}

function keptSolution({ study, solutions }: Held, caseId: string): CaseSolution {
  const known = solutions.get(caseId) ?? solveCase(study, caseId);
  solutions.set(caseId, known);
  return known;
}

function judgeKept(held: Held, caseId: string, screening: boolean): Verdict[] {
  const otherCases = casesOf(held.study).map(({ id }) => keptSolution(held, id));
  const withoutCorrection = held.without.get(caseId);
  return judgeNumbers(held.study, keptSolution(held, caseId), {
    otherCases,
    screening,
    ...(withoutCorrection ? { withoutCorrection } : {}),
  });
}

/** The base study is no case of its own; for a dossier it stands as one. */
function dossierOf(held: Held, caseId: string, buses: readonly string[]): CaseDossier {
  const at = caseId === baseStateId ? { ...held, study: withBaseState(held.study) } : held;
  const { solution, without } = solveAndKeep(at, caseId);
  const scans = buses.map((bus) => scanPair(at.study, caseId, bus));
  return { caseId, solution, without, scans, verdicts: judgeKept(at, caseId, true) };
}

/** Goes on with the run under way, or begins another where a different question is asked. */
function worstSlice(held: Held, question: WorstQuestion): WorstSlice {
  const key = JSON.stringify(question);
  if (held.worst?.key !== key) {
    const { states, count } = statesOf(held.study, question.families);
    if (!states) return { state: 'too-many', count };
    const { tolerances } = question;
    held.worst = new SlicedRun(key, worstOver(held.study, { states, tolerances }));
  }
  return held.worst.slice();
}

/** No band where the states are too many to be solved. */
function envelopeSlice(held: Held, bus: string, question: WorstQuestion): EnvelopeSlice {
  const key = JSON.stringify([bus, question]);
  if (held.envelope?.key !== key) {
    const { states } = statesOf(held.study, question.families);
    if (!states) return { state: 'done', result: null };
    const { tolerances } = question;
    const frequencyHz = railAxis(held.study);
    held.envelope = new SlicedRun(
      key,
      impedanceEnvelope(held.study, { bus, states, tolerances, frequencyHz }),
    );
  }
  const slice = held.envelope.slice();
  if (slice.state === 'running') return { state: 'running' };
  // Its arrays leave with the answer: asked again, it is computed again.
  delete held.envelope;
  return slice;
}
