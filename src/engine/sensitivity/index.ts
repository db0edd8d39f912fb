export type { DrivingPointAt } from './DrivingPoint.ts';
export {
  type ImpedanceSensitivity,
  impedanceSensitivity,
  type ParameterSensitivity,
} from './impedanceSensitivity.ts';
export {
  type ResonanceElasticities,
  type ResonanceElasticity,
  resonanceElasticities,
} from './resonanceElasticities.ts';
