import type { CaseSolution } from '../../engine/index.ts';
import { type Study, studyInCase } from '../../study/index.ts';
import { caseContext } from '../caseContext.ts';
import { SolvedCase } from '../SolvedCase.ts';
import { targetPF } from '../targetPF.ts';
import { busGauges } from './busGauge.ts';
import { capacitorGauges } from './capacitorGauge.ts';
import { type Gauge, type Measure, NOT_FORMED } from './Gauge.ts';
import { motorGauges } from './motorGauge.ts';
import { pccGauges, powerFactorGauges } from './pccGauge.ts';
import { reactorGauges } from './reactorGauge.ts';
import { seriesGauges } from './seriesGauge.ts';

/**
 * Margins of everything that decides over tolerances in one case, as numbers alone: compiled once from the
 * case at its rated point, then read from as many solutions of it as a search asks for. `judgeDuties` gives
 * the same margins with their words; a test holds both equal. Screening rows are left out, and so is what
 * cannot be judged for want of data.
 */
export class DutyMargins {
  readonly measures: readonly Measure[];
  /** By measure, of the solution read last; NOT_FORMED where there is none. */
  readonly margins: Float64Array;
  private readonly gauges: readonly Gauge[];
  private readonly caseId: string;

  /** `rated`: solution of the case at its rated point. RangeError when that has not converged. */
  constructor(study: Study, rated: CaseSolution, otherCases: readonly CaseSolution[] = []) {
    const context = caseContext(study, rated, { comparison: false, otherCases });
    this.caseId = rated.caseId;
    const judgedPF = new Set(targetPF(context).flatMap(({ key, margin }) => (margin === null ? [] : [key])));
    this.gauges = [
      ...powerFactorGauges(context, judgedPF),
      ...context.study.buses.flatMap((bus) => busGauges(context, bus)),
      ...pccGauges(context),
      ...context.study.elements.flatMap((part) =>
        part.kind === 'bank' || part.kind === 'filter' ? capacitorGauges(context, part) : [],
      ),
      ...reactorGauges(context),
      ...seriesGauges(context),
      ...motorGauges(context),
    ];
    this.measures = this.gauges.flatMap(({ measures }) => measures);
    this.margins = new Float64Array(this.measures.length);
  }

  /**
   * Reads the margins of the case solved at a point: `actual` is the study with its parts as they are there.
   * False, and every margin NOT_FORMED, where that solution has not converged.
   */
  read(solution: CaseSolution, actual: Study, frequencyFactor = 1): boolean {
    if (!solution.converged) {
      this.margins.fill(NOT_FORMED);
      return false;
    }
    const state = {
      solved: new SolvedCase(solution),
      actual: studyInCase(actual, this.caseId),
      frequencyFactor,
    };
    let at = 0;
    for (const gauge of this.gauges) {
      gauge.read(state, this.margins, at);
      at += gauge.measures.length;
    }
    return true;
  }
}
