import type { Study } from '../study/index.ts';
import { isOn } from '../study/index.ts';
import { figure } from './figure.ts';

/** How far the fundamental is raised to the highest supply voltage, and the words for it. */
export interface HighestSupply {
  factor: number;
  remark: string;
}

/**
 * criteria.maxVoltagePercent over the highest setpoint of the supplies in service, never below 1. The
 * fundamental of a capacitor is scaled with it (the network taken as linear). Without the entry the
 * case's own supply voltage stands and the remark says so.
 */
export function highestSupply(study: Study): HighestSupply {
  const setpoints = study.elements.flatMap((part) =>
    (part.kind === 'supply' || part.kind === 'generator') && isOn(part) ? [part.setpointPercent ?? 100] : [],
  );
  const setpoint = Math.max(...setpoints, 0);
  const highest = study.criteria?.maxVoltagePercent;
  if (highest === undefined || setpoint <= 0) {
    return {
      factor: 1,
      remark: `Judged at the case's own supply voltage (${figure(setpoint)} %); enter the highest supply voltage to judge there.`,
    };
  }
  const factor = Math.max(1, highest / setpoint);
  return {
    factor,
    remark: `Fundamental taken at the highest supply voltage, ${figure(Math.max(highest, setpoint))} % (case: ${figure(setpoint)} %).`,
  };
}
