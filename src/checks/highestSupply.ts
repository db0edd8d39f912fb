import type { Study } from '../study/index.ts';
import { isOn } from '../study/index.ts';
import { figure } from './figure.ts';

/** How far the fundamental is raised to the highest supply voltage, and the words for it. */
export interface HighestSupply {
  factor: number;
  remark: string;
}

/** Highest setpoint of the supplies and generators in service, per cent; 0 without any. */
function highestSetpoint(study: Study): number {
  let highest = 0;
  for (const part of study.elements)
    if ((part.kind === 'supply' || part.kind === 'generator') && isOn(part))
      highest = Math.max(highest, part.setpointPercent ?? 100);
  return highest;
}

/** criteria.maxVoltagePercent over the highest setpoint in service, never below 1; 1 without the entry. */
export function supplyRaise(study: Study): number {
  const setpoint = highestSetpoint(study);
  const highest = study.criteria?.maxVoltagePercent;
  return highest === undefined || setpoint <= 0 ? 1 : Math.max(1, highest / setpoint);
}

/**
 * The fundamental of a capacitor is scaled with `supplyRaise` (the network taken as linear). Without the
 * entry the case's own supply voltage stands and the remark says so.
 */
export function highestSupply(study: Study): HighestSupply {
  const setpoint = highestSetpoint(study);
  const highest = study.criteria?.maxVoltagePercent;
  const factor = supplyRaise(study);
  const remark =
    highest === undefined || setpoint <= 0
      ? `Judged at the case's own supply voltage (${figure(setpoint)} %); enter the highest supply voltage to judge there.`
      : `Fundamental taken at the highest supply voltage, ${figure(Math.max(highest, setpoint))} % (case: ${figure(setpoint)} %).`;
  return { factor, remark };
}
