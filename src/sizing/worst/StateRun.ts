import { judgeCase, judgeDuties, type Verdict } from '../../checks/index.ts';
import { type CaseSolution, solveCase } from '../../engine/index.ts';
import type { Study } from '../../study/index.ts';
import type { StudyState } from '../states/StudyState.ts';
import { studyInState } from '../states/statesOf.ts';
import { type Dimension, type Point, ratedPoint } from '../tolerance/Dimension.ts';
import { PointJudge } from '../tolerance/PointJudge.ts';
import { pointWords } from '../tolerance/pointWords.ts';
import { studyAtPoint } from '../tolerance/studyAtPoint.ts';
import type { ToleranceSettings } from '../tolerance/ToleranceSettings.ts';
import { toleranceSpace } from '../tolerance/toleranceSpace.ts';
import type { Governing, Unsolved } from './WorstVerdict.ts';

/** One operating state under way: its rated solution, and its tolerance space judged where it was asked. */
export class StateRun {
  readonly state: StudyState;
  readonly study: Study;
  readonly solution: CaseSolution;
  /** Null where the state has no solution, or tolerances are left out. */
  readonly judge: PointJudge | null;
  private readonly dimensions: readonly Dimension[];
  private readonly otherCases: readonly CaseSolution[];

  /** `tolerances` null judges the state at its rated values alone. */
  constructor(
    study: Study,
    state: StudyState,
    tolerances: ToleranceSettings | null,
    cases: readonly CaseSolution[],
  ) {
    this.state = state;
    this.study = studyInState(study, state);
    this.otherCases = cases;
    this.solution = cases.find(({ caseId }) => caseId === state.id) ?? solveCase(this.study, state.id);
    this.dimensions = tolerances ? toleranceSpace(this.study, state.id, tolerances) : [];
    this.judge =
      this.solution.converged && this.dimensions.length > 0
        ? new PointJudge(this.study, this.solution, this.dimensions, cases)
        : null;
  }

  /** All verdicts but the screening rows, with the parts at their rated values. */
  rated(): Verdict[] {
    return judgeCase(this.study, this.solution, { screening: false, otherCases: this.otherCases });
  }

  /** The deciding verdicts at a tolerance point, in words. */
  worded(point: Point): Verdict[] {
    const { id } = this.state;
    const { study: actual, frequencyFactor } = studyAtPoint(this.study, id, this.dimensions, point);
    const solution = solveCase(actual, id, { frequencyFactor });
    return judgeDuties(this.study, solution, { actual, frequencyFactor, otherCases: this.otherCases });
  }

  governing(point: Point = ratedPoint(this.dimensions)): Governing {
    return {
      stateId: this.state.id,
      stateName: this.state.name,
      caseId: this.state.from,
      point: pointWords(this.dimensions, point),
      rated: point.every((factor) => factor === 1),
    };
  }

  unsolved(): Unsolved[] {
    const { id: stateId, name: stateName } = this.state;
    const rated = this.solution.converged
      ? []
      : [
          {
            stateId,
            stateName,
            point: pointWords([], ratedPoint([])),
            error: this.solution.error ?? 'no solution',
          },
        ];
    const atPoints = (this.judge?.unsolved ?? []).map(({ point, error }) => ({
      stateId,
      stateName,
      point: pointWords(this.dimensions, point),
      error,
    }));
    return [...rated, ...atPoints];
  }
}
