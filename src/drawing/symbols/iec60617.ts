import type { PlainKind } from './PlainKind.ts';
import { box, path, type SymbolShape, shape } from './primitives.ts';

const SINE = 'q2.5,-7 5,0 t5,0';

/** Shapes after IEC 60617 of the kinds whose data do not change them, drawn by ourselves. */
export const iecShapes: Record<PlainKind, SymbolShape> = {
  supply: shape(14, 28, path('M0,-20 V9 M-6,0 L0,9 L6,0'), {
    shape: 'path',
    d: 'M-14,14 H14',
    weight: 'bold',
  }),
  generator: shape(
    16,
    32,
    { shape: 'circle', cx: 0, cy: 0, r: 16 },
    { shape: 'letter', x: 0, y: 2, text: 'G', sizePx: 13 },
    path(`M-5,8 ${SINE}`),
  ),
  transformer: shape(
    21.5,
    28,
    { shape: 'circle', cx: 0, cy: -8, r: 13.5 },
    { shape: 'circle', cx: 0, cy: 8, r: 13.5 },
  ),
  cable: shape(16, 16, path('M0,-16 V16 M-7,4.5 L7,-8.5 M-7,9 L7,-4')),
  reactor: shape(20, 14, path('M0,-20 a5,5 0 0 1 0,10 a5,5 0 0 1 0,10 a5,5 0 0 1 0,10 a5,5 0 0 1 0,10')),
  motor: shape(
    16,
    32,
    { shape: 'circle', cx: 0, cy: 0, r: 16 },
    { shape: 'letter', x: 0, y: 5, text: 'M', sizePx: 14 },
  ),
  converter: shape(
    15,
    30,
    box(-15, -15, 30, 30),
    path('M-15,15 L15,-15'),
    path(`M-11,-5 ${SINE}`),
    path('M3,6 h8 M3,10 h8'),
  ),
  load: shape(17, 16, box(-8, -17, 16, 34)),
};

/** A switch blade on two contacts. */
export function iecCoupler(closed: boolean): SymbolShape {
  return shape(
    16,
    20,
    path('M0,-16 V-11 M0,11 V16'),
    { shape: 'circle', cx: 0, cy: -9, r: 2, fill: 'ink' },
    { shape: 'circle', cx: 0, cy: 9, r: 2, fill: 'ink' },
    path(closed ? 'M0,9 V-9' : 'M0,9 L10,-9'),
  );
}
