export { type CompileOptions, compileNetwork } from './network/compileNetwork.ts';
export type { Network } from './network/Network.ts';
export { busReading } from './results/busReading.ts';
export { caseResult } from './results/caseResult.ts';
export { correctionParts } from './results/correctionParts.ts';
export { currentPhasor, voltagePhasor } from './results/phasors.ts';
export { solveStudy } from './results/solveStudy.ts';
export { terminalReading } from './results/terminalReading.ts';
export { drivingPoints } from './scan/drivingPoints.ts';
export { type ScanSpan, scanImpedance } from './scan/scanImpedance.ts';
export {
  type DrivingPointAt,
  type ImpedanceSensitivity,
  impedanceSensitivity,
  type ParameterSensitivity,
  type ResonanceElasticities,
  type ResonanceElasticity,
  resonanceElasticities,
} from './sensitivity/index.ts';
export { type SolveOptions, solveCase } from './solve/solveCase.ts';
export type * from './types.ts';
