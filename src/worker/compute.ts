import { type JudgeOptions, judgeCase, toResultsCheck, type Verdict } from '../checks/index.ts';
import {
  type CaseSolution,
  correctionParts,
  drivingPoints,
  type ResultsFile,
  scanImpedance,
  solveCase,
  solveStudy,
} from '../engine/index.ts';
import type { Study } from '../study/index.ts';
import type { CaseNumbers, Probe, ScanPair } from './protocol.ts';
import { mergeScans, peakAxis, scanAxis } from './scanAxis.ts';

/** The case as it stands and with all banks and filters out. */
export function solveNumbers(study: Study, caseId: string): CaseNumbers {
  return {
    solution: solveCase(study, caseId),
    without: solveCase(study, caseId, { without: correctionParts(study) }),
  };
}

/** Driving-point impedance of a busbar with and without the correction, both on one axis refined at the peaks. */
export function scanPair(study: Study, caseId: string, bus: string): ScanPair {
  const out = { without: correctionParts(study) };
  const request = { bus, sequence: 'positive', frequencyHz: scanAxis(study) } as const;
  const coarse = scanImpedance(study, caseId, request);
  const bare = scanImpedance(study, caseId, request, out);
  if (coarse.error !== undefined || bare.error !== undefined) return { bus, with: coarse, without: bare };
  const peaks = { ...request, frequencyHz: peakAxis(study, [...coarse.resonances, ...bare.resonances]) };
  if (peaks.frequencyHz.length === 0) return { bus, with: coarse, without: bare };
  return {
    bus,
    with: mergeScans(coarse, scanImpedance(study, caseId, peaks)),
    without: mergeScans(bare, scanImpedance(study, caseId, peaks, out)),
  };
}

/** Driving-point impedances of all busbars at one real-valued order. */
export function probeOrder(study: Study, caseId: string, order: number): Probe {
  return {
    caseId,
    order,
    buses: study.buses.map((bus) => bus.id),
    with: drivingPoints(study, caseId, order),
    without: drivingPoints(study, caseId, order, { without: correctionParts(study) }),
  };
}

/** All verdicts of a solved case; solutions already at hand spare solving them again. */
export function judgeNumbers(study: Study, solution: CaseSolution, atHand: JudgeOptions = {}): Verdict[] {
  return judgeCase(study, solution, atHand);
}

/** The whole results file, checks included. */
export function resultsOf(study: Study): ResultsFile {
  return solveStudy(study, (solution) => judgeCase(study, solution).map(toResultsCheck));
}
