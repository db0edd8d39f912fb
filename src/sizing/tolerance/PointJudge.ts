import { DutyMargins, type PresentOrders, presentAtCorrection } from '../../checks/index.ts';
import { type CaseSolution, scanImpedance, solveCase } from '../../engine/index.ts';
import type { Study } from '../../study/index.ts';
import { type Dimension, type Point, ratedPoint } from './Dimension.ts';
import { studyAtPoint } from './studyAtPoint.ts';

/** Driving-point admittance at one order, siemens per phase. */
export interface Admittance {
  conductance: number;
  susceptance: number;
}

/**
 * One case judged at any point of its tolerance space. Keeps, per measure, the smallest margin met so far and
 * where: whatever a search is looking for, every point it visits counts for every measure.
 */
export class PointJudge {
  readonly dimensions: readonly Dimension[];
  readonly duties: DutyMargins;
  /** Smallest margin so far, by measure. */
  readonly worst: Float64Array;
  /** Where, by measure. */
  readonly worstAt: Point[];
  /** Susceptance over the axes at each busbar and order where a peak can stand: the ridges the worst lies on. */
  ridges: readonly Float64Array[] = [];
  /** Points solved. */
  visited = 0;
  /** Points at which the case has no solution: each is a failure of its own. */
  readonly unsolved: { point: Point; error: string }[] = [];
  private readonly study: Study;
  private readonly caseId: string;
  private readonly rated: CaseSolution;
  private readonly known = new Map<string, Float64Array>();

  /** `rated`: solution of the case at its rated point. RangeError when that has not converged. */
  constructor(
    study: Study,
    rated: CaseSolution,
    dimensions: readonly Dimension[],
    otherCases: readonly CaseSolution[] = [],
  ) {
    this.study = study;
    this.caseId = rated.caseId;
    this.rated = rated;
    this.dimensions = dimensions;
    this.duties = new DutyMargins(study, rated, otherCases);
    const count = this.duties.measures.length;
    this.worst = new Float64Array(count).fill(Number.POSITIVE_INFINITY);
    this.worstAt = Array.from({ length: count }, () => ratedPoint(dimensions));
    this.judge(ratedPoint(dimensions));
  }

  /** The orders whose meeting with a peak is looked for. */
  present(): PresentOrders[] {
    return presentAtCorrection(this.study, this.rated);
  }

  /** Margins at a point, by measure; points met before are not solved again. */
  judge(point: Point): Float64Array {
    const key = point.join(' ');
    const found = this.known.get(key);
    if (found) return found;
    const { study, frequencyFactor } = studyAtPoint(this.study, this.caseId, this.dimensions, point);
    const solution = isRated(point) ? this.rated : solveCase(study, this.caseId, { frequencyFactor });
    this.visited++;
    if (!this.duties.read(solution, study, frequencyFactor))
      this.unsolved.push({ point, error: solution.error ?? 'no solution' });
    const margins = this.duties.margins.slice();
    this.known.set(key, margins);
    for (let k = 0; k < margins.length; k++)
      if (margins[k]! < this.worst[k]!) {
        this.worst[k] = margins[k]!;
        this.worstAt[k] = point;
      }
    return margins;
  }

  /** 1/Z at a busbar for rising orders of the actual fundamental; null where there is no path. */
  admittances(point: Point, { bus, sequence, orders }: PresentOrders): Admittance[] | null {
    const { study, frequencyFactor } = studyAtPoint(this.study, this.caseId, this.dimensions, point);
    const frequencyHz = Float64Array.from(orders, (order) => order * study.frequencyHz);
    const { re, im, error } = scanImpedance(
      study,
      this.caseId,
      { bus, sequence, frequencyHz },
      { frequencyFactor },
    );
    if (error !== undefined) return null;
    return orders.map((_, k) => {
      const square = re[k]! * re[k]! + im[k]! * im[k]!;
      return { conductance: re[k]! / square, susceptance: -im[k]! / square };
    });
  }
}

const isRated = (point: Point): boolean => point.every((factor) => factor === 1);
