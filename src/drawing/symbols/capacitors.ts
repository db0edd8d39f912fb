import type { StarDelta } from '../../study/index.ts';
import type { Elementary } from './elementary.ts';
import { type Primitive, path, type SymbolShape } from './primitives.ts';

/** Delta triangle, star, or star with its point earthed, hanging from (0, y). */
function connectionMark(connection: StarDelta, y: number): Primitive[] {
  if (connection === 'delta') return [path(`M0,${y} L6.5,${y + 11} H-6.5 Z`)];
  const star = path(`M0,${y} v6 M0,${y + 6} l-6,5.5 M0,${y + 6} l6,5.5`);
  if (connection === 'star') return [star];
  return [star, path(`M0,${y + 6} h13 v3`), path(`M9,${y + 9} h8 M10.5,${y + 11.5} h5 M12,${y + 14} h2`)];
}

/** A capacitor bank with its delta or star mark, behind its reactor where it is detuned. */
export function bankShape(elements: Elementary, connection: StarDelta, detuned: boolean): SymbolShape {
  const marks = detuned
    ? [
        elements.winding(0, -24, 3, 3),
        path('M0,-6 v2'),
        elements.capacitor(0, -4, 13, 5.5),
        path('M0,1.5 v6'),
      ]
    : [path('M0,-24 V-9'), elements.capacitor(0, -9, 14, 6), path('M0,-3 V7.5')];
  return { reach: 24, width: 30, primitives: [...marks, ...connectionMark(connection, 7.5)] };
}

export type FilterType = 'single-tuned' | 'high-pass' | 'c-type';

/** A filter: capacitor and winding in series, with a resistance across what its type damps. */
export function filterShape(elements: Elementary, type: FilterType, connection: StarDelta): SymbolShape {
  const capacitor = [path('M0,-24 v5'), elements.capacitor(0, -19, 11, 4.5)];
  const mark = connectionMark(connection, 9);
  if (type === 'single-tuned') {
    const coil = [path('M0,-14.5 v2.5'), elements.winding(0, -12, 3, 3.5)];
    return { reach: 24, width: 26, primitives: [...capacitor, ...coil, ...mark] };
  }
  const damping = [path('M0,-12 H11 v3 M11,6 v3 H0'), elements.resistor(11, -9, 15)];
  const damped =
    type === 'high-pass'
      ? [path('M0,-14.5 v5.5 M0,6 v3'), elements.winding(0, -9, 3, 2.5)]
      : [
          path('M0,-14.5 v3.5 M0,-1 v2 M0,4.5 v4.5'),
          elements.winding(0, -11, 2, 2.5),
          elements.capacitor(0, 1, 5, 3.5),
        ];
  return { reach: 24, width: 34, primitives: [...capacitor, ...damped, ...damping, ...mark] };
}
