import { type PartLaw, spreadSeriesAdmittance, writeInverse } from './PartLaw.ts';

export interface CouplerData {
  resistanceMOhm: number;
  reactanceMOhm: number;
}

/** Closed bus tie: Z1 = Z2 = Z0 = R + jhX. */
export function couplerLaw(data: CouplerData): PartLaw {
  const resistance = data.resistanceMOhm * 1e-3;
  const reactance = data.reactanceMOhm * 1e-3;
  return (h, out, at) => {
    writeInverse(resistance, h * reactance, out, at);
    spreadSeriesAdmittance(out, at);
  };
}
