export { defaultPresence, type PresenceThresholds } from './CheckContext.ts';
export { type CapacitorDuty, capacitorDuty } from './capacitorDuty.ts';
export type { JudgeOptions } from './caseContext.ts';
export {
  type ComparedRow,
  type ComparedValue,
  comparedText,
  compareStates,
  passingInBoth,
} from './compare/compareStates.ts';
export type { StateNumbers } from './compare/stateQuantities.ts';
export { figure, ordinal } from './figure.ts';
export { type Inflow, inflowAt } from './inflow.ts';
export { type Check, judgeCase, judgeDuties, judgeStudy } from './judgeCase.ts';
export { capacitorCurrentLimit, capacitorVoltageLimit } from './limits/capacitorLimit.ts';
export {
  bandSetFor,
  type Choice,
  capacitorSetFor,
  currentSetFor,
  defaultPccSet,
  voltageSetFor,
} from './limits/choice.ts';
export { type CurrentRowLimits, currentLimits } from './limits/currentLimit.ts';
export { type LimitUse, limitChoices, limitSet, limitSets } from './limits/limitSets.ts';
export type { LimitSet } from './limits/types.ts';
export { type Limit, thdLimit, voltageLimit } from './limits/voltageLimit.ts';
export { margin, verdictWord, WATCH_MARGIN } from './margin.ts';
export { DutyMargins } from './margins/DutyMargins.ts';
export { type Measure, NOT_FORMED } from './margins/Gauge.ts';
export { type OrderRow, orderTable } from './orderTable.ts';
export { pccBusesOf } from './pcc.ts';
export { type PresentOrders, presentAtCorrection } from './presentAtCorrection.ts';
export { SolvedCase } from './SolvedCase.ts';
export { sourceText } from './source.ts';
export { type StepSums, stepSums } from './stepSums.ts';
export { sortByMargin, summarise, worstMargin } from './summarise.ts';
export { harmonicLoss, permissibleLoad } from './transformerHeating.ts';
export type * from './types.ts';
export { toResultsCheck } from './verdict.ts';
