import { scanImpedance } from '../../engine/index.ts';
import type { Study } from '../../study/index.ts';
import type { StudyState } from '../states/StudyState.ts';
import { studyInState } from '../states/statesOf.ts';
import { ratedPoint } from '../tolerance/Dimension.ts';
import { studyAtPoint } from '../tolerance/studyAtPoint.ts';
import type { ToleranceSettings } from '../tolerance/ToleranceSettings.ts';
import { toleranceSpace } from '../tolerance/toleranceSpace.ts';
import { Band } from './Band.ts';
import { peakPaths } from './peakPaths.ts';

/** Smallest and largest |Z| at a busbar over states and tolerances, ohm, positive sequence. */
export interface ImpedanceEnvelope {
  bus: string;
  frequencyHz: Float64Array;
  lowOhm: Float64Array;
  highOhm: Float64Array;
  states: number;
}

export interface EnvelopeRequest {
  bus: string;
  states: readonly StudyState[];
  /** Null takes every state at its rated values alone. */
  tolerances: ToleranceSettings | null;
  frequencyHz: Float64Array;
}

/** Steps from a peak's lowest order to its highest: close enough that three neighbours tell what lies between. */
const STEPS = 10;

/**
 * The band |Z| of a busbar lies in, state by state (a generator, to paint and stop in between). In each state
 * the parts are taken along the path on which every peak goes through all orders it can reach: the band is
 * drawn from those points, so that it shows where each peak can be; the worst of a check is searched elsewhere.
 * States in which the busbar has no source are passed over; null where it never has one.
 */
export function* impedanceEnvelope(
  study: Study,
  { bus, states, tolerances, frequencyHz }: EnvelopeRequest,
): Generator<{ done: number; total: number }, ImpedanceEnvelope | null> {
  const band = new Band(frequencyHz.length);
  let counted = 0;
  for (const [done, state] of states.entries()) {
    const inState = studyInState(study, state);
    const dimensions = tolerances ? toleranceSpace(inState, state.id, tolerances) : [];
    const rows = dimensions.length > 0 ? peakPaths(dimensions, STEPS) : [];
    let fed = true;
    for (const row of [[ratedPoint(dimensions)], ...rows]) {
      band.beginRow();
      for (const point of fed ? row : []) {
        const { study: actual, frequencyFactor } = studyAtPoint(inState, state.id, dimensions, point);
        const span = { bus, sequence: 'positive', frequencyHz } as const;
        const { re, im, error } = scanImpedance(actual, state.id, span, { frequencyFactor });
        fed = error === undefined;
        if (fed) band.add(re, im);
      }
    }
    if (fed) counted++;
    yield { done: done + 1, total: states.length };
  }
  const { lowOhm, highOhm } = band;
  return counted === 0 ? null : { bus, frequencyHz, lowOhm, highOhm, states: counted };
}
