import type { PartLaw } from './PartLaw.ts';

/** Converter's own filter capacitor, star per phase, three-wire: y1 = y2 = jhωC, y0 = 0. */
export function converterFilterLaw(capacitanceUF: number, omega: number): PartLaw {
  const susceptance = omega * capacitanceUF * 1e-6;
  return (h, out, at) => {
    out[at] = 0;
    out[at + 1] = 0;
    out[at + 2] = 0;
    out[at + 3] = h * susceptance;
  };
}
