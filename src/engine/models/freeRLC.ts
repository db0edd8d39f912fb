import { type PartLaw, spreadSeriesAdmittance, writeInverse, writeZeroSequence } from './PartLaw.ts';

export interface FreeRLCData {
  resistanceOhm?: number;
  inductanceMH?: number;
  capacitanceUF?: number;
  arrangement: 'series' | 'parallel';
}

/** Series branch of free R, L, C between two busbars: Z1 = Z2 = Z0. */
export function branchLaw(data: FreeRLCData, omega: number): PartLaw {
  const admittance = freeAdmittance(data, omega);
  return (h, out, at) => {
    admittance(h, out, at);
    spreadSeriesAdmittance(out, at);
  };
}

/** Free R, L, C from a busbar to its neutral: y1 = y2, y0 = y1 with a neutral, else open. */
export function shuntLaw(data: FreeRLCData & { neutral: boolean }, omega: number): PartLaw {
  const admittance = freeAdmittance(data, omega);
  return (h, out, at) => {
    admittance(h, out, at + 2);
    writeZeroSequence(data.neutral, out, at);
  };
}

/**
 * Admittance of R, L, C in series, 1/(R + jhωL + 1/(jhωC)), or in parallel, 1/R + 1/(jhωL) + jhωC.
 * Absent parts are absent: a short in series, open in parallel. `omega` = 2π·fn.
 */
function freeAdmittance(data: FreeRLCData, omega: number): PartLaw {
  const { resistanceOhm, inductanceMH, capacitanceUF } = data;
  const xL = inductanceMH === undefined ? undefined : omega * inductanceMH * 1e-3;
  const bC = capacitanceUF === undefined ? undefined : omega * capacitanceUF * 1e-6;
  if (data.arrangement === 'series') {
    const r = resistanceOhm ?? 0;
    return (h, out, at) => writeInverse(r, h * (xL ?? 0) - (bC === undefined ? 0 : 1 / (h * bC)), out, at);
  }
  const g = resistanceOhm === undefined ? 0 : 1 / resistanceOhm;
  return (h, out, at) => {
    out[at] = g;
    out[at + 1] = h * (bC ?? 0) - (xL === undefined ? 0 : 1 / (h * xL));
  };
}
