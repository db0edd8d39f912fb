import type { StarDelta } from '../study/index.ts';
import type { SolvedCase } from './SolvedCase.ts';

/** Where three equal capacitor units hang, and |Y(h)| of one star-equivalent phase, siemens. */
export interface UnitPlace {
  terminal: number;
  bus: string;
  connection: StarDelta;
  admittance: (h: number) => number;
}

/**
 * Current of each of three capacitor units by order, in line amperes: star units carry the line current; a
 * delta unit carries U_k,k+1·|Y|/3, here times √3 so that its rated value is the line's I_N. Taken from the
 * judged voltages between lines, it holds where angles are unknown and under the α law as well.
 */
export function unitAmperes(solved: SolvedCase, place: UnitPlace): number[][] {
  const { terminal, connection, admittance } = place;
  const bus = solved.bus(place.bus);
  return [0, 1, 2].map((unit) =>
    Array.from({ length: solved.maxOrder }, (_, index) => {
      const h = index + 1;
      return connection === 'delta'
        ? (solved.lineVolts(bus, h, unit) * admittance(h)) / Math.sqrt(3)
        : solved.amperes(terminal, h, unit);
    }),
  );
}
