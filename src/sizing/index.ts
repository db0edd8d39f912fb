export {
  type EnvelopeRequest,
  type ImpedanceEnvelope,
  impedanceEnvelope,
} from './envelope/impedanceEnvelope.ts';
export { type KvarAtBus, kvarAtBus } from './kvarAtBus.ts';
export { type KvarInput, type KvarResult, kvarForTarget, tanPhi } from './kvarForTarget.ts';
export { type QuickSite, quickSite } from './quickSite.ts';
export { defaultFamilies, MOST_STATES, type StateFamilies } from './states/StateFamilies.ts';
export type { StudyState } from './states/StudyState.ts';
export { type StateSet, statesOf, studyInState } from './states/statesOf.ts';
export type { Dimension, DimensionKind, Point } from './tolerance/Dimension.ts';
export { PointJudge } from './tolerance/PointJudge.ts';
export { pointWords } from './tolerance/pointWords.ts';
export { searchTolerances, type ToleranceSearch } from './tolerance/searchTolerances.ts';
export { studyAtPoint } from './tolerance/studyAtPoint.ts';
export { defaultTolerances, type ToleranceSettings } from './tolerance/ToleranceSettings.ts';
export { toleranceSpace } from './tolerance/toleranceSpace.ts';
export type { Governing, Unsolved, WorstProgress, WorstResult, WorstVerdict } from './worst/WorstVerdict.ts';
export { type WorstOptions, worstOver } from './worst/worstOver.ts';
