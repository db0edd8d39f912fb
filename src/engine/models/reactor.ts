import type { Skin } from '../../study/index.ts';
import { type PartLaw, spreadSeriesAdmittance, writeInverse } from './PartLaw.ts';
import { skinFactor } from './skinFactor.ts';

export interface ReactorData {
  inductanceMH: number;
  resistanceOhm: number;
  skin: Skin;
}

/** Series reactor: Z1 = Z2 = Z0 = R(h) + jhωL, `omega` = 2π·fn. */
export function reactorLaw(data: ReactorData, omega: number): PartLaw {
  const reactance = omega * data.inductanceMH * 1e-3;
  const { resistanceOhm, skin } = data;
  return (h, out, at) => {
    writeInverse(resistanceOhm * skinFactor(h, skin), h * reactance, out, at);
    spreadSeriesAdmittance(out, at);
  };
}
