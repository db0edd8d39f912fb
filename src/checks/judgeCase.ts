import { type CaseSolution, solveCase } from '../engine/index.ts';
import type { Study } from '../study/index.ts';
import { casesOf } from '../study/index.ts';
import { amplification } from './amplification.ts';
import { backgroundDuty } from './backgroundDuty.ts';
import { bankDuty } from './bankDuty.ts';
import { busOrder } from './busOrder.ts';
import { busThd } from './busThd.ts';
import { busVoltage } from './busVoltage.ts';
import type { CheckContext, PresenceThresholds } from './CheckContext.ts';
import { cableLoad } from './cableLoad.ts';
import { capacitorTemperature } from './capacitorTemperature.ts';
import { caseContext, type JudgeOptions } from './caseContext.ts';
import { controllerSetting } from './controllerSetting.ts';
import { deliveredKvar } from './deliveredKvar.ts';
import { discharge, reconnection } from './discharge.ts';
import { energising } from './energising.ts';
import { faultLevel } from './faultLevel.ts';
import { feeder } from './feeder.ts';
import { filterDuty } from './filterDuty.ts';
import { generatorLeading } from './generatorLeading.ts';
import { inrush } from './inrush.ts';
import { lightLoadRise } from './lightLoadRise.ts';
import { lostUnit } from './lostUnit.ts';
import { magnification } from './magnification.ts';
import { mixedBank } from './mixedBank.ts';
import { motorHvf } from './motorHvf.ts';
import { pccCurrent } from './pccCurrent.ts';
import { pfCeiling } from './pfCeiling.ts';
import { reactorDuty } from './reactorDuty.ts';
import { resonanceDistance } from './resonanceDistance.ts';
import { rippleSignal } from './rippleSignal.ts';
import { selfExcitation } from './selfExcitation.ts';
import { stepChange } from './stepChange.ts';
import { sortByMargin } from './summarise.ts';
import { targetPF } from './targetPF.ts';
import { transformerLoad } from './transformerLoad.ts';
import { tuningOrder } from './tuningOrder.ts';
import type { Verdict } from './types.ts';
import { unbalance } from './unbalance.ts';

/** A family of checks: every verdict it has to give in one case. */
export type Check = (context: CheckContext) => Verdict[];

/** Checks that read the solution, and at most a handful of impedances. */
const direct: readonly Check[] = [
  targetPF,
  deliveredKvar,
  busVoltage,
  lightLoadRise,
  stepChange,
  unbalance,
  busThd,
  busOrder,
  pccCurrent,
  bankDuty,
  reactorDuty,
  tuningOrder,
  backgroundDuty,
  filterDuty,
  transformerLoad,
  cableLoad,
  motorHvf,
  selfExcitation,
  inrush,
  feeder,
  discharge,
  reconnection,
  controllerSetting,
  generatorLeading,
  faultLevel,
  rippleSignal,
  lostUnit,
  capacitorTemperature,
];

/** Checks that decide over tolerances: all follow from the solution alone. */
const deciding: readonly Check[] = [
  targetPF,
  busVoltage,
  unbalance,
  busThd,
  busOrder,
  pccCurrent,
  bankDuty,
  reactorDuty,
  filterDuty,
  transformerLoad,
  cableLoad,
  motorHvf,
];

/** Screening rules, most of which scan the network again and again: the slower half. */
const scanning: readonly Check[] = [
  amplification,
  resonanceDistance,
  mixedBank,
  energising,
  pfCeiling,
  magnification,
];

/**
 * All verdicts of one solved case, sorted: fails, watch, unknown, pass, each by margin, ties by key.
 * Solves the case without the correction and scans impedances as needed. A case without a solution
 * gives no verdicts (study format §8). Pure: the same study and solution give the same list.
 */
export function judgeCase(study: Study, solution: CaseSolution, options: JudgeOptions = {}): Verdict[] {
  if (!solution.converged) return [];
  const context = caseContext(study, solution, options);
  const checks = options.screening === false ? direct : [...direct, ...scanning];
  return sortByMargin(checks.flatMap((check) => check(context)));
}

/**
 * The verdicts that decide over tolerances, unsorted, of a case solved at a tolerance point: `actual` and
 * `frequencyFactor` of the options say which. Words are only written when read, so margins come cheaply.
 */
export function judgeDuties(study: Study, solution: CaseSolution, options: JudgeOptions = {}): Verdict[] {
  if (!solution.converged) return [];
  const context = caseContext(study, solution, options);
  return deciding.flatMap((check) => check(context));
}

/** All verdicts of all cases, sorted as one list; cases are solved unless their solutions are given. */
export function judgeStudy(
  study: Study,
  options: { solutions?: readonly CaseSolution[]; screening?: boolean; presence?: PresenceThresholds } = {},
): Verdict[] {
  const given = new Map((options.solutions ?? []).map((solution) => [solution.caseId, solution]));
  const solutions = casesOf(study).map(({ id }) => given.get(id) ?? solveCase(study, id));
  const { screening, presence } = options;
  const shared = {
    ...(screening === undefined ? {} : { screening }),
    ...(presence === undefined ? {} : { presence }),
  };
  return sortByMargin(
    solutions.flatMap((solution) => judgeCase(study, solution, { ...shared, otherCases: solutions })),
  );
}
