import {
  type CaseSolution,
  type DrivingPoints,
  drivingPoints,
  scanImpedance,
  solveCase,
} from '../engine/index.ts';
import type { Bank, CaseChange, Filter, Study, StudyCase } from '../study/index.ts';
import { casesOf, isOn, isSeries, studyInCase } from '../study/index.ts';
import { type CheckContext, defaultPresence, type PresenceThresholds } from './CheckContext.ts';
import { inflowAt } from './inflow.ts';
import { pccBusesOf } from './pcc.ts';
import { SolvedCase } from './SolvedCase.ts';

export interface JudgeOptions {
  /** The same case with every bank and filter out, where the caller has solved it already. */
  withoutCorrection?: CaseSolution;
  /** Solutions of other cases already at hand: they tell the largest case's power. */
  otherCases?: readonly CaseSolution[];
  /** False leaves the screening rules out, most of which scan anew, for a first fast answer. */
  screening?: boolean;
  presence?: PresenceThresholds;
  /** The study with its parts as they are at a tolerance point, where that is not the study itself. */
  actual?: Study;
  /** Actual over rated frequency, 1 when absent; the given solution is at the same. */
  frequencyFactor?: number;
  /** False leaves out what the same case gives without the correction: half the work of a search. */
  comparison?: boolean;
}

function correctionIds(study: Study): Set<string> {
  return new Set(
    study.elements
      .filter((part) => (part.kind === 'bank' || part.kind === 'filter') && isOn(part))
      .map((part) => part.id),
  );
}

/**
 * What the checks of one solved case read: the study in that case, its solution, and further solutions and
 * impedances computed when first asked for.
 */
export function caseContext(base: Study, solution: CaseSolution, options: JudgeOptions): CheckContext {
  const caseId = solution.caseId;
  const study = studyInCase(base, caseId);
  const real = options.actual ?? base;
  const frequencyFactor = options.frequencyFactor ?? 1;
  const actualStudy = studyInCase(real, caseId);
  const realParts = new Map(actualStudy.elements.map((part) => [part.id, part]));
  const found = casesOf(base).find(({ id }) => id === caseId);
  const correction = correctionIds(study);
  const solved = new SolvedCase(solution);
  let network: DrivingPoints | undefined;
  let coupled: DrivingPoints | undefined;
  let without: SolvedCase | null | undefined =
    correction.size === 0 || options.comparison === false ? null : undefined;
  const solveWithout = (ids: ReadonlySet<string>): CaseSolution =>
    solveCase(real, caseId, { without: ids, frequencyFactor });
  return {
    study,
    actualStudy,
    actual: <T extends Bank | Filter>(part: T): T => (realParts.get(part.id) as T | undefined) ?? part,
    frequencyFactor,
    base,
    caseId,
    role: found?.role ?? 'load',
    hoursPerDay: found?.hoursPerDay ?? 24,
    solved,
    pccBuses: pccBusesOf(study),
    correction,
    presence: options.presence ?? defaultPresence,
    without() {
      if (without === undefined) {
        const bare = options.withoutCorrection ?? solveWithout(correction);
        without = bare.converged ? new SolvedCase(bare) : null;
      }
      return without;
    },
    solveWithout,
    solveBackground: (ids) => solveCase(silenced(real, caseId), caseId, { without: ids, frequencyFactor }),
    networkOhm(bus) {
      network ??= drivingPoints(real, caseId, 1, { without: consumers(study), frequencyFactor });
      return pointAt(study, network, bus);
    },
    coupledOhm(bus) {
      coupled ??= drivingPoints(couplersClosed(real, caseId), caseId, 1, {
        without: correction,
        frequencyFactor,
      });
      return pointAt(study, coupled, bus);
    },
    scan(span, ids = new Set(), steps = new Map()) {
      const asked = steps.size === 0 ? real : withSteps(real, caseId, steps);
      return scanImpedance(asked, caseId, span, { without: ids, frequencyFactor });
    },
    largestKW: (bus) => largestKW(base, solution, bus, options.otherCases),
  };
}

/** The study with some banks' steps replaced, in one case, by a single step of the kvar given. */
function withSteps(study: Study, caseId: string, steps: ReadonlyMap<string, number>): Study {
  return withChanges(
    study,
    caseId,
    [...steps].map(([element, kvar]) => ({ element, set: { steps: [{ kvar }] } })),
  );
}

/** The study with every converter's spectrum emptied in one case. */
function silenced(study: Study, caseId: string): Study {
  const converters = study.elements.filter((part) => part.kind === 'converter');
  return withChanges(
    study,
    caseId,
    converters.map(({ id }) => ({ element: id, set: { spectrum: [] } })),
  );
}

/** All that hangs on the network without feeding it. */
function consumers(study: Study): Set<string> {
  return new Set(
    study.elements
      .filter((part) => !isSeries(part) && part.kind !== 'supply' && part.kind !== 'generator')
      .map(({ id }) => id),
  );
}

function couplersClosed(study: Study, caseId: string): Study {
  const couplers = study.elements.filter((part) => part.kind === 'coupler');
  return withChanges(
    study,
    caseId,
    couplers.map(({ id }) => ({ element: id, set: { on: true } })),
  );
}

function pointAt(study: Study, points: DrivingPoints, bus: string): { re: number; im: number } | null {
  const index = study.buses.findIndex(({ id }) => id === bus);
  return points.present[index] === 1 ? { re: points.re[index] ?? 0, im: points.im[index] ?? 0 } : null;
}

function withChanges(study: Study, caseId: string, changes: readonly CaseChange[]): Study {
  const cases: StudyCase[] = casesOf(study).map((item) =>
    item.id === caseId ? { ...item, changes: [...item.changes, ...changes] } : item,
  );
  return { ...study, cases };
}

const largestKnown = new WeakMap<Study, Map<string, number | null>>();

/**
 * Over every case of the study, kW into the site at the PCC; null for a study with one case. Remembered per
 * study, which is never mutated, so that judging all its cases solves each at most once more.
 */
function largestKW(
  study: Study,
  solution: CaseSolution,
  bus: string,
  given: readonly CaseSolution[] = [],
): number | null {
  const cases = casesOf(study);
  if (cases.length < 2) return null;
  const known = largestKnown.get(study) ?? new Map<string, number | null>();
  largestKnown.set(study, known);
  const found = known.get(bus);
  if (found !== undefined) return found;
  const solutions = new Map([...given, solution].map((item) => [item.caseId, item]));
  const powers = cases.flatMap(({ id }) => {
    const solved = solutions.get(id) ?? solveCase(study, id);
    const inflow = solved.converged ? inflowAt(studyInCase(study, id), new SolvedCase(solved), bus) : null;
    return inflow ? [inflow.kW] : [];
  });
  const largest = powers.length > 0 ? Math.max(...powers) : null;
  known.set(bus, largest);
  return largest;
}
