import { figure, inflowAt, SolvedCase, type Working } from '../checks/index.ts';
import type { CaseSolution } from '../engine/index.ts';
import { type Study, studyInCase } from '../study/index.ts';
import { tanPhi } from './kvarForTarget.ts';

export interface KvarAtBus {
  kW: number;
  /** Drawn from the network as solved, so with the correction already in service. */
  kvar: number;
  /** cos φ1 there now; null without current. */
  displacementPF: number | null;
  /** To add at this busbar; negative: the surplus over the target. */
  additionalKvar: number;
  working: Working[];
}

/**
 * Kvar to add at a busbar so that the power drawn there reaches the target, from a solved case:
 * Q_add = Q − P·tan φ2, P and Q as the network feeds the busbar. First order: the losses saved upstream
 * and the small change of voltage are left out, so solve again with the bank. null without numbers there.
 */
export function kvarAtBus(
  study: Study,
  solution: CaseSolution,
  bus: string,
  targetPF: number,
): KvarAtBus | null {
  if (!solution.converged) return null;
  const inflow = inflowAt(studyInCase(study, solution.caseId), new SolvedCase(solution), bus);
  if (!inflow) return null;
  const tan = tanPhi(targetPF);
  const additionalKvar = inflow.kvar - inflow.kW * tan;
  return {
    kW: inflow.kW,
    kvar: inflow.kvar,
    displacementPF: inflow.displacementPF,
    additionalKvar,
    working: [
      {
        equation: 'tan φ2 = √(1/cos² φ2 − 1)',
        numbers: `cos φ2 = ${figure(targetPF)}: tan φ2 = ${figure(tan)}`,
      },
      {
        equation: 'Q_add = Q − P · tan φ2 = P · (tan φ1 − tan φ2)',
        numbers: `${figure(inflow.kvar)} kvar − ${figure(inflow.kW)} kW · ${figure(tan)} = ${figure(additionalKvar)} kvar`,
      },
    ],
  };
}
